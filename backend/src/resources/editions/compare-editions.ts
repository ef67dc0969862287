// What lies between two editions: each record's fields as they were then and are now, whatever happened in between.
import { isDeepStrictEqual } from 'node:util';
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { RecordDifference } from '@tiltwright/shared/schemas/edition.ts';
import type { FieldChange } from '@tiltwright/shared/schemas/import.ts';
import type { Db } from '../../db/connect.ts';
import { firstChanges } from './first-changes.ts';
import { recordName } from './record-name.ts';

interface Step {
  kind: Table;
  recordId: string;
  changes: FieldChange[];
  isFirst: 0 | 1;
}

/** Records changed after edition `from` up to `to`, by id, one more than `limit` where there is one. */
export function compareEditions({ $client: sqlite }: Db, from: number, to: number, limit: number, after: number): RecordDifference[] {
  const ids = sqlite
    .prepare('SELECT DISTINCT record_id FROM revisions WHERE edition > ? AND edition <= ? ORDER BY record_id LIMIT ? OFFSET ?')
    .pluck()
    .all(from, to, limit + 1, after) as string[];
  const steps = sqlite.prepare(
    'SELECT kind, record_id AS recordId, changes, "after", "before" IS NULL AS isFirst FROM revisions WHERE record_id = ? AND edition > ? AND edition <= ? ORDER BY revision',
  );
  const nameOf = recordName(sqlite);
  return ids.map((id) => {
    const rows = (steps.all(id, from, to) as (Omit<Step, 'changes'> & { changes: string; after: string })[]).map((row) => ({
      ...row,
      changes: row.isFirst ? firstChanges(JSON.parse(row.after)) : (JSON.parse(row.changes) as FieldChange[]),
    }));
    const kind = rows[0]!.kind;
    return { kind, id, name: nameOf(kind, id), isNew: rows[0]!.isFirst === 1, changes: netChanges(rows) };
  });
}

/** First `before` to last `after` of each field; what came back to where it was is left out. */
function netChanges(steps: readonly Step[]): FieldChange[] {
  const net = new Map<string, FieldChange>();
  for (const { changes } of steps)
    for (const { field, before, after } of changes)
      net.set(field, { field, before: net.has(field) ? net.get(field)!.before : before, after });
  return [...net.values()].filter(({ before, after }) => !isDeepStrictEqual(before, after));
}
