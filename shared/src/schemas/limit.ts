// How much each kind of caller may ask, in units; every operation says what it costs.
import * as z from 'zod';

export const limitedCallers = ['anonymous', 'page', 'account', 'key'] as const;
export const LimitedCaller = z
  .enum(limitedCallers)
  .describe(
    'anonymous: nobody signed in, by address. page: a page of this very site in a browser. account: signed in. key: a program with an API key.',
  )
  .meta({ id: 'LimitedCaller' });
export type LimitedCaller = z.infer<typeof LimitedCaller>;

export const LimitSetting = z
  .strictObject({
    unitsPerMinute: z.int().min(1).max(1e9),
    unitsPerDay: z.int().min(1).max(1e9).nullable().default(null).describe('Kept for keys only; null for none.'),
  })
  .meta({ id: 'LimitSetting' });
export type LimitSetting = z.infer<typeof LimitSetting>;

export const Limit = z
  .strictObject({
    caller: LimitedCaller,
    unitsPerMinute: z.int(),
    unitsPerDay: z.int().nullable(),
    changedAt: z.iso.datetime().nullable().describe('Null while it is as configured.'),
    changedBy: z.string().nullable(),
  })
  .meta({ id: 'Limit' });
export type Limit = z.infer<typeof Limit>;

export const DayOfUse = z
  .strictObject({
    key: z.string(),
    day: z.string().describe('A day by UTC, 2026-05-31.'),
    requests: z.int().nonnegative(),
    units: z.int().nonnegative(),
    refused: z.int().nonnegative().describe('Of the requests, those answered 429.'),
  })
  .meta({ id: 'DayOfUse' });
export type DayOfUse = z.infer<typeof DayOfUse>;
