import type { ResolvedParts } from '@tiltwright/shared/questions/parts.ts';
import type { FitAnswer, FitQuestion } from '@tiltwright/shared/schemas/fit.ts';

/** One question for the worker, with its parts looked up. */
export interface FitJob {
  id: number;
  question: FitQuestion;
  parts: ResolvedParts;
  /** Edition the parts were read from; it only stands on the answer. */
  edition: number;
}

/** Null where the engine could not answer: the server is asked instead, and says why. */
export interface FitResult {
  id: number;
  answer: FitAnswer | null;
}
