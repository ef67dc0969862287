// Measuring the running angle with a spirit level and shims.
import * as z from 'zod';
import { CodedText } from './answer.ts';
import { Ref } from './fit.ts';

const contactLengthMm = z.number().min(100).max(3000).describe('Between the points the level stands on.');

const LevelReading = z
  .strictObject({
    shimMm: z.number().min(-400).max(400).describe('Under the aft end where the bow is up; under the forward end it counts negative.'),
    contactLengthMm,
  })
  .refine(({ shimMm, contactLengthMm: length }) => Math.abs(shimMm) <= length, { path: ['shimMm'], message: 'longer than the level' });

export const coinSets = ['none', 'us', 'euro'] as const;

export const LevelQuestion = z
  .strictObject({
    ref: Ref.optional(),
    readings: z
      .strictObject({
        runs: z.array(LevelReading).min(1).max(50),
        trailerReadingDeg: z.number().min(-15).max(15).default(0).describe('What the level reads with the keel level: soles slope.'),
        bothDirections: z.boolean().default(false).describe('Whether runs were made up and down wind or stream.'),
      })
      .optional(),
    stackFor: z
      .strictObject({ angleDeg: z.number().min(-15).max(15), contactLengthMm, coins: z.enum(coinSets).default('none') })
      .optional(),
  })
  .refine(({ readings, stackFor }) => readings !== undefined || stackFor !== undefined, {
    path: ['readings'],
    message: 'give readings, stackFor, or both',
  })
  .meta({ id: 'LevelQuestion' });
export type LevelQuestion = z.infer<typeof LevelQuestion>;

export const LevelReply = z
  .strictObject({
    ref: Ref.optional(),
    angle: z
      .strictObject({
        valueDeg: z.number().describe('Running angle, bow up positive.'),
        sigmaDeg: z.number().nonnegative(),
        flags: z.array(z.string()),
      })
      .nullable(),
    stack: z
      .strictObject({
        shimMm: z.number().nonnegative().describe('Height that makes the level read the angle.'),
        under: z.enum(['aft', 'forward']).describe('The end of the level it stands under.'),
        stacks: z.array(
          z.strictObject({
            pieces: z.array(z.strictObject({ id: z.string(), count: z.int().positive() })),
            heightMm: z.number(),
            errorMm: z.number(),
            errorDeg: z.number(),
          }),
        ),
      })
      .nullable(),
    cautions: z.array(CodedText),
    engineVersion: z.string(),
  })
  .meta({ id: 'LevelReply' });
export type LevelReply = z.infer<typeof LevelReply>;
