import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type Database from 'better-sqlite3';
import { recordTable } from './record-table.ts';

/** What a person calls a record: maker, model and package; for a trim point its hull and speed. */
export function recordName(sqlite: Database.Database): (kind: Table, id: string) => string {
  const point = sqlite.prepare(
    "SELECT h.maker || ' ' || h.model || ' ' || t.speed_kn || ' kn' FROM trim_points t JOIN hulls h ON h.id = t.hull_id WHERE t.id = ?",
  );
  return (kind, id) => {
    const select =
      kind === 'trim-points'
        ? point
        : sqlite.prepare(`SELECT maker || ' ' || model || coalesce(' ' || package, '') FROM ${recordTable(kind).name} WHERE id = ?`);
    return (select.pluck().get(id) as string | undefined) ?? id;
  };
}
