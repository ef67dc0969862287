import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { CellProblem, Fate, FateCounts, FieldChange, ImportStatus } from '@tiltwright/shared/schemas/import.ts';
import { sql } from 'drizzle-orm';
import { check, index, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import type { Provenance } from './catalog.ts';

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
    rows: integer('rows'),
    checkedRows: integer('checked_rows').notNull().default(0),
    /** Edition the fates were worked out against; publishing needs it to be the newest still. */
    checkedAgainst: integer('checked_against'),
    counts: text('counts', { mode: 'json' }).$type<FateCounts>(),
    header: text('header', { mode: 'json' }).$type<string[]>(),
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

/** What a row would write: field values with where each comes from. */
export interface RowWrite {
  values: Record<string, unknown>;
  provenance: Provenance;
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
    cells: text('cells', { mode: 'json' }).$type<string[]>().notNull(),
    write: text('write', { mode: 'json' }).$type<RowWrite>(),
    errors: text('errors', { mode: 'json' }).$type<CellProblem[]>().notNull(),
    cautions: text('cautions', { mode: 'json' }).$type<CellProblem[]>().notNull(),
    changes: text('changes', { mode: 'json' }).$type<FieldChange[]>().notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.importId, table.n] }),
    index('import_rows_fate').on(table.importId, table.fate),
    check('import_rows_fate', sql.raw("fate IN ('new', 'changed', 'unchanged', 'duplicate', 'conflict', 'error')")),
  ],
);
