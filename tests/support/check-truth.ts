// Checks one table of published values, row by row.
import { afterAll, describe, expect, it } from 'vitest';
import { numberIn, readTruth, toleranceOf } from './truth-table.ts';
import { type Truth, truths } from './truths.ts';

/** The number of rows is asserted so that none gets lost; the worst error is printed. */
export function checkTruth(name: keyof typeof truths): void {
  describe(`${name}.csv`, () => {
    const { rows, compute }: Truth = truths[name];
    const table = readTruth(name);
    let worst = 0;
    let worstUsed = 0;
    it(`has ${rows} rows`, () => expect(table).toHaveLength(rows));
    for (const row of table) {
      it(`${row.what} = ${row.expected} ${row.unit ?? ''} (${row.source})`, () => {
        const error = Math.abs(compute(row) - numberIn(row, 'expected'));
        worst = Math.max(worst, error);
        worstUsed = Math.max(worstUsed, error / toleranceOf(row));
        expect(error).toBeLessThanOrEqual(toleranceOf(row));
      });
    }
    afterAll(() => {
      console.log(
        `truth ${name}: ${table.length} rows, worst error ${worst.toPrecision(3)}, ${(worstUsed * 100).toFixed(0)} % of its tolerance`,
      );
    });
  });
}
