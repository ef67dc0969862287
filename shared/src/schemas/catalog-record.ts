// What the four kinds of catalog records have in common: identity, provenance, the envelope.
import * as z from 'zod';
import { listOf, words, year } from './field.ts';

/** Best first. `class` is a class default: what boats or motors of that class usually have. */
export const bases = ['measured', 'published', 'estimated', 'class'] as const;
export const Basis = z
  .enum(bases)
  .describe('Where a value comes from, best first: measured, published, estimated, class (a class default).');
export type Basis = z.infer<typeof Basis>;

export const catalogTables = ['hulls', 'lower-units', 'transducers', 'mounts'] as const;
export type CatalogTable = (typeof catalogTables)[number];
export const tables = [...catalogTables, 'trim-points'] as const;
export const Table = z.enum(tables).meta({ id: 'Table' });
export type Table = (typeof tables)[number];

/** Names and years: what a person calls the thing. */
export const identityFields = {
  maker: words(80, 'Maker'),
  model: words(80, 'Model'),
  package: words(80, 'Package', 'Trim level or equipment package, where it changes the shape.').optional(),
  yearFrom: year('First model year').optional(),
  yearTo: year('Last model year').optional(),
};

/** Free text that every record may carry. */
export const remarkFields = {
  aliases: listOf(words(80, 'Alias'), 30, 'Other spellings').optional(),
  notes: words(2000, 'Notes').optional(),
};

/** One value of a record with where it comes from. */
export const SourcedValue = z
  .strictObject({
    value: z.union([z.number(), z.string(), z.array(z.string())]),
    basis: Basis,
    sigma: z.number().nonnegative().nullable().describe('One standard deviation, in the unit of the value; null where nobody stated one.'),
    source: z.string().nullable(),
    sourceDate: z.string().nullable(),
  })
  .meta({ id: 'SourcedValue' });
export type SourcedValue = z.infer<typeof SourcedValue>;

/** What the catalog adds to a record's own fields when it answers. */
export const envelopeFields = {
  id: z.string().describe('Opaque, stable, sortable.'),
  generic: z.boolean().describe('True for the generic parts whose every value is a class default.'),
  revision: z.int().positive().describe('Grows by one with each published change of this record; its ETag.'),
  edition: z.int().nonnegative().describe('The edition that last changed this record.'),
  status: z.enum(['published', 'superseded', 'withdrawn']),
  supersededBy: z.string().nullable(),
};

/** Standard deviations a caller states for an inline part, by field name. */
export const sigmasField = z
  .record(z.string().max(60), z.number().nonnegative().max(1e6))
  .optional()
  .describe('One standard deviation by field name, in that field’s unit.');
