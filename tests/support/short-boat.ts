// The short aluminium boat of the trade's facts: 4.2 m, 8° deadrise, a 15 to 40 hp motor, a sensor 380 mm to starboard.
import { answerClearance } from '@tiltwright/shared/questions/answer-clearance.ts';
import { ClearanceQuestion } from '@tiltwright/shared/schemas/clearance.ts';
import type { InlineHull } from '@tiltwright/shared/schemas/hull.ts';
import type { InlineLowerUnit } from '@tiltwright/shared/schemas/lower-unit.ts';
import type { InlineTransducer } from '@tiltwright/shared/schemas/transducer.ts';

export interface ShortBoat {
  powerHp: number;
  motorTrimDeg: number;
  housingLengthMm: number;
  standoffMm: number;
  tiltDeg: number;
  offsetMm: number;
}

const asUsual: ShortBoat = { powerHp: 25, motorTrimDeg: 0, housingLengthMm: 220, standoffMm: 30, tiltDeg: 0, offsetMm: 380 };

/** Clearance of the short boat, changed where the caller says so. */
export function shortBoat(changes: Partial<ShortBoat>) {
  const { powerHp, housingLengthMm, ...rest } = { ...asUsual, ...changes };
  const hull: InlineHull = { form: 'shallow-v', lengthM: 4.2, deadriseDeg: 8, material: 'aluminium' };
  const lowerUnit: InlineLowerUnit = { drive: 'outboard', powerHp };
  const transducer: InlineTransducer = { kinds: ['side'], housingLengthMm };
  const question = ClearanceQuestion.parse({ hull, lowerUnit, transducer, dropMm: 6, ...rest });
  const { clearance } = answerClearance(question, { hull, lowerUnit, transducer }, { edition: 0 });
  if (!clearance.port || !clearance.starboard) throw new Error('a side element has two sides');
  return { ...clearance, port: clearance.port, starboard: clearance.starboard };
}

/** Least motor trim, in whole degrees, at which the port side is clear; Infinity where none up to 30° clears it. */
export function clearsAtDeg(changes: Partial<ShortBoat>): number {
  for (let motorTrimDeg = -5; motorTrimDeg <= 30; motorTrimDeg++) {
    if (shortBoat({ ...changes, motorTrimDeg }).port.verdict === 'clear') return motorTrimDeg;
  }
  return Number.POSITIVE_INFINITY;
}
