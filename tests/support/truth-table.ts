// Published values: one CSV a function, one row a value, with where it stands and how far off the engine may be.
import { readFileSync } from 'node:fs';
import { parse } from 'csv-parse/sync';
import { afterAll, describe, expect, it } from 'vitest';

export type TruthRow = Record<string, string>;

function readTruth(name: string): TruthRow[] {
  return parse(readFileSync(new URL(`../truth/${name}.csv`, import.meta.url), 'utf8'), { columns: true, skip_empty_lines: true });
}

/** A number of a row; a blank or unreadable cell is a mistake in the table. */
export function numberIn(row: TruthRow, column: string): number {
  const text = row[column];
  const value = Number(text);
  if (text === undefined || text.trim() === '' || !Number.isFinite(value)) throw new Error(`no number in ${column}: ${text}`);
  return value;
}

/**
 * Checks every row of a table: `compute` against the column `expected`, within `tolerance` (same unit, or per cent where it ends in %).
 * The number of rows is asserted so that none gets lost; the worst error is printed for the accuracy table.
 */
export function checkTruth(name: string, rows: number, compute: (row: TruthRow) => number): void {
  describe(`${name}.csv`, () => {
    const table = readTruth(name);
    let worst = 0;
    let worstUsed = 0;
    it(`has ${rows} rows`, () => expect(table).toHaveLength(rows));
    for (const row of table) {
      it(`${row.what} = ${row.expected} ${row.unit ?? ''} (${row.source})`, () => {
        const expected = numberIn(row, 'expected');
        const stated = row.tolerance ?? '';
        const tolerance = stated.endsWith('%') ? (Math.abs(expected) * Number(stated.slice(0, -1))) / 100 : numberIn(row, 'tolerance');
        expect(tolerance).toBeGreaterThan(0);
        const error = Math.abs(compute(row) - expected);
        worst = Math.max(worst, error);
        worstUsed = Math.max(worstUsed, error / tolerance);
        expect(error).toBeLessThanOrEqual(tolerance);
      });
    }
    afterAll(() => {
      console.log(
        `truth ${name}: ${table.length} rows, worst error ${worst.toPrecision(3)}, ${(worstUsed * 100).toFixed(0)} % of its tolerance`,
      );
    });
  });
}
