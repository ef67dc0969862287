import * as z from 'zod';
import { answerFields, TiltAnswer, TrimAnswer } from './answer.ts';
import { engineFields, PartId, Ref, runningFields } from './fit.ts';
import { InlineHull } from './hull.ts';
import { InlineLowerUnit } from './lower-unit.ts';
import { InlineMount } from './mount.ts';

const { measuredTrimDeg, measuredSigmaDeg, loadedMassKg, speedKn, water } = runningFields;
export const tiltFields = {
  speedKn,
  targetDeg: z.number().min(-45).max(45).default(0).describe('Wanted attitude in the water, nose-up positive.'),
  loadedMassKg,
  measuredTrimDeg,
  measuredSigmaDeg,
  motorTrimDeg: engineFields.motorTrimDeg,
  water,
};

export const TiltQuestion = z
  .strictObject({
    ref: Ref.optional(),
    hull: z.union([PartId, InlineHull]),
    mount: z.union([PartId, InlineMount]).optional(),
    lowerUnit: z.union([PartId, InlineLowerUnit]).optional(),
    ...tiltFields,
  })
  .meta({ id: 'TiltQuestion' });
export type TiltQuestion = z.infer<typeof TiltQuestion>;

export const TiltReply = z
  .strictObject({ ref: Ref.optional(), trim: TrimAnswer, tilt: TiltAnswer, ...answerFields })
  .meta({ id: 'TiltReply' });
export type TiltReply = z.infer<typeof TiltReply>;
