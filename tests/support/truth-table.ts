// Published values: one CSV a function, one row a value, with where it stands and how far off the engine may be.
import { readFileSync } from 'node:fs';
import { parse } from 'csv-parse/sync';

export type TruthRow = Record<string, string>;

export function readTruth(name: string): TruthRow[] {
  return parse(readFileSync(new URL(`../truth/${name}.csv`, import.meta.url), 'utf8'), { columns: true, skip_empty_lines: true });
}

/** A number of a row; a blank or unreadable cell is a mistake in the table. */
export function numberIn(row: TruthRow, column: string): number {
  const text = row[column];
  const value = Number(text);
  if (text === undefined || text.trim() === '' || !Number.isFinite(value)) throw new Error(`no number in ${column}: ${text}`);
  return value;
}

/** How far off the engine may be, in the unit of the value; a tolerance ending in % is per cent of it. */
export function toleranceOf(row: TruthRow): number {
  const stated = row.tolerance ?? '';
  const tolerance = stated.endsWith('%')
    ? (Math.abs(numberIn(row, 'expected')) * Number(stated.slice(0, -1))) / 100
    : numberIn(row, 'tolerance');
  if (!(tolerance > 0)) throw new Error(`no tolerance for ${row.what}`);
  return tolerance;
}
