// One rig against many hulls, as a job.
import * as z from 'zod';
import { FitQuestion, verdicts } from './fit.ts';
import { hullForms } from './hull.ts';

/** The question a fit asks, without its hull: that is what changes from line to line. */
const Rig = FitQuestion.omit({ hull: true, ref: true, uncertainty: true, alsoAt: true });

export const HullFilter = z
  .strictObject({
    maker: z.string().trim().min(1).max(80).optional(),
    form: z.enum(hullForms).optional(),
    year: z.int().min(1900).max(2100).optional(),
    lengthMinM: z.number().min(0).max(100).optional(),
    lengthMaxM: z.number().min(0).max(100).optional(),
    deadriseMinDeg: z.number().min(0).max(90).optional(),
    deadriseMaxDeg: z.number().min(0).max(90).optional(),
    generic: z.boolean().default(false).describe('The generic hulls instead of the real ones.'),
  })
  .meta({ id: 'HullFilter' });

export const MatchOrder = z
  .strictObject({ rig: Rig.describe('What is mounted, where and how it is run.'), hulls: HullFilter.prefault({}) })
  .meta({ id: 'MatchOrder' });
export type MatchOrder = z.infer<typeof MatchOrder>;

export const jobStatuses = ['waiting', 'running', 'done', 'cancelled', 'failed'] as const;
export const Job = z
  .strictObject({
    id: z.string(),
    status: z.enum(jobStatuses),
    done: z.int().nonnegative().describe('Hulls answered so far; their results can be read already.'),
    total: z.int().nonnegative(),
    counts: z.strictObject({
      fits: z.int(),
      'fits-with-care': z.int(),
      'does-not-fit': z.int(),
      'cannot-tell': z.int(),
    }),
    edition: z.int().nonnegative().describe('Newest edition when it was ordered.'),
    error: z.string().nullable(),
    createdAt: z.iso.datetime(),
    endedAt: z.iso.datetime().nullable(),
  })
  .meta({ id: 'Job' });
export type Job = z.infer<typeof Job>;

export const MatchResult = z
  .strictObject({
    hull: z.string(),
    maker: z.string(),
    model: z.string(),
    package: z.string().nullable(),
    yearFrom: z.int().nullable(),
    yearTo: z.int().nullable(),
    verdict: z.enum(verdicts),
    reasons: z.array(z.string()).describe('Codes: those of the fit’s reasons, and rules of compatibility that say no.'),
  })
  .meta({ id: 'MatchResult' });
export type MatchResult = z.infer<typeof MatchResult>;
