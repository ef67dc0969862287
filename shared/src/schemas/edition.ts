import * as z from 'zod';
import { catalogTables, Table } from './catalog-record.ts';
import { FieldChange } from './import.ts';

export const Edition = z
  .strictObject({
    edition: z.int().nonnegative(),
    publishedAt: z.iso.datetime(),
    actor: z.string().describe('Opaque id of who published.'),
    why: z.string().nullable(),
    records: z.int().describe('Records it added or changed.'),
  })
  .meta({ id: 'Edition' });
export type Edition = z.infer<typeof Edition>;

export const Revision = z
  .strictObject({
    revision: z.int().positive(),
    edition: z.int(),
    at: z.iso.datetime(),
    actor: z.string(),
    why: z.string().nullable(),
    source: z.string().nullable(),
    changes: z.array(FieldChange),
  })
  .meta({ id: 'Revision' });
export type Revision = z.infer<typeof Revision>;

export const RollbackOrder = z
  .strictObject({ why: z.string().trim().max(500).optional().describe('Shown in the history of every record it touches.') })
  .meta({ id: 'RollbackOrder' });

export const RolledBack = z
  .strictObject({
    edition: z.int().describe('The new edition that holds the earlier values.'),
    records: z.int(),
    withdrawn: z.int().describe('Records that the edition had first published; they are listed and found nowhere now.'),
    kept: z
      .array(z.strictObject({ record: z.string(), fields: z.array(z.string()) }).meta({ id: 'KeptFields' }))
      .describe('Fields that a later edition has set again and that therefore stay, for the first 200 records.'),
  })
  .meta({ id: 'RolledBack' });
export type RolledBack = z.infer<typeof RolledBack>;

/** One record between two editions. */
export const RecordDifference = z
  .strictObject({
    kind: Table,
    id: z.string(),
    name: z.string(),
    isNew: z.boolean().describe('First published between the two.'),
    changes: z.array(FieldChange).describe('From the earlier edition to the later; empty where all came back to what it was.'),
  })
  .meta({ id: 'RecordDifference' });
export type RecordDifference = z.infer<typeof RecordDifference>;

export const Change = z
  .strictObject({
    kind: Table,
    record: z.string(),
    revision: z.int().positive(),
    edition: z.int(),
    at: z.iso.datetime(),
    why: z.string().nullable(),
    source: z.string().nullable(),
    isNew: z.boolean(),
    changes: z.array(FieldChange),
  })
  .meta({ id: 'Change' });
export type Change = z.infer<typeof Change>;

export const ChangePage = z
  .strictObject({
    data: z.array(Change),
    next: z.string().describe('Go on from here, now or later.'),
    more: z.boolean().describe('There are more right away.'),
    edition: z.int().describe('The newest edition.'),
  })
  .meta({ id: 'ChangePage' });
export type ChangePage = z.infer<typeof ChangePage>;

/** One finding over all kinds of parts. */
export const SearchHit = z
  .strictObject({
    kind: z.enum(catalogTables),
    id: z.string(),
    maker: z.string(),
    model: z.string(),
    package: z.string().nullable(),
    yearFrom: z.int().nullable(),
    yearTo: z.int().nullable(),
    generic: z.boolean(),
    corrected: z.array(z.string()).describe('Words of the question that were read as another spelling.'),
  })
  .meta({ id: 'SearchHit' });
export type SearchHit = z.infer<typeof SearchHit>;
