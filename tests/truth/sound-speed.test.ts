import { freshSoundSpeedMps, seaSoundSpeedMps } from '@tiltwright/shared/engine/acoustics/sound-speed.ts';
import { checkTruth, numberIn } from '../support/truth-table.ts';

checkTruth('sound-speed', 4, (row) => {
  const temperatureC = numberIn(row, 'temperature_c');
  if (row.water === 'fresh') return freshSoundSpeedMps(temperatureC);
  return seaSoundSpeedMps(temperatureC, numberIn(row, 'salinity'), numberIn(row, 'depth_m'));
});
