import * as z from 'zod';
import { answerFields, ClearanceAnswer } from './answer.ts';
import { engineFields, FitObstacle, PartId, placementFields, Ref, wantedSides } from './fit.ts';
import { InlineHull } from './hull.ts';
import { InlineLowerUnit, rotations } from './lower-unit.ts';
import { InlineMount } from './mount.ts';
import { InlineTransducer } from './transducer.ts';

const { offsetMm, dropMm, standoffMm, boardMm, forwardMm, localBottomMm, rollDeg, yawDeg, tiltDeg } = placementFields;
const { setbackMm, raiseMm, motorTrimDeg, steerDeg } = engineFields;
export const clearanceFields = {
  offsetMm,
  dropMm,
  standoffMm,
  boardMm,
  forwardMm,
  localBottomMm,
  rollDeg,
  yawDeg,
  tiltDeg: tiltDeg.unwrap().default(0).describe('Set tilt against the keel line, nose-up positive.'),
  setbackMm,
  raiseMm,
  motorTrimDeg,
  steerDeg,
  engineOffsetMm: engineFields.offsetMm,
  rotation: z.enum(rotations).optional(),
  wanted: z.enum(wantedSides).default('both'),
};

export const ClearanceQuestion = z
  .strictObject({
    ref: Ref.optional(),
    hull: z.union([PartId, InlineHull]),
    lowerUnit: z.union([PartId, InlineLowerUnit]).optional(),
    transducer: z.union([PartId, InlineTransducer]),
    mount: z.union([PartId, InlineMount]).optional(),
    obstacles: z.array(FitObstacle).max(20).optional(),
    ...clearanceFields,
  })
  .meta({ id: 'ClearanceQuestion' });
export type ClearanceQuestion = z.infer<typeof ClearanceQuestion>;

export const ClearanceReply = z
  .strictObject({ ref: Ref.optional(), clearance: ClearanceAnswer, ...answerFields })
  .meta({ id: 'ClearanceReply' });
export type ClearanceReply = z.infer<typeof ClearanceReply>;
