// Many fits in one request: NDJSON in and out, a line a question.
import * as z from 'zod';
import { FitAnswer, FitQuestion, Ref } from './fit.ts';
import { InlineHull } from './hull.ts';
import { InlineLowerUnit } from './lower-unit.ts';
import { InlineMount } from './mount.ts';
import { Problem } from './problem.ts';
import { InlineTransducer } from './transducer.ts';

export const mostBatchLines = 10_000;
const name = z.string().regex(/^[\w.-]{1,60}$/, 'letters, digits, _ . and -');
const most = { message: 'at most 2000 parts of a kind' };
const named = <S extends z.ZodType>(part: S) =>
  z
    .record(name, part)
    .refine((parts) => Object.keys(parts).length <= 2000, most)
    .default({});

/** The first line, where there is one: parts that later lines call `#name`. */
export const SharedParts = z
  .strictObject({
    shared: z.strictObject({
      hulls: named(InlineHull),
      lowerUnits: named(InlineLowerUnit),
      transducers: named(InlineTransducer),
      mounts: named(InlineMount),
    }),
  })
  .meta({ id: 'SharedParts' });
export type SharedParts = z.infer<typeof SharedParts>['shared'];

export const BatchProblem = z
  .strictObject({ ref: Ref.optional(), line: z.int().positive().describe('Line of the request, from 1.'), problem: Problem })
  .meta({ id: 'BatchProblem' });
export type BatchProblem = z.infer<typeof BatchProblem>;

export const BatchDone = z
  .strictObject({
    done: z.literal(true),
    count: z.int().nonnegative().describe('Questions answered, well or with a problem.'),
    problems: z.int().nonnegative(),
    edition: z.int().nonnegative(),
  })
  .meta({ id: 'BatchDone' });
export type BatchDone = z.infer<typeof BatchDone>;

export const BatchQuestionLine = z.union([SharedParts, FitQuestion]).meta({ id: 'BatchQuestionLine' });
export const BatchAnswerLine = z.union([FitAnswer, BatchProblem, BatchDone]).meta({ id: 'BatchAnswerLine' });
export type BatchAnswerLine = z.infer<typeof BatchAnswerLine>;
