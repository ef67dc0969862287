// The judged rows of one import and what people did to them, by positional statements.

import type { FieldChange } from '@tiltwright/shared/schemas/import.ts';
import { type FateCounts, fates, type RowDecision, type RowResolution } from '@tiltwright/shared/schemas/import.ts';
import type { Db } from '../../db/connect.ts';
import type { RowWrite } from '../../db/schema/imports.ts';
import type { Judgement } from './judge-row.ts';
import type { RowEdits } from './read-mapped.ts';

export interface RowEdit {
  cells: RowEdits;
  decision: RowDecision | null;
  resolution: RowResolution | null;
}

/** A row that may be published, as publishing needs it. */
export interface AcceptedRow {
  n: number;
  recordId: string | null;
  write: RowWrite;
  changes: FieldChange[];
  hasCautions: boolean;
  decision: RowDecision | null;
}

/** Rows deleted in one step of clearing; each step is a transaction of its own. */
const clearedAtOnce = 5000;

export function rowStore({ $client: sqlite }: Pick<Db, '$client'>, id: string) {
  const insert = sqlite.prepare(
    'INSERT OR REPLACE INTO import_rows (import_id, n, fate, name, record_id, row_key, cells, write, errors, cautions, changes) VALUES (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?)',
  );
  const cellsOf = sqlite.prepare('SELECT cells FROM import_rows WHERE import_id = ? AND n = ?').pluck();
  return {
    put(n: number, cells: readonly string[], { fate, name, recordId, rowKey, write, errors, cautions, changes }: Judgement): void {
      insert.run(
        ...[id, n, fate, name, recordId, rowKey, JSON.stringify(cells), write === null ? null : JSON.stringify(write)],
        ...[json(errors), json(cautions), json(changes)],
      );
    },
    /** The file's cells of a row that was kept before. */
    cells(n: number): string[] {
      return JSON.parse(cellsOf.get(id, n) as string) as string[];
    },
    clear(): void {
      const step = sqlite.prepare(
        `DELETE FROM import_rows WHERE rowid IN (SELECT rowid FROM import_rows WHERE import_id = ? LIMIT ${clearedAtOnce})`,
      );
      while (step.run(id).changes > 0);
    },
    counts(): FateCounts {
      const found = sqlite.prepare('SELECT fate, count(*) AS rows FROM import_rows WHERE import_id = ? GROUP BY fate').all(id) as {
        fate: string;
        rows: number;
      }[];
      const byFate = new Map(found.map(({ fate, rows }) => [fate, rows]));
      return Object.fromEntries(fates.map((fate) => [fate, byFate.get(fate) ?? 0])) as FateCounts;
    },
    /** First row of each thing the file speaks of; the rows it repeats stand behind it. */
    keys(): { n: number; rowKey: string }[] {
      return sqlite
        .prepare(
          "SELECT n, row_key AS rowKey FROM import_rows WHERE import_id = ? AND row_key IS NOT NULL AND NOT (fate = 'duplicate' OR errors LIKE '%\"same-record-twice\"%') ORDER BY n",
        )
        .all(id) as { n: number; rowKey: string }[];
    },
    edits(): Map<number, RowEdit> {
      const found = sqlite.prepare('SELECT n, cells, decision, resolution FROM import_edits WHERE import_id = ?').all(id) as {
        n: number;
        cells: string;
        decision: RowDecision | null;
        resolution: RowResolution | null;
      }[];
      return new Map(found.map(({ n, cells, ...rest }) => [n, { cells: JSON.parse(cells), ...rest }]));
    },
    /** New and changed rows that nobody skipped, a page at a time: a statement cannot stay open while others write. */
    *accepted(): Generator<AcceptedRow> {
      const page = sqlite
        .prepare(
          `SELECT r.n, r.record_id, r.write, r.changes, r.cautions <> '[]', e.decision FROM import_rows r
           LEFT JOIN import_edits e ON e.import_id = r.import_id AND e.n = r.n
           WHERE r.import_id = ? AND r.n > ? AND r.fate IN ('new', 'changed') ORDER BY r.n LIMIT 2000`,
        )
        .raw();
      let after = -1;
      while (true) {
        const rows = page.all(id, after) as [number, string | null, string, string, 0 | 1, RowDecision | null][];
        for (const [n, recordId, write, changes, hasCautions, decision] of rows) {
          after = n;
          if (decision === 'skip') continue;
          yield { n, recordId, write: JSON.parse(write), changes: JSON.parse(changes), hasCautions: hasCautions === 1, decision };
        }
        if (rows.length === 0) return;
      }
    },
  };
}

const json = (list: readonly unknown[]) => (list.length === 0 ? '[]' : JSON.stringify(list));
