import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { CellProblem, Fate, FateCounts, FieldChange, ImportStatus } from '@tiltwright/shared/schemas/import.ts';
import type { Fix, Mapping } from '@tiltwright/shared/schemas/mapping.ts';
import { sql } from 'drizzle-orm';
import { check, index, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import type { Origin } from './provenance.ts';

export const imports = sqliteTable(
  'imports',
  {
    id: text('id').primaryKey(),
    table: text('table_name').$type<Table>().notNull(),
    status: text('status').$type<ImportStatus>().notNull(),
    fileName: text('file_name').notNull(),
    /** Name of the kept upload inside the data folder's uploads. */
    storedAs: text('stored_as').notNull(),
    bytes: integer('bytes').notNull(),
    sha256: text('sha256').notNull(),
    encoding: text('encoding'),
    delimiter: text('delimiter'),
    /** Whether the comma is the decimal mark, where the cells show it. */
    decimalComma: integer('decimal_comma', { mode: 'boolean' }),
    rows: integer('rows'),
    checkedRows: integer('checked_rows').notNull().default(0),
    /** Edition the fates were worked out against; publishing needs it to be the newest still. */
    checkedAgainst: integer('checked_against'),
    counts: text('counts', { mode: 'json' }).$type<FateCounts>(),
    header: text('header', { mode: 'json' }).$type<string[]>(),
    /** Row of the file that holds the header, counted from 1. */
    headerRow: integer('header_row').notNull().default(1),
    /** The header is in words of its own: nothing is read before somebody has mapped it. */
    needsMapping: integer('needs_mapping', { mode: 'boolean' }).notNull().default(false),
    /** How columns are read; null where the canonical headers say it. */
    mapping: text('mapping', { mode: 'json' }).$type<Mapping>(),
    /** Same fix for all cells alike, in the order they were made. */
    fixes: text('fixes', { mode: 'json' }).$type<Fix[]>().notNull().default([]),
    unknownColumns: text('unknown_columns', { mode: 'json' }).$type<string[]>().notNull().default([]),
    edition: integer('edition'),
    problem: text('problem', { mode: 'json' }).$type<{ code: string; message: string }>(),
    createdAt: text('created_at').notNull(),
    createdBy: text('created_by').notNull(),
  },
  (table) => [
    index('imports_sha256').on(table.sha256),
    check(
      'imports_status',
      sql.raw("status IN ('uploaded', 'mapped', 'checking', 'checked', 'publishing', 'published', 'discarded', 'failed')"),
    ),
  ],
);

export type { Origin };

/** What a row would write: field values, where they come from, and the few fields that come from elsewhere or are known closer. */
export interface RowWrite {
  values: Record<string, unknown>;
  origin: Origin;
  origins?: Record<string, Origin>;
}

export const importRows = sqliteTable(
  'import_rows',
  {
    importId: text('import_id')
      .notNull()
      .references(() => imports.id, { onDelete: 'cascade' }),
    n: integer('n').notNull(),
    fate: text('fate').$type<Fate>().notNull(),
    name: text('name').notNull(),
    recordId: text('record_id'),
    /** What the row is about: rows of one key say the same thing twice, or contradict each other. */
    rowKey: text('row_key'),
    cells: text('cells', { mode: 'json' }).$type<string[]>().notNull(),
    write: text('write', { mode: 'json' }).$type<RowWrite>(),
    errors: text('errors', { mode: 'json' }).$type<CellProblem[]>().notNull(),
    cautions: text('cautions', { mode: 'json' }).$type<CellProblem[]>().notNull(),
    changes: text('changes', { mode: 'json' }).$type<FieldChange[]>().notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.importId, table.n] }),
    index('import_rows_fate').on(table.importId, table.fate),
    index('import_rows_key').on(table.importId, table.rowKey),
    check('import_rows_fate', sql.raw("fate IN ('new', 'changed', 'unchanged', 'duplicate', 'conflict', 'error')")),
  ],
);
