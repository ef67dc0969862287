// What a row would change in a record, value by value: better-based or newer data is never silently overwritten.

import { columnOfField } from '@tiltwright/shared/csv/columns.ts';
import { type Basis, bases } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { CellProblem, FieldChange, RowResolution } from '@tiltwright/shared/schemas/import.ts';
import type { Provenance } from '../../db/schema/catalog.ts';
import type { Origin, RowWrite } from '../../db/schema/imports.ts';

export interface Incoming {
  values: Readonly<Record<string, unknown>>;
  erased: readonly string[];
  sigmas: Readonly<Record<string, number>>;
  methods: Readonly<Record<string, Basis>>;
  method: Basis;
  source: string | null;
  sourceDate: string | null;
}

export interface Merge {
  write: RowWrite;
  changes: FieldChange[];
  conflicts: CellProblem[];
}

type Known = Readonly<{ values: Record<string, unknown>; provenance: Provenance }>;

/**
 * Without a stored record every value is new.
 * @param leaveOut fields that only find the record
 * @param resolution `row` lets the row's values replace better-based or newer ones, `catalog` lets those stand
 */
export function mergeValues(
  stored: Known | undefined,
  incoming: Incoming,
  leaveOut: readonly string[] = [],
  resolution: RowResolution | null = null,
): Merge {
  const { method, source, sourceDate, sigmas, methods } = incoming;
  const rowOrigin: Origin = { basis: method, sigma: null, source, sourceDate };
  const merge: Merge = { write: { values: {}, origin: rowOrigin }, changes: [], conflicts: [] };
  for (const field in incoming.values) {
    if (leaveOut.includes(field)) continue;
    const given = incoming.values[field];
    const value = field === 'aliases' ? union(stored?.values.aliases, given) : given;
    const own = methods[field] !== undefined || sigmas[field] !== undefined;
    const origin = own ? { ...rowOrigin, basis: methods[field] ?? method, sigma: sigmas[field] ?? null } : rowOrigin;
    mergeOne(merge, field, value, origin, stored?.values[field], stored?.provenance[field], resolution);
  }
  for (const field of incoming.erased) {
    if (stored?.values[field] === undefined) continue;
    merge.write.values[field] = null;
    merge.changes.push({ field, before: stored.values[field], after: null });
  }
  return merge;
}

function put({ write }: Merge, field: string, value: unknown, origin: Origin): void {
  write.values[field] = value;
  if (origin === write.origin) return;
  write.origins ??= {};
  write.origins[field] = origin;
}

function mergeOne(
  merge: Merge,
  field: string,
  value: unknown,
  origin: Origin,
  before: unknown,
  known: Origin | undefined,
  resolution: RowResolution | null,
): void {
  if (before === undefined) {
    put(merge, field, value, origin);
    merge.changes.push({ field, before: null, after: value });
    return;
  }
  const rank = known ? bases.indexOf(origin.basis) - bases.indexOf(known.basis) : -1;
  if (same(before, value)) {
    // The same value, better founded or with its spread stated: worth keeping.
    const sharper = rank < 0 || (rank === 0 && origin.sigma !== null && origin.sigma !== known?.sigma);
    if (!sharper) return;
    put(merge, field, value, origin);
    merge.changes.push(
      rank < 0
        ? { field: `${field}.basis`, before: known?.basis ?? null, after: origin.basis }
        : { field: `${field}.sigma`, before: known?.sigma ?? null, after: origin.sigma },
    );
    return;
  }
  const older = rank === 0 && known?.sourceDate != null && origin.sourceDate !== null && origin.sourceDate < known.sourceDate;
  if ((rank > 0 || older) && resolution !== 'row') {
    if (resolution === null) merge.conflicts.push(conflictOf(field, value, origin, before, known, rank > 0));
    return;
  }
  put(merge, field, value, origin);
  merge.changes.push({ field, before, after: value });
}

function conflictOf(
  field: string,
  value: unknown,
  origin: Origin,
  before: unknown,
  known: Origin | undefined,
  lower: boolean,
): CellProblem {
  return {
    column: columnOfField(field),
    value: shown(value),
    code: lower ? 'better-based-stands' : 'newer-stands',
    message: lower
      ? `${shown(before)} stands, which is ${known?.basis}; this one is ${origin.basis}.`
      : `${shown(before)} of ${known?.sourceDate} stands; this one is of ${origin.sourceDate}.`,
  };
}

const shown = (value: unknown) => (Array.isArray(value) ? value.join(' | ') : String(value));
const same = (a: unknown, b: unknown) =>
  a === b || (Array.isArray(a) && Array.isArray(b) && a.length === b.length && a.every((item, index) => item === b[index]));

/** Other spellings only gather. */
function union(stored: unknown, given: unknown): unknown {
  if (!Array.isArray(stored) || !Array.isArray(given)) return given;
  return [...new Set([...stored, ...given])];
}
