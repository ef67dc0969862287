// What people put into an import besides the file: edits of rows, and mappings worth remembering.
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { RowDecision, RowResolution } from '@tiltwright/shared/schemas/import.ts';
import type { Mapping } from '@tiltwright/shared/schemas/mapping.ts';
import { sql } from 'drizzle-orm';
import { check, integer, primaryKey, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { imports } from './imports.ts';

/** One row's edits; they outlive a new check of the same file. */
export const importEdits = sqliteTable(
  'import_edits',
  {
    importId: text('import_id')
      .notNull()
      .references(() => imports.id, { onDelete: 'cascade' }),
    n: integer('n').notNull(),
    /** Text by canonical column, in place of what the file says. */
    cells: text('cells', { mode: 'json' }).$type<Record<string, string>>().notNull(),
    decision: text('decision').$type<RowDecision>(),
    resolution: text('resolution').$type<RowResolution>(),
  },
  (table) => [
    primaryKey({ columns: [table.importId, table.n] }),
    check('import_edits_decision', sql.raw("decision IS NULL OR decision IN ('accept', 'skip')")),
    check('import_edits_resolution', sql.raw("resolution IS NULL OR resolution IN ('catalog', 'row')")),
  ],
);

/** The newest mapping of each kind of header, offered when such a file comes again. */
export const mappings = sqliteTable(
  'mappings',
  {
    id: text('id').primaryKey(),
    table: text('table_name').$type<Table>().notNull(),
    /** SHA-256 of the header's words, their order aside. */
    fingerprint: text('fingerprint').notNull(),
    mapping: text('mapping', { mode: 'json' }).$type<Mapping & { header: string[] }>().notNull(),
    savedAt: text('saved_at').notNull(),
    savedBy: text('saved_by').notNull(),
  },
  (table) => [uniqueIndex('mappings_header').on(table.table, table.fingerprint)],
);
