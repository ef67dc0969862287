// One table as CSV that no spreadsheet runs and that reads back as unchanged.

import { headerFor, rowWriter, type WritableRecord, writeRow } from '@tiltwright/shared/csv/write-table.ts';
import type { Basis, Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { Db } from '../../db/connect.ts';
import type { Origin } from '../../db/schema/imports.ts';
import { type RecordState, stateReader } from '../editions/record-state.ts';
import { recordTable } from '../editions/record-table.ts';

/** Records to one piece of the answer: other requests get their turn between two. */
const recordsAtOnce = 500;

/** The table in pieces, header first. Only published records, in the order of their ids. */
export function* exportTable(db: Db, table: Table): Generator<string> {
  const header = headerFor(table, extrasOf(db, table));
  const write = rowWriter(table, header);
  yield writeRow(header);
  for (const records of published(db, table)) yield records.map(write).join('');
}

function* extrasOf(db: Db, table: Table): Generator<WritableRecord> {
  for (const records of published(db, table)) yield* records;
}

function* published(db: Db, table: Table): Generator<WritableRecord[]> {
  const { $client: sqlite } = db;
  const from = table === 'trim-points' ? 'trim_points t JOIN hulls h ON h.id = t.hull_id' : `${recordTable(table).name} t`;
  const only = table === 'trim-points' ? "AND h.status = 'published'" : '';
  const page = sqlite
    .prepare(`SELECT t.id FROM ${from} WHERE t.status = 'published' ${only} AND t.id > ? ORDER BY t.id LIMIT ${recordsAtOnce}`)
    .pluck();
  const stateOf = stateReader(sqlite);
  let after = '';
  while (true) {
    const ids = page.all(after) as string[];
    if (ids.length === 0) return;
    after = ids.at(-1)!;
    yield ids.flatMap((id) => {
      const state = stateOf(table, id);
      if (!state) return [];
      return table === 'trim-points' ? trimPointRow(id, state, stateOf('hulls', state.values.hullId as string)!) : recordRow(id, state);
    });
  }
}

/** A row has one method, source and date: those most of its values have. The method of the others stands beside them. */
function recordRow(id: string, { values, origins }: RecordState): WritableRecord {
  const main = commonest(Object.values(origins));
  const methods: Record<string, Basis> = {};
  const sigmas: Record<string, number> = {};
  for (const [field, { basis, sigma }] of Object.entries(origins)) {
    if (basis !== main?.basis) methods[field] = basis;
    if (sigma !== null) sigmas[field] = sigma;
  }
  return {
    ...{ id, values, methods, sigmas },
    ...(main && { method: main.basis, ...(main.source !== null && { source: main.source }) }),
    ...(main?.sourceDate && { sourceDate: main.sourceDate }),
  };
}

function commonest(origins: readonly Origin[]): Origin | undefined {
  const counted = new Map<string, { origin: Origin; times: number }>();
  for (const origin of origins) {
    const key = JSON.stringify([origin.basis, origin.source, origin.sourceDate]);
    const found = counted.get(key);
    if (found) found.times++;
    else counted.set(key, { origin, times: 1 });
  }
  return [...counted.values()].sort((a, b) => b.times - a.times)[0]?.origin;
}

function trimPointRow(id: string, point: RecordState, { values: hull }: RecordState): WritableRecord {
  const { hullId: _hullId, matchKey: _matchKey, ...said } = point.values;
  const { basis, source, sourceDate } = Object.values(point.origins)[0]!;
  return {
    id,
    values: { hullMaker: hull.maker, hullModel: hull.model, hullPackage: hull.package, hullYear: hull.yearFrom ?? hull.yearTo, ...said },
    ...{ method: basis, ...(source !== null && { source }), ...(sourceDate !== null && { sourceDate }) },
  };
}
