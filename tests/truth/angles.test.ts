import { plumbOffsetM } from '@tiltwright/shared/engine/frames.ts';
import { heightFromFaceM } from '@tiltwright/shared/engine/hull.ts';
import { angleOfShim } from '@tiltwright/shared/engine/level.ts';
import { degToRad, mmToM, mToMm, radToDeg } from '@tiltwright/shared/engine/units.ts';
import { checkTruth, numberIn } from '../support/truth-table.ts';

checkTruth('angles', 4, (row) => {
  const a = mmToM(numberIn(row, 'a'));
  const b = numberIn(row, 'b');
  switch (row.function) {
    case 'plumb':
      return mToMm(plumbOffsetM(a, degToRad(b)));
    case 'shim':
      return radToDeg(angleOfShim(a, mmToM(b)));
    case 'face':
      return mToMm(heightFromFaceM(a, b));
    default:
      throw new Error(`unknown function ${row.function}`);
  }
});
