// Text → records: RFC 4180 with commas, semicolons or tabs, and inch marks that nobody quoted.
import type { Options } from 'csv-parse/browser/esm/sync';
import { parse as parseAnywhere } from 'csv-parse/browser/esm/sync';
import { type Table, tables } from '../schemas/catalog-record.ts';
import { tidy } from './cell.ts';
import { findColumn } from './columns.ts';
import { type DecodingProblem, decodeBytes, type Encoding, type FileProblem } from './encoding.ts';
import { canonicalName, likelyColumn } from './headers.ts';
import { detectDecimalComma } from './number-text.ts';
import { unitOfWord } from './units.ts';

export const delimiters = [',', ';', '\t'] as const;
export type Delimiter = (typeof delimiters)[number];

export const mostRows = 250_000;
export const mostColumns = 500;
/** Rows above which a header is not looked for. */
const headerSearchRows = 30;
/** One record longer than this has swallowed its neighbours through a quote mark that never closes. */
const mostRecordBytes = 262_144;

/**
 * How csv-parse reads a file of ours, whether at once or as a stream. `relax_quotes` is the lenience wanted: a quote mark that does not
 * open its cell stands for itself. Blank lines stay records, so that a record's number is its row in a spreadsheet.
 */
export function recordOptions(delimiter: Delimiter) {
  return {
    delimiter,
    relax_quotes: true,
    relax_column_count: true,
    record_delimiter: ['\r\n', '\n', '\r'],
    max_record_size: mostRecordBytes,
    skip_empty_lines: false,
  } satisfies Options;
}

/** csv-parse's `parse`, from `csv-parse/sync` on a server (about three times as fast as the one that also runs in a browser). */
export type ParseRecords = (text: string, options: Options) => string[][];
const parseByDefault: ParseRecords = (text, options) => parseAnywhere(text, options) as unknown as string[][];

export type TableProblemCode =
  | DecodingProblem['problem']
  | 'no-header'
  | 'unbalanced-quotes'
  | 'too-many-rows'
  | 'too-many-columns'
  | 'duplicate-header'
  | 'conflicting-units';

export interface TableProblem extends FileProblem<TableProblemCode> {
  /** Row it was found in, counted as a spreadsheet does. */
  row?: number;
  /** For `no-header`: the row that looks like a header in words of its own, to be mapped. */
  likelyHeaderRow?: number;
}

export interface TableRow {
  /** Row of the file as a spreadsheet counts them; the header has its own. */
  n: number;
  cells: string[];
}

export interface ParsedTable {
  problem?: undefined;
  header: string[];
  headerRow: number;
  /** A row of units right below the header, left out of the rows. */
  unitRow?: string[];
  /** Rows with anything in them. */
  rows: TableRow[];
  delimiter: Delimiter;
  encoding: Encoding;
  /** True or false where the cells show which mark is the decimal mark. */
  decimalComma?: boolean;
}

export interface TableOptions {
  /** Table whose canonical headers are looked for; any table's without it. */
  table?: Table;
  /** Row of the header, counted from 1, where a person has chosen it; then no canonical header is asked for. */
  headerRow?: number;
  delimiter?: Delimiter;
  encoding?: Encoding;
  maxRows?: number;
  maxColumns?: number;
  parse?: ParseRecords;
}

function canonicalCount(record: readonly string[], of: readonly Table[]): number {
  return Math.max(...of.map((table) => new Set(record.map((cell) => canonicalName(table, cell)).filter(Boolean)).size));
}

function likelyCount(record: readonly string[], of: readonly Table[]): number {
  return Math.max(...of.map((table) => new Set(record.map((cell) => likelyColumn(table, cell)?.column).filter(Boolean)).size));
}

/** First records of a text, or none where a quote mark stays open. */
function firstRecords(text: string, delimiter: Delimiter, parse: ParseRecords): string[][] {
  try {
    return parse(text.slice(0, mostRecordBytes), { ...recordOptions(delimiter), to: headerSearchRows });
  } catch {
    return [];
  }
}

/** Comma, semicolon or tab: the one that makes a header known here, else the one that cuts the first rows into equal numbers of cells. */
export function detectDelimiter(text: string, parse: ParseRecords = parseByDefault): Delimiter {
  let best: { delimiter: Delimiter; score: number } = { delimiter: ',', score: 0 };
  for (const delimiter of delimiters) {
    const records = firstRecords(text, delimiter, parse).filter((record) => record.length > 1);
    const headers = Math.max(0, ...records.map((record) => canonicalCount(record, tables)));
    const widths = new Map<number, number>();
    for (const { length } of records) widths.set(length, (widths.get(length) ?? 0) + 1);
    const alike = Math.max(0, ...widths.values());
    // Known headers decide; among files in words of their own, evenly cut rows.
    const score = (headers >= 2 ? headers * 1000 : 0) + alike;
    if (score > best.score) best = { delimiter, score };
  }
  return best.delimiter;
}

interface CsvParseError {
  code?: string;
  records?: number;
}

/** Records of a text; the row where a quote mark opens and never closes is a problem. */
export function quoteLenient(text: string, delimiter: Delimiter, parse: ParseRecords = parseByDefault, to = -1): string[][] | TableProblem {
  try {
    return parse(text, { ...recordOptions(delimiter), to });
  } catch (error) {
    const { code, records = 0 } = error as CsvParseError;
    if (code !== 'CSV_QUOTE_NOT_CLOSED' && code !== 'CSV_MAX_RECORD_SIZE') throw error;
    const row = records + 1;
    if (code === 'CSV_MAX_RECORD_SIZE' && !text.includes('"')) {
      const tooLong = `Row ${row} is longer than ${mostRecordBytes} characters; at most ${mostColumns} cells are read.`;
      return { problem: 'too-many-columns', message: tooLong, row };
    }
    const message = `A quote mark opens a cell in row ${row} and never closes. Close it, or double the mark where it means inches at the start of a cell.`;
    return { problem: 'unbalanced-quotes', message, row };
  }
}

function findHeaderRow(records: readonly string[][], options: TableOptions): number | TableProblem {
  const of = options.table ? [options.table] : tables;
  if (options.headerRow !== undefined) {
    const record = records[options.headerRow - 1];
    if (record?.some((cell) => tidy(cell) !== '')) return options.headerRow;
    return { problem: 'no-header', message: `Row ${options.headerRow} is blank or not there; choose the row with the column names.` };
  }
  const first = records.slice(0, headerSearchRows);
  const canonical = first.findIndex((record) => canonicalCount(record, of) >= 2);
  if (canonical >= 0) return canonical + 1;
  const likely = first.findIndex((record) => likelyCount(record, of) >= 2);
  const hint = likely >= 0 ? ` Row ${likely + 1} looks like one in other words: map its columns.` : '';
  const message = `No row among the first ${headerSearchRows} holds column names known here, such as maker and model.${hint}`;
  return { problem: 'no-header', message, ...(likely >= 0 && { likelyHeaderRow: likely + 1 }) };
}

function findRepeated(header: readonly string[], row: number): TableProblem | undefined {
  const seen = new Set<string>();
  for (const text of header) {
    const name = text.toLowerCase();
    if (name !== '' && seen.has(name))
      return { problem: 'duplicate-header', message: `The column ${text} stands twice in row ${row}.`, row };
    seen.add(name);
  }
  return undefined;
}

/** The longest unit anyone spells out, in brackets. */
const longestUnit = 20;

/** A row of nothing but units below the header; one that contradicts a canonical header is a problem. */
function readUnitRow(
  header: readonly string[],
  record: readonly string[] | undefined,
  row: number,
  table?: Table,
): string[] | TableProblem | undefined {
  if (!record || record.some((cell) => cell.length > longestUnit)) return undefined;
  const words = record.map((cell) => tidy(cell).replace(/^[([]\s*(.*?)\s*[)\]]$/, '$1'));
  const stated = words.filter((word) => word !== '' && !/^[-–—]+$/.test(word));
  if (stated.length === 0 || !stated.every((word) => unitOfWord(word) !== undefined)) return undefined;
  for (const [at, word] of words.entries()) {
    const name = table && header[at] !== undefined ? canonicalName(table, header[at]) : undefined;
    const unit = table && name ? findColumn(table, name)?.unit : undefined;
    const says = unitOfWord(word);
    if (unit && says && unit !== says) {
      return { problem: 'conflicting-units', message: `Row ${row} says ${word} below ${name}; leave one unit standing.`, row };
    }
  }
  return words;
}

/** Cells looked at for the decimal mark. */
const decimalSampleRows = 2000;

/** Cells of the first rows that may hold numbers: those of text columns are no evidence of a decimal mark. */
function numberCells(header: readonly string[], rows: readonly TableRow[], table?: Table): string[] {
  const texts = header.map((text) => {
    const name = table && canonicalName(table, text);
    const kind = name && findColumn(table, name)?.kind;
    return kind !== undefined && kind !== 'number' && kind !== 'integer';
  });
  return rows.slice(0, decimalSampleRows).flatMap(({ cells }) => cells.filter((_, at) => !texts[at]));
}

/**
 * A whole file → header and rows, or what is wrong with it.
 * @param bytes the file as uploaded
 */
export function parseTable(bytes: Uint8Array, options: TableOptions = {}): ParsedTable | TableProblem {
  const { maxRows = mostRows, maxColumns = mostColumns, parse = parseByDefault } = options;
  const decoded = decodeBytes(bytes, options.encoding);
  if ('problem' in decoded) return decoded;
  const delimiter = options.delimiter ?? detectDelimiter(decoded.text, parse);
  const records = quoteLenient(decoded.text, delimiter, parse, maxRows + headerSearchRows + 2);
  if ('problem' in records) return records;

  const wide = records.findIndex((record) => record.length > maxColumns);
  if (wide >= 0) {
    const message = `Row ${wide + 1} has ${records[wide]?.length} cells; at most ${maxColumns} are read.`;
    return { problem: 'too-many-columns', message, row: wide + 1 };
  }
  const headerRow = findHeaderRow(records, options);
  if (typeof headerRow !== 'number') return headerRow;
  const header = (records[headerRow - 1] as string[]).map(tidy);
  const repeated = findRepeated(header, headerRow);
  if (repeated) return repeated;
  const unitRow = readUnitRow(header, records[headerRow], headerRow + 1, options.table);
  if (unitRow && 'problem' in unitRow) return unitRow;

  const rows: TableRow[] = [];
  for (let i = headerRow + (unitRow ? 1 : 0); i < records.length; i++) {
    const cells = records[i] as string[];
    if (cells.some((cell) => cell.trim() !== '')) rows.push({ n: i + 1, cells });
  }
  if (rows.length > maxRows) return { problem: 'too-many-rows', message: `More than ${maxRows} rows; split the file.` };
  const decimalComma = detectDecimalComma(numberCells(header, rows, options.table));
  return { header, headerRow, ...(unitRow && { unitRow }), rows, delimiter, encoding: decoded.encoding, decimalComma };
}
