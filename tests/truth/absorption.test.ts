import { absorptionDbPerKm } from '@tiltwright/shared/engine/acoustics/absorption.ts';
import { checkTruth, numberIn } from '../support/truth-table.ts';

checkTruth('absorption', 5, (row) =>
  absorptionDbPerKm(numberIn(row, 'frequency_khz'), {
    temperatureC: numberIn(row, 'temperature_c'),
    salinity: numberIn(row, 'salinity'),
    depthM: numberIn(row, 'depth_m'),
    acidityPh: numberIn(row, 'ph'),
  }),
);
