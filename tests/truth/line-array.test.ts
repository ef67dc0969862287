import { lineHalfWidth, lineIntensity } from '@tiltwright/shared/engine/beams/pattern.ts';
import { radToDeg } from '@tiltwright/shared/engine/units.ts';
import { checkTruth, numberIn } from '../support/truth-table.ts';

/** Highest level between the zeros n and n + 1 of the pattern, dB. */
function sidelobeDb(n: number): number {
  let highest = 0;
  for (let i = 1; i < 100_000; i++) highest = Math.max(highest, lineIntensity(n + i / 100_000));
  return 10 * Math.log10(highest);
}

checkTruth('line-array', 8, (row) => {
  switch (row.function) {
    case 'half-width':
      return lineHalfWidth(numberIn(row, 'level_db'), row.way === 'two' ? 'two' : 'one');
    case 'sidelobe':
      return sidelobeDb(numberIn(row, 'level_db'));
    case 'full-width':
      return radToDeg(2 * Math.asin(lineHalfWidth(-3, 'one') / numberIn(row, 'level_db')));
    default:
      throw new Error(`unknown function ${row.function}`);
  }
});
