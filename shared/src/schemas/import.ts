// The life of an uploaded table: uploaded, checked row by row, published as an edition or discarded.
import * as z from 'zod';
import { Table } from './catalog-record.ts';

export const importStatuses = ['uploaded', 'mapped', 'checking', 'checked', 'publishing', 'published', 'discarded', 'failed'] as const;
export type ImportStatus = (typeof importStatuses)[number];

export const fates = ['new', 'changed', 'unchanged', 'duplicate', 'conflict', 'error'] as const;
export const Fate = z.enum(fates).describe('What publishing would make of a row.').meta({ id: 'Fate' });
export type Fate = z.infer<typeof Fate>;

export const FateCounts = z
  .strictObject({ new: z.int(), changed: z.int(), unchanged: z.int(), duplicate: z.int(), conflict: z.int(), error: z.int() })
  .meta({ id: 'FateCounts' });
export type FateCounts = z.infer<typeof FateCounts>;

export const Import = z
  .strictObject({
    id: z.string(),
    table: Table,
    status: z.enum(importStatuses),
    fileName: z.string(),
    bytes: z.int(),
    sha256: z.string(),
    sameFileAs: z.string().nullable().describe('Id of an earlier import of the very same file.'),
    encoding: z.string().nullable(),
    delimiter: z.string().nullable(),
    rows: z.int().nullable(),
    checkedRows: z.int(),
    counts: FateCounts.nullable().describe('Null until the check has ended.'),
    headerRow: z.int().describe('Row of the file that holds the header.'),
    needsMapping: z.boolean().describe('The header is in words of its own: map its columns before the check.'),
    unknownColumns: z.array(z.string()).describe('Headers that name no column of the table; their cells are left out.'),
    edition: z.int().nullable(),
    problem: z.strictObject({ code: z.string(), message: z.string() }).nullable(),
    createdAt: z.iso.datetime(),
    createdBy: z.string(),
  })
  .meta({ id: 'Import' });
export type Import = z.infer<typeof Import>;

export const CellProblem = z
  .strictObject({ column: z.string(), value: z.string(), code: z.string(), message: z.string() })
  .meta({ id: 'CellProblem' });
export type CellProblem = z.infer<typeof CellProblem>;

export const FieldChange = z.strictObject({ field: z.string(), before: z.unknown(), after: z.unknown() }).meta({ id: 'FieldChange' });
export type FieldChange = z.infer<typeof FieldChange>;

export const rowDecisions = ['accept', 'skip'] as const;
export type RowDecision = (typeof rowDecisions)[number];
export const rowResolutions = ['catalog', 'row'] as const;
export type RowResolution = (typeof rowResolutions)[number];

export const ImportRow = z
  .strictObject({
    n: z.int().describe('Row number as a spreadsheet counts it.'),
    fate: Fate,
    name: z.string().describe('What the row is about, e.g. maker and model.'),
    record: z.string().nullable().describe('Id of the record it matches.'),
    errors: z.array(CellProblem),
    cautions: z.array(CellProblem),
    changes: z.array(FieldChange),
    cells: z.record(z.string(), z.string()).describe('The file’s own cells by its own headers.'),
    edits: z.record(z.string(), z.string()).describe('Cells mended in place, by canonical column.'),
    decision: z
      .enum(rowDecisions)
      .nullable()
      .describe('`skip` leaves the row out; `accept` ticks its cautions, which counts where publishing holds rows with cautions.'),
    resolution: z.enum(rowResolutions).nullable().describe('How its conflict was decided.'),
  })
  .meta({ id: 'ImportRow' });
export type ImportRow = z.infer<typeof ImportRow>;

export const RowPatch = z
  .strictObject({
    cells: z
      .record(z.string().max(120), z.string().max(4000).nullable())
      .optional()
      .describe('New text by canonical column or by the file’s own header; null takes an edit back. Units as in the mapping.'),
    decision: z.enum(rowDecisions).nullable().optional(),
    resolution: z
      .enum(rowResolutions)
      .nullable()
      .optional()
      .describe('`catalog`: conflicting values stay as they are stored; `row`: the row’s values replace them.'),
  })
  .meta({ id: 'RowPatch' });
export type RowPatch = z.infer<typeof RowPatch>;

export const CreatedImport = z.strictObject({ id: z.string(), status: z.enum(importStatuses) }).meta({ id: 'CreatedImport' });
export const PublishOrder = z
  .strictObject({ why: z.string().trim().max(500).optional(), holdCautions: z.boolean().default(false) })
  .meta({ id: 'PublishOrder' });
export type PublishOrder = z.infer<typeof PublishOrder>;
export const PublishedEdition = z.strictObject({ edition: z.int() }).meta({ id: 'PublishedEdition' });
