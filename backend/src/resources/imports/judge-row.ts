// What publishing would make of one row: the parts that all tables share.
import type { RowReading } from '@tiltwright/shared/csv/read-row.ts';
import type { CellProblem, Fate, FieldChange, RowResolution } from '@tiltwright/shared/schemas/import.ts';
import type { RowWrite } from '../../db/schema/imports.ts';
import type { Incoming, Merge } from './merge-values.ts';
import { overlap, type Years } from './stored.ts';

export interface Judgement {
  fate: Fate;
  name: string;
  recordId: string | null;
  /** What the row is about; null where that could not be found out. */
  rowKey: string | null;
  write: RowWrite | null;
  errors: CellProblem[];
  cautions: CellProblem[];
  /** Empty for a new record, whose changes are all its values. */
  changes: FieldChange[];
}

export interface Judge {
  judge(n: number, reading: RowReading, resolution: RowResolution | null): Judgement;
  /** Takes note of a row that was judged before, so that a check can go on where it stopped. */
  noteDone(n: number, rowKey: string, reading: RowReading): void;
}

/** A table without a word about its method is taken as a publication of its maker. */
const silentMethod = 'published';

export const incomingOf = (reading: RowReading): Incoming => ({
  values: reading.values,
  erased: reading.erased,
  sigmas: reading.sigmas,
  methods: reading.methods,
  method: reading.method ?? silentMethod,
  source: reading.source ?? null,
  sourceDate: reading.sourceDate ?? null,
});

export const failed = (name: string, reading: RowReading, ...more: CellProblem[]): Judgement => ({
  fate: 'error',
  name,
  recordId: null,
  rowKey: null,
  write: null,
  errors: [...reading.errors.map(plain), ...more],
  cautions: cautionsOf(reading),
  changes: [],
});

const plain = ({ column, value, code, message }: CellProblem): CellProblem => ({ column, value, code, message });
export const cautionsOf = (reading: RowReading): CellProblem[] =>
  reading.cautions.map(({ column, code, message }) => ({ column, code, message, value: '' }));

export function settle(
  name: string,
  reading: RowReading,
  recordId: string | null,
  rowKey: string,
  merge: Merge,
  isNew: boolean,
): Judgement {
  const base = { name, recordId, rowKey, cautions: cautionsOf(reading), changes: merge.changes, write: merge.write };
  if (merge.conflicts.length > 0) return { ...base, fate: 'conflict', errors: merge.conflicts };
  if (isNew) return { ...base, changes: [], fate: 'new', errors: [] };
  return { ...base, fate: merge.changes.length > 0 ? 'changed' : 'unchanged', errors: [] };
}

interface SeenRow {
  n: number;
  years: Years;
}

export interface SeenRows {
  note(n: number, key: string, years: Years): void;
  /** The judgement of a row whose key an earlier one has: a duplicate, or two rows that cannot both be right. */
  repeated(n: number, key: string, years: Years, name: string, reading: RowReading, column: string): Judgement | undefined;
}

/**
 * Rows of this file that were judged already, by what they are about.
 * @param readAgain reads an earlier row; repetitions are too rare to keep every row's reading for them
 */
export function seenRows(readAgain: (n: number) => RowReading): SeenRows {
  const seen = new Map<string, SeenRow | SeenRow[]>();
  const note = (n: number, key: string, years: Years) => {
    const rows = seen.get(key);
    if (rows === undefined) seen.set(key, { n, years });
    else if (Array.isArray(rows)) rows.push({ n, years });
    else seen.set(key, [rows, { n, years }]);
  };
  return {
    note,
    repeated(n, key, years, name, reading, column) {
      const rows = seen.get(key);
      const earlier = rows && (Array.isArray(rows) ? rows : [rows]).find((row) => overlap(row.years, years));
      if (!earlier) {
        note(n, key, years);
        return undefined;
      }
      if (printOf(readAgain(earlier.n)) === printOf(reading))
        return {
          ...failed(name, reading, { column, value: name, code: 'same-as-row', message: `Row ${earlier.n} says the same.` }),
          rowKey: key,
          fate: 'duplicate',
        };
      return {
        ...failed(name, reading, {
          column,
          value: name,
          code: 'same-record-twice',
          message: `Row ${earlier.n} speaks of the same record with other values.`,
        }),
        rowKey: key,
      };
    },
  };
}

const printOf = ({ values, erased, sigmas, methods, method, source, sourceDate }: RowReading) =>
  JSON.stringify([values, erased, sigmas, methods, method, source, sourceDate]);

export const yearWords = ({ from, to }: Years) =>
  from === null && to === null ? '' : from !== null && from === to ? String(from) : `${from ?? '…'}–${to ?? '…'}`;
export const anyYears: Years = { from: null, to: null };
