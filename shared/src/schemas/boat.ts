import * as z from 'zod';
import { FitQuestion } from './fit.ts';

/** An owner's boat with its rig as one ready question, and why it is interesting. */
export const Boat = z
  .strictObject({ id: z.string(), name: z.string(), story: z.string().nullable(), hull: z.string().nullable(), question: FitQuestion })
  .meta({ id: 'Boat' });
export type Boat = z.infer<typeof Boat>;
