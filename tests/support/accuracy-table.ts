// The accuracy table of the README, made from the tables of published values.
// `npx tsx tests/support/accuracy-table.ts` writes it between its marks; a test fails while it is stale.
import { readFileSync, writeFileSync } from 'node:fs';
import { pathToFileURL } from 'node:url';
import { numberIn, readTruth, toleranceOf } from './truth-table.ts';
import { type Truth, truths } from './truths.ts';

const readme = new URL('../../README.md', import.meta.url);
const from = '<!-- accuracy:begin -->';
const to = '<!-- accuracy:end -->';

/** One line a table and unit: how many values, the worst error, how much of the tolerance it takes, and the sources. */
export function accuracyTable(): string {
  const lines = Object.entries(truths).flatMap(([name, truth]) => {
    const table = readTruth(name);
    const units = [...new Set(table.map(({ unit }) => unit ?? ''))];
    return units.map((unit) =>
      lineOf(
        truth,
        unit,
        table.filter((row) => row.unit === unit),
      ),
    );
  });
  return ['| what | values | worst error | of its tolerance | source |', '|---|---|---|---|---|', ...lines].join('\n');
}

function lineOf({ what, compute }: Truth, unit: string, rows: ReturnType<typeof readTruth>): string {
  const errors = rows.map((row) => Math.abs(compute(row) - numberIn(row, 'expected')));
  const used = rows.map((row, i) => (errors[i] as number) / toleranceOf(row));
  const worst = Number(Math.max(...errors).toPrecision(2));
  const sources = [...new Set(rows.map(({ source }) => source))].join('; ');
  return `| ${what} | ${rows.length} | ${worst} ${unit === '-' ? '' : unit} | ${Math.round(100 * Math.max(...used))} % | ${sources} |`;
}

/** The README with the table put between its marks. @throws Error where it has none */
export function withAccuracyTable(text: string): string {
  const start = text.indexOf(from);
  const end = text.indexOf(to);
  if (start < 0 || end < start) throw new Error(`README.md has no place for the table: ${from} … ${to}`);
  return `${text.slice(0, start + from.length)}\n${accuracyTable()}\n${text.slice(end)}`;
}

export const readReadme = (): string => readFileSync(readme, 'utf8');

if (process.argv[1] !== undefined && import.meta.url === pathToFileURL(process.argv[1]).href) {
  writeFileSync(readme, withAccuracyTable(readReadme()));
}
