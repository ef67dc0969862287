import { checkTruth } from '../support/check-truth.ts';

checkTruth('savitsky');
