import * as z from 'zod';
import { Basis } from './catalog-record.ts';
import { count, degrees, kilograms, knots, words, year } from './field.ts';

const measurementFields = {
  speedKn: knots(0, 100, 'Speed', 'Through the water.'),
  trimDeg: degrees(-10, 20, 'Running trim', 'Bow up is positive.'),
  sigmaDeg: degrees(0, 10, 'Scatter', 'One standard deviation of the runs.').optional(),
  runs: count(1, 1000, 'Runs').optional(),
  loadedMassKg: kilograms(30, 40000, 'Loaded mass').optional(),
  motorTrimDeg: degrees(-20, 80, 'Motor trim', '0 with the prop shaft parallel to the keel line.').optional(),
};

export const trimPointFields = {
  hullMaker: words(80, 'Hull maker'),
  hullModel: words(80, 'Hull model'),
  hullPackage: words(80, 'Hull package').optional(),
  hullYear: year('Hull year').optional(),
  ...measurementFields,
  condition: words(200, 'Condition', 'What else mattered: chop, two aboard, full tank.').optional(),
};

export const InlineTrimPoint = z.strictObject(measurementFields).meta({ id: 'InlineTrimPoint' });
export type InlineTrimPoint = z.infer<typeof InlineTrimPoint>;

export const TrimPoint = z
  .strictObject({
    id: z.string(),
    hull: z.string().describe('Id of the hull.'),
    ...measurementFields,
    condition: trimPointFields.condition,
    basis: Basis,
    source: z.string().nullable(),
    sourceDate: z.string().nullable(),
    edition: z.int().nonnegative(),
  })
  .meta({ id: 'TrimPoint' });
export type TrimPoint = z.infer<typeof TrimPoint>;
