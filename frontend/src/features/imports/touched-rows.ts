import type { ListedRow } from './api/list-import-rows.ts';

/** The listed rows with those that were touched and are listed no more, in the file's order; what the list says of a row counts. */
export function withTouched(rows: readonly ListedRow[], touched: ReadonlyMap<number, ListedRow>): readonly ListedRow[] {
  const listed = new Set(rows.map(({ n }) => n));
  const gone = [...touched.values()].filter(({ n }) => !listed.has(n));
  return gone.length === 0 ? rows : [...rows, ...gone].sort((a, b) => a.n - b.n);
}
