import { decodeBytes } from '@tiltwright/shared/csv/encoding.ts';
import {
  mostColumns,
  type ParsedTable,
  type ParseRecords,
  parseTable,
  quoteLenient,
  type TableOptions,
} from '@tiltwright/shared/csv/formats.ts';
import type { ProblemCode } from '@tiltwright/shared/schemas/problem.ts';
import { parse } from 'csv-parse/sync';
import { ApiProblem } from '../../errors.ts';

/** The build of csv-parse for servers is some three times as fast as the one that also runs in a browser. */
const parseOnServer: ParseRecords = (text, options) => parse(text, options) as unknown as string[][];

/** Rows kept whole while a file is looked at: enough for its header and its decimal mark. */
const rowsLookedAt = 3000;
const filledRow = ['x'];
const blankRow = [''];

/** The further rows of a file of which only their number and width matter: a quarter of a million of them then weigh nothing. */
const parseThinly: ParseRecords = (text, options) => {
  let seen = 0;
  const on_record = (record: string[]) => {
    if (++seen <= rowsLookedAt || record.length > mostColumns) return record;
    return record.some((cell) => cell.trim() !== '') ? filledRow : blankRow;
  };
  return parse(text, { ...options, on_record }) as unknown as string[][];
};

/** Looks at a whole file: everything but the cells of its later rows. @throws as readTable does */
export const surveyTable = (bytes: Uint8Array, options: TableOptions): ParsedTable => readTable(bytes, { ...options, parse: parseThinly });

/**
 * Gives the file's rows one after another, keeping none: row number as a spreadsheet counts it, and its cells.
 * @param table what a look at the file has told of it
 * @param take false ends the reading
 */
export function eachRow(
  bytes: Uint8Array,
  { headerRow, unitRow, delimiter, encoding }: ParsedTable,
  take: (n: number, cells: string[]) => boolean,
): void {
  const decoded = decodeBytes(bytes, encoding);
  if ('problem' in decoded) throw new ApiProblem(coarse(decoded.problem), decoded.message);
  const first = headerRow + (unitRow ? 2 : 1);
  let n = 0;
  let going = true;
  const on_record = (record: string[]) => {
    n++;
    if (going && n >= first && record.some((cell) => cell.trim() !== '')) going = take(n, record);
    return null;
  };
  const records = quoteLenient(decoded.text, delimiter, (text, options) => parse(text, { ...options, on_record }) as unknown as string[][]);
  if ('problem' in records) throw new ApiProblem('bad-table', records.message);
}

/**
 * Reads a whole file. Where no canonical header is found, but a row looks like one in words of its own, that row is taken.
 * @throws ApiProblem binary-file, wrong-encoding, no-header or bad-table, with the finer code among its issues
 */
export function readTable(bytes: Uint8Array, options: TableOptions): ParsedTable {
  const read = parseTable(bytes, { parse: parseOnServer, ...options });
  if (read.problem === undefined) return read;
  if (read.problem === 'no-header' && read.likelyHeaderRow !== undefined && options.headerRow === undefined)
    return readTable(bytes, { ...options, headerRow: read.likelyHeaderRow });
  throw new ApiProblem(coarse(read.problem), read.message, [{ path: '/file', code: read.problem, message: read.message }]);
}

/** Bytes that hold the first rows of any table worth previewing. */
const headBytes = 262_144;

/** The first `rows` rows below the header, without reading the whole file. */
export function readHead(bytes: Uint8Array, options: TableOptions & { headerRow: number }, rows: number): ParsedTable {
  const whole = bytes.length <= headBytes;
  const to = options.headerRow + 2 + rows;
  const firstRows: ParseRecords = (text, how) =>
    parseOnServer(text, { ...how, to: typeof how.to === 'number' && how.to >= 0 ? Math.min(how.to, to) : to });
  return readTable(whole ? bytes : bytes.subarray(0, lastLineEnd(bytes, headBytes)), { ...options, parse: firstRows });
}

/** The file's very first rows, header or not. */
export function readTop(bytes: Uint8Array, options: TableOptions, rows: number): string[][] {
  const head = bytes.length <= headBytes ? bytes : bytes.subarray(0, lastLineEnd(bytes, headBytes));
  const records: string[][] = [];
  parseTable(head, {
    ...options,
    headerRow: 1,
    parse: (text, how) => {
      const found = parseOnServer(text, { ...how, to: rows });
      records.splice(0, records.length, ...found);
      return found;
    },
  });
  return records.map((record) => record.slice(0, 60).map((cell) => cell.slice(0, 200)));
}

/** Cut behind a line, so that no character is cut in two; in UTF-16 both bytes of the line's end are kept. */
function lastLineEnd(bytes: Uint8Array, before: number): number {
  const at = bytes.lastIndexOf(0x0a, before - 2);
  if (at < 0) return before & ~1;
  return bytes[at + 1] === 0 ? at + 2 : at + 1;
}

const coarse = (code: string): ProblemCode =>
  code === 'binary-file' || code === 'wrong-encoding' || code === 'no-header' ? code : 'bad-table';
