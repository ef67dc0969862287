import * as z from 'zod';
import { FitAnswer, FitQuestion } from './fit.ts';

const Name = z.string().trim().min(1).max(120);
const Text = z.string().trim().max(4000);

/** An owner's boat with its rig as one ready question, and why it is interesting. */
export const Boat = z
  .strictObject({
    id: z.string(),
    name: z.string(),
    story: z.string().nullable(),
    hull: z.string().nullable().describe('Id of the catalog’s hull; null for one that is not listed.'),
    question: FitQuestion,
    revision: z.int().positive(),
    createdAt: z.iso.datetime(),
    updatedAt: z.iso.datetime(),
  })
  .meta({ id: 'Boat' });
export type Boat = z.infer<typeof Boat>;

export const NewBoat = z
  .strictObject({
    name: Name,
    story: Text.nullable().default(null),
    question: FitQuestion.describe('The rig, as the question it asks.'),
  })
  .meta({ id: 'NewBoat' });
export type NewBoat = z.infer<typeof NewBoat>;

export const BoatChange = z
  .strictObject({ name: Name.optional(), story: Text.nullable().optional(), question: FitQuestion.optional() })
  .meta({ id: 'BoatChange' });
export type BoatChange = z.infer<typeof BoatChange>;

/** A question with the answer it got, by which engine and edition. */
export const SavedFit = z
  .strictObject({
    id: z.string(),
    name: z.string(),
    note: z.string().nullable(),
    boat: z.string().nullable().describe('Id of the boat it belongs to.'),
    question: FitQuestion,
    answer: FitAnswer,
    revision: z.int().positive(),
    createdAt: z.iso.datetime(),
    updatedAt: z.iso.datetime(),
  })
  .meta({ id: 'SavedFit' });
export type SavedFit = z.infer<typeof SavedFit>;

export const NewFit = z
  .strictObject({
    name: Name,
    note: Text.nullable().default(null),
    boat: z.string().max(80).nullable().default(null),
    question: FitQuestion,
  })
  .meta({ id: 'NewFit' });
export type NewFit = z.infer<typeof NewFit>;

export const FitChange = z
  .strictObject({
    name: Name.optional(),
    note: Text.nullable().optional(),
    boat: z.string().max(80).nullable().optional(),
    question: FitQuestion.optional().describe('Asked anew; the answer is replaced.'),
  })
  .meta({ id: 'FitChange' });
export type FitChange = z.infer<typeof FitChange>;

/** A link that opens one saved fit to whoever has it. */
export const Share = z
  .strictObject({
    id: z.string(),
    fit: z.string(),
    token: z.string().describe('GET /shares/{token} answers to it.'),
    createdAt: z.iso.datetime(),
    revokedAt: z.iso.datetime().nullable(),
  })
  .meta({ id: 'Share' });
export type Share = z.infer<typeof Share>;
export const NewShare = z.strictObject({ fit: z.string().min(1).max(80) }).meta({ id: 'NewShare' });

/** What a link shows: the fit, and nothing about whose it is. */
export const SharedFit = z
  .strictObject({ name: z.string(), question: FitQuestion, answer: FitAnswer, updatedAt: z.iso.datetime() })
  .meta({ id: 'SharedFit' });
export type SharedFit = z.infer<typeof SharedFit>;
