// Writes trim points: their values carry `hullId` and `matchKey` when they are new.
import { columnOfField } from '@tiltwright/shared/csv/columns.ts';
import type Database from 'better-sqlite3';
import type { Provenance, RecordStatus } from '../../db/schema/catalog.ts';
import { newId } from '../../ids.ts';
import type { HistoryWriter } from './history-writer.ts';
import type { RecordWrite } from './record-write.ts';

export const trimPointFields = ['speedKn', 'trimDeg', 'sigmaDeg', 'runs', 'loadedMassKg', 'motorTrimDeg', 'condition'] as const;

export interface PointRow {
  id: string;
  hull_id: string;
  revision: number;
  status: RecordStatus;
  basis: Provenance[string]['basis'];
  source: string | null;
  source_date: string | null;
  [column: string]: unknown;
}

export function trimPointWriter(sqlite: Database.Database, edition: number, history: HistoryWriter) {
  const select = sqlite.prepare('SELECT * FROM trim_points WHERE id = ?');
  const writable = ['hullId', 'matchKey', ...trimPointFields];

  return (write: RecordWrite): void => {
    const before = write.recordId === null ? undefined : (select.get(write.recordId) as PointRow | undefined);
    if (write.recordId !== null && !before) throw new Error(`the trim point ${write.recordId} is gone`);
    const id = before?.id ?? newId('trp');
    const revision = (before?.revision ?? 0) + 1;
    const { basis, source, sourceDate } = write.origin;
    const cells: Record<string, unknown> = { status: write.status ?? 'published', revision, edition };
    // Nothing but its status changes when a point is withdrawn.
    if (Object.keys(write.values).length > 0) Object.assign(cells, { basis, source, source_date: sourceDate });
    for (const field of writable) if (field in write.values) cells[columnOfField(field)] = write.values[field] ?? null;

    const columns = Object.keys(cells);
    if (before) {
      sqlite
        .prepare(`UPDATE trim_points SET ${columns.map((column) => `${column} = ?`).join(', ')} WHERE id = ?`)
        .run(...Object.values(cells), id);
    } else {
      const marks = columns.map(() => '?').join(', ');
      sqlite.prepare(`INSERT INTO trim_points (id, ${columns.join(', ')}) VALUES (?, ${marks})`).run(id, ...Object.values(cells));
    }
    history.sources(write);
    history.revision(write, id, revision, before && pointState(before));
    history.hullChanged((write.values.hullId as string | undefined) ?? before!.hull_id);
  };
}

/** A point has one origin for all it says. */
export function pointState(row: PointRow) {
  const origin = { basis: row.basis, sigma: null, source: row.source, sourceDate: row.source_date };
  const fields = ['hullId', 'matchKey', ...trimPointFields];
  return {
    values: Object.fromEntries(fields.map((field) => [field, row[columnOfField(field)]])),
    origins: Object.fromEntries(fields.map((field) => [field, origin])),
  };
}
