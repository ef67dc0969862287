// A record as it stands now, of whichever table, for comparing and undoing.
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type Database from 'better-sqlite3';
import type { RecordStatus } from '../../db/schema/catalog.ts';
import type { Origin } from '../../db/schema/imports.ts';
import { recordTable } from './record-table.ts';
import { type PointRow, pointState } from './trim-point-writer.ts';

export interface RecordState {
  status: RecordStatus;
  values: Readonly<Record<string, unknown>>;
  origins: Readonly<Record<string, Origin>>;
}

export function stateReader(sqlite: Database.Database): (kind: Table, id: string) => RecordState | undefined {
  const point = sqlite.prepare('SELECT * FROM trim_points WHERE id = ?');
  const records = new Map<Table, Database.Statement>();
  return (kind, id) => {
    if (kind === 'trim-points') {
      const row = point.get(id) as PointRow | undefined;
      return row && { status: row.status, ...pointState(row) };
    }
    const table = recordTable(kind);
    let select = records.get(kind);
    if (!select) {
      select = sqlite.prepare(`SELECT ${table.selected} FROM ${table.name} WHERE id = ?`).raw();
      records.set(kind, select);
    }
    const row = select.get(id) as unknown[] | undefined;
    if (!row) return undefined;
    const { status, values, provenance } = table.read(row);
    return { status, values, origins: provenance };
  };
}
