// What a row would change in a record, value by value: better-based or newer data is never silently overwritten.

import { columnOfField } from '@tiltwright/shared/csv/columns.ts';
import { type Basis, bases } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { CellProblem, FieldChange } from '@tiltwright/shared/schemas/import.ts';
import type { Provenance } from '../../db/schema/catalog.ts';
import type { RowWrite } from '../../db/schema/imports.ts';

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

type Origin = Provenance[string];

/** Without a stored record every value is new. */
export function mergeValues(stored: { values: Record<string, unknown>; provenance: Provenance } | undefined, incoming: Incoming): Merge {
  const merge: Merge = { write: { values: {}, provenance: {} }, changes: [], conflicts: [] };
  for (const [field, given] of Object.entries(incoming.values)) {
    const value = field === 'aliases' ? union(stored?.values.aliases, given) : given;
    const origin: Origin = {
      basis: incoming.methods[field] ?? incoming.method,
      sigma: incoming.sigmas[field] ?? null,
      source: incoming.source,
      sourceDate: incoming.sourceDate,
    };
    mergeOne(merge, field, value, origin, stored?.values[field], stored?.provenance[field]);
  }
  for (const field of incoming.erased) {
    if (stored?.values[field] === undefined) continue;
    merge.write.values[field] = null;
    merge.changes.push({ field, before: stored.values[field], after: null });
  }
  return merge;
}

function mergeOne(merge: Merge, field: string, value: unknown, origin: Origin, before: unknown, known: Origin | undefined): void {
  const put = () => {
    merge.write.values[field] = value;
    merge.write.provenance[field] = origin;
  };
  if (before === undefined) {
    put();
    merge.changes.push({ field, before: null, after: value });
    return;
  }
  const rank = known ? bases.indexOf(origin.basis) - bases.indexOf(known.basis) : -1;
  if (same(before, value)) {
    // The same value, better founded or with its spread stated: worth keeping.
    const sharper = rank < 0 || (rank === 0 && origin.sigma !== null && origin.sigma !== known?.sigma);
    if (!sharper) return;
    put();
    merge.changes.push(
      rank < 0
        ? { field: `${field}.basis`, before: known?.basis ?? null, after: origin.basis }
        : { field: `${field}.sigma`, before: known?.sigma ?? null, after: origin.sigma },
    );
    return;
  }
  const older = rank === 0 && known?.sourceDate != null && origin.sourceDate !== null && origin.sourceDate < known.sourceDate;
  if (rank > 0 || older) {
    merge.conflicts.push({
      column: columnOfField(field),
      value: shown(value),
      code: rank > 0 ? 'better-based-stands' : 'newer-stands',
      message:
        rank > 0
          ? `${shown(before)} stands, which is ${known?.basis}; this one is ${origin.basis}.`
          : `${shown(before)} of ${known?.sourceDate} stands; this one is of ${origin.sourceDate}.`,
    });
    return;
  }
  put();
  merge.changes.push({ field, before, after: value });
}

const shown = (value: unknown) => (Array.isArray(value) ? value.join(' | ') : String(value));
const same = (a: unknown, b: unknown) =>
  Array.isArray(a) && Array.isArray(b) ? a.length === b.length && a.every((item, index) => item === b[index]) : a === b;

/** Other spellings only gather. */
function union(stored: unknown, given: unknown): unknown {
  if (!Array.isArray(stored) || !Array.isArray(given)) return given;
  return [...new Set([...stored, ...given])];
}
