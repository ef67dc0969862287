// What publishing would make of one row.
import type { RowReading } from '@tiltwright/shared/csv/read-row.ts';
import { hardRules } from '@tiltwright/shared/csv/row-rules.ts';
import { matchKey, normaliseName } from '@tiltwright/shared/names.ts';
import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { CellProblem, Fate, FieldChange } from '@tiltwright/shared/schemas/import.ts';
import type { Db } from '../../db/connect.ts';
import type { RowWrite } from '../../db/schema/imports.ts';
import { type Incoming, type Merge, mergeValues } from './merge-values.ts';
import { findTrimPoint, findTrimPointById, overlap, type Stored, type StoredRecord, storedRecords, type Years, yearsOf } from './stored.ts';

export interface Judgement {
  fate: Fate;
  name: string;
  recordId: string | null;
  write: RowWrite | null;
  errors: CellProblem[];
  cautions: CellProblem[];
  changes: FieldChange[];
}

export type Judge = (n: number, reading: RowReading) => Judgement;

/** Rows of this file that were judged already, by what they are about. */
type Seen = Map<string, { n: number; years: Years; print: string }[]>;

/** A table without a word about its method is taken as a publication of its maker. */
const silentMethod = 'published';

const incomingOf = (reading: RowReading, leaveOut: readonly string[] = []): Incoming => ({
  values: Object.fromEntries(Object.entries(reading.values).filter(([field]) => !leaveOut.includes(field))),
  erased: reading.erased,
  sigmas: reading.sigmas,
  methods: reading.methods,
  method: reading.method ?? silentMethod,
  source: reading.source ?? null,
  sourceDate: reading.sourceDate ?? null,
});

const failed = (name: string, reading: RowReading, ...more: CellProblem[]): Judgement => ({
  fate: 'error',
  name,
  recordId: null,
  write: null,
  errors: [...reading.errors.map(plain), ...more],
  cautions: withValues(reading),
  changes: [],
});

const plain = ({ column, value, code, message }: CellProblem): CellProblem => ({ column, value, code, message });
const withValues = (reading: RowReading): CellProblem[] =>
  reading.cautions.map(({ column, code, message }) => ({ column, code, message, value: '' }));

/** The same row twice is a duplicate; two rows that say different things of one record cannot both be right. */
function repetition(
  seen: Seen,
  key: string,
  years: Years,
  n: number,
  print: string,
): { duplicateOf: number } | { clashesWith: number } | undefined {
  const rows = seen.get(key) ?? [];
  const earlier = rows.find((row) => overlap(row.years, years));
  if (earlier) return earlier.print === print ? { duplicateOf: earlier.n } : { clashesWith: earlier.n };
  seen.set(key, [...rows, { n, years, print }]);
  return undefined;
}

const printOf = (reading: RowReading) =>
  JSON.stringify([reading.values, reading.erased, reading.sigmas, reading.methods, reading.method, reading.source, reading.sourceDate]);

function settle(name: string, reading: RowReading, recordId: string | null, merge: Merge): Judgement {
  const base = { name, recordId, cautions: withValues(reading), changes: merge.changes, write: merge.write };
  if (merge.conflicts.length > 0) return { ...base, fate: 'conflict', errors: merge.conflicts };
  if (recordId === null) return { ...base, fate: 'new', errors: [] };
  return { ...base, fate: merge.changes.length > 0 ? 'changed' : 'unchanged', errors: [] };
}

function twice(name: string, reading: RowReading, n: number, key: string, years: Years, seen: Seen, column: string): Judgement | undefined {
  const again = repetition(seen, key, years, n, printOf(reading));
  if (!again) return undefined;
  if ('duplicateOf' in again)
    return {
      ...failed(name, reading),
      fate: 'duplicate',
      errors: [{ column, value: name, code: 'same-as-row', message: `Row ${again.duplicateOf} says the same.` }],
    };
  return failed(name, reading, {
    column,
    value: name,
    code: 'same-record-twice',
    message: `Row ${again.clashesWith} speaks of the same record with other values.`,
  });
}

export function catalogJudge(db: Db, kind: CatalogTable): Judge {
  const stored: Stored = storedRecords(db, kind);
  const seen: Seen = new Map();
  return (n, reading) => {
    const { maker = '', model = '', package: pack } = reading.values as { maker?: string; model?: string; package?: string };
    const years = yearsOf(reading.values);
    const name = [maker, model, pack, yearWords(years)].filter(Boolean).join(' ') || `row ${n}`;
    if (reading.errors.length > 0) return failed(name, reading);

    const found = reading.id
      ? [stored.byId(reading.id)].filter((record) => record !== undefined)
      : stored.matching(maker, model, pack, years);
    if (reading.id && found.length === 0)
      return failed(name, reading, {
        column: 'id',
        value: reading.id,
        code: 'unknown-id',
        message: `There is no record ${reading.id}; leave the cell blank for a new one.`,
      });
    if (found.length > 1)
      return failed(name, reading, {
        column: 'year_from',
        value: yearWords(years),
        code: 'ambiguous-years',
        message: `Several records of this name overlap these years: ${found.map((record) => yearWords(yearsOf(record.values)) || 'all years').join(', ')}.`,
      });

    const record = found[0];
    const repeated = twice(
      name,
      reading,
      n,
      record?.id ?? matchKey(maker, model, pack),
      record ? { from: null, to: null } : years,
      seen,
      'model',
    );
    if (repeated) return repeated;
    return settleRecord(kind, name, reading, record);
  };
}

function settleRecord(kind: CatalogTable, name: string, reading: RowReading, record: StoredRecord | undefined): Judgement {
  // A record found by its name keeps its own spelling of it; only an id says that the name itself is to change.
  const merge = mergeValues(record, incomingOf(reading, record && !reading.id ? ['maker', 'model', 'package'] : []));
  if (record) {
    const breaches = hardRules(kind, { ...record.values, ...merge.write.values });
    if (breaches.length > 0)
      return failed(
        name,
        reading,
        ...breaches.map((breach) => ({ ...breach, message: `With the stored values: ${breach.message}`, value: '' })),
      );
  }
  return settle(name, reading, record?.id ?? null, merge);
}

const yearWords = ({ from, to }: Years) =>
  from === null && to === null ? '' : from !== null && from === to ? String(from) : `${from ?? '…'}–${to ?? '…'}`;

/** Hull + speed + condition + source. */
export const trimPointKey = (speedKn: number, condition: string | undefined, source: string | null) =>
  [speedKn, normaliseName(condition ?? ''), normaliseName(source ?? '')].join('|');

const hullNames = ['hullMaker', 'hullModel', 'hullPackage', 'hullYear'];

export function trimPointJudge(db: Db): Judge {
  const hulls = storedRecords(db, 'hulls');
  const seen: Seen = new Map();
  return (n, reading) => {
    const values = reading.values as {
      hullMaker?: string;
      hullModel?: string;
      hullPackage?: string;
      hullYear?: number;
      speedKn?: number;
      condition?: string;
    };
    const name =
      [values.hullMaker, values.hullModel, values.hullPackage, values.hullYear, values.speedKn === undefined ? '' : `${values.speedKn} kn`]
        .filter(Boolean)
        .join(' ') || `row ${n}`;
    if (reading.errors.length > 0) return failed(name, reading);

    const year = { from: values.hullYear ?? null, to: values.hullYear ?? null };
    const found = hulls.matching(values.hullMaker ?? '', values.hullModel ?? '', values.hullPackage, year);
    if (found.length === 0)
      return failed(name, reading, {
        column: 'hull_model',
        value: values.hullModel ?? '',
        code: 'unknown-hull',
        message: 'No published hull has this maker, model, package and year.',
      });
    if (found.length > 1)
      return failed(name, reading, {
        column: 'hull_year',
        value: String(values.hullYear ?? ''),
        code: 'ambiguous-hull',
        message: `Several hulls have this name; state hull_year: ${found.map((hull) => yearWords(yearsOf(hull.values)) || 'all years').join(', ')}.`,
      });

    const hullId = found[0]!.id;
    const key = trimPointKey(values.speedKn!, values.condition, reading.source ?? null);
    const point = reading.id ? findTrimPointById(db, reading.id) : findTrimPoint(db, hullId, key);
    if (reading.id && !point)
      return failed(name, reading, {
        column: 'id',
        value: reading.id,
        code: 'unknown-id',
        message: `There is no trim point ${reading.id}; leave the cell blank for a new one.`,
      });
    const repeated = twice(name, reading, n, `${hullId} ${key}`, { from: null, to: null }, seen, 'speed_kn');
    if (repeated) return repeated;

    const stored = point && { values: statedCells(point), provenance: provenanceOfPoint(point) };
    const merge = mergeValues(stored, incomingOf(reading, hullNames));
    const judged = settle(name, reading, point?.id ?? null, merge);
    return { ...judged, write: judged.write && { ...judged.write, values: { ...judged.write.values, hullId, matchKey: key } } };
  };
}

const measured = ['speedKn', 'trimDeg', 'sigmaDeg', 'runs', 'loadedMassKg', 'motorTrimDeg', 'condition'] as const;
type Point = NonNullable<ReturnType<typeof findTrimPoint>>;

const statedCells = (point: Point) =>
  Object.fromEntries(measured.flatMap((field) => (point[field] === null ? [] : [[field, point[field]]])));
const provenanceOfPoint = (point: Point) =>
  Object.fromEntries(
    measured.map((field) => [field, { basis: point.basis, sigma: null, source: point.source, sourceDate: point.sourceDate }]),
  );
