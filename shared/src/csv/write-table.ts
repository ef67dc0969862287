// Records → CSV text (RFC 4180, UTF-8, comma, CRLF) that reads back as the same records and that no spreadsheet runs.
import type { Basis, Table } from '../schemas/catalog-record.ts';
import { type Column, columnsOf, findColumn } from './columns.ts';
import { guardFormula } from './words.ts';

/** One record as a table file can say it; the shape that reading a row gives. */
export interface WritableRecord {
  id?: string;
  values: Readonly<Record<string, unknown>>;
  sigmas?: Readonly<Record<string, number>>;
  /** Method by field, where it is not the record's. */
  methods?: Readonly<Record<string, Basis>>;
  method?: Basis;
  source?: string;
  sourceDate?: string;
}

/** One cell, quoted where a comma, a quote mark, a line break or a blank at an end asks for it. */
function escapeCell(text: string): string {
  return /[",\r\n]|^\s|\s$/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

/** One line of a CSV file with its line end. */
export function writeRow(cells: readonly string[]): string {
  return `${cells.map(escapeCell).join(',')}\r\n`;
}

function textOf(value: unknown, column: Column): string {
  if (value === undefined || value === null) return '';
  if (typeof value === 'number') return String(value);
  // Each item of a list is guarded by itself, as each is read by itself.
  if (Array.isArray(value)) return value.map((item) => (column.items === 'text' ? guardFormula(String(item)) : String(item))).join('|');
  return column.kind === 'text' ? guardFormula(String(value)) : String(value);
}

function cellOf(record: WritableRecord, column: Column): string {
  switch (column.role) {
    case 'value':
      return textOf(record.values[column.field], column);
    case 'row':
      return textOf((record as unknown as Record<string, unknown>)[column.field], column);
    case 'sigma':
      return textOf(record.sigmas?.[column.field], column);
    case 'method':
      return textOf(record.methods?.[column.field], column);
    default:
      return column.role satisfies never;
  }
}

/** The canonical header and the `_sigma` and `_method` columns that some of the records need. */
export function headerFor(table: Table, records: Iterable<Pick<WritableRecord, 'sigmas' | 'methods'>>): string[] {
  const [sigmas, methods] = [new Set<string>(), new Set<string>()];
  for (const record of records) {
    for (const field of Object.keys(record.sigmas ?? {})) sigmas.add(field);
    for (const field of Object.keys(record.methods ?? {})) methods.add(field);
  }
  return columnsOf(table).flatMap(({ column, field, role }) => [
    column,
    ...(role === 'value' && sigmas.has(field) ? [`${column}_sigma`] : []),
    ...(role === 'value' && methods.has(field) ? [`${column}_method`] : []),
  ]);
}

/**
 * A writer for the rows of one table, for output that is streamed.
 * @param header canonical names, as `headerFor` gives them
 * @throws where a name is no column of the table
 */
export function rowWriter(table: Table, header: readonly string[]): (record: WritableRecord) => string {
  const columns = header.map((name) => {
    const column = findColumn(table, name);
    if (!column) throw new Error(`${table} has no column ${name}`);
    return column;
  });
  return (record) => writeRow(columns.map((column) => cellOf(record, column)));
}

/** A whole table file, header first. */
export function writeTable(table: Table, records: readonly WritableRecord[]): string {
  const header = headerFor(table, records);
  const write = rowWriter(table, header);
  return writeRow(header) + records.map(write).join('');
}
