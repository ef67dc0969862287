import * as z from 'zod';
import { catalogTables } from './catalog-record.ts';
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
