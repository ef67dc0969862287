// One row of a table → values by field with their provenance, and every reason why a cell is wrong or odd.
import type { Basis, Table } from '../schemas/catalog-record.ts';
import { type CellErrorCode, type CellResult, type CellValue, quoted, readBlank, tidy } from './cell.ts';
import { type CellOptions, type CellReader, cellReader } from './cell-reader.ts';
import { type Column, columnsOf, findColumn, type ValuesOf } from './columns.ts';
import { matchHeader, yearsColumn } from './headers.ts';
import { cautionsOf, hardRules } from './row-rules.ts';
import type { CellUnit } from './units.ts';
import { readYears } from './years.ts';

export interface RowOptions {
  /** True or false where the file's decimal mark is known; undefined leaves `1,234` an error. */
  decimalComma?: boolean;
  /** Unit of bare numbers by column, where the mapping states another than the header's. */
  units?: Readonly<Record<string, CellUnit>>;
  /** Text of a column that the file lacks, by column: the maker of a maker's own list. */
  constants?: Readonly<Record<string, string>>;
  /** Columns in which a dash, `none` or `n/a` erases the stored value. */
  erase?: readonly string[];
}

export interface RowError {
  /** Canonical column, or the number of the cell counted from 1 where it has none. */
  column: string;
  /** The cell's text. */
  value: string;
  code: CellErrorCode | 'required' | 'cell-without-header' | (string & {});
  message: string;
  couldMean?: string[];
}

export interface RowCaution {
  column: string;
  code: string;
  message: string;
}

export interface RowReading<T extends Table = Table> {
  id?: string;
  /** Values by field; a blank or wrong cell leaves its field out. */
  values: ValuesOf<T>;
  /** Fields whose stored value this row takes away. */
  erased: string[];
  /** One standard deviation by field, in the field's unit. */
  sigmas: Record<string, number>;
  /** Method by field, where it is not the row's. */
  methods: Record<string, Basis>;
  method?: Basis;
  source?: string;
  sourceDate?: string;
  errors: RowError[];
  cautions: RowCaution[];
}

export type RowReader<T extends Table = Table> = (cells: readonly string[]) => RowReading<T>;

interface Slot {
  column: Column;
  read: CellReader;
  erases: boolean;
}

/** Working copy of a reading: fields are set by name. */
type Draft = Omit<RowReading, 'values'> & { values: Record<string, CellValue> };

/**
 * A reader for all rows of one table file, its header settled once.
 * @param header canonical names in the file's order; `years` for model years in one column; own headers are left unread
 */
export function compileRowReader<T extends Table>(table: T, header: readonly string[], options: RowOptions = {}): RowReader<T> {
  const match = matchHeader(table, header);
  if (match.repeated.length > 0) throw new Error(`${match.repeated.join(', ')} stands twice in the header`);
  const slotFor = (column: Column): Slot => ({
    column,
    read: cellReader(column, cellOptions(column, options)),
    erases: options.erase?.includes(column.column) ?? false,
  });
  const slots = match.columns.map((column) => (column ? slotFor(column) : undefined));
  const present = new Set(match.columns.map((column) => column?.column));
  const fixed = Object.entries(options.constants ?? {}).flatMap(([name, text]) => {
    const column = findColumn(table, name);
    return column && !present.has(name) ? [{ slot: slotFor(column), text }] : [];
  });
  const yearsConstant = match.yearsAt === undefined ? options.constants?.[yearsColumn] : undefined;
  const required = columnsOf(table).filter((column) => column.required);

  return (cells) => {
    const draft: Draft = { values: {}, erased: [], sigmas: {}, methods: {}, errors: [], cautions: [] };
    for (let at = 0; at < cells.length; at++) {
      const text = cells[at] as string;
      if (text === '') continue;
      const slot = slots[at];
      if (slot) readInto(draft, slot, text);
      else if (at === match.yearsAt) readYearsInto(draft, yearsColumn, text);
      else if (at >= header.length || (header[at] as string).trim() === '') refuseStray(draft, at, text);
    }
    for (const { slot, text } of fixed) readInto(draft, slot, text);
    if (yearsConstant !== undefined) readYearsInto(draft, yearsColumn, yearsConstant);
    finish(draft, table, required);
    return draft as RowReading<T>;
  };
}

/** Reads one row; for many rows of one header compile the reader once. */
export function readRow<T extends Table>(
  table: T,
  header: readonly string[],
  cells: readonly string[],
  options: RowOptions = {},
): RowReading<T> {
  return compileRowReader(table, header, options)(cells);
}

function cellOptions(column: Column, options: RowOptions): CellOptions {
  const unit = options.units?.[column.column] ?? (column.role === 'sigma' ? options.units?.[column.of as string] : undefined);
  return { decimalComma: options.decimalComma, ...(unit && { unit }) };
}

function readInto(draft: Draft, slot: Slot, text: string): void {
  const { column } = slot;
  const isYear = column.role === 'value' && (column.field === 'yearFrom' || column.field === 'yearTo');
  if (isYear && !readBlank(tidy(text))) {
    readYearsInto(draft, column.column, text);
    return;
  }
  const cell = slot.read(text);
  if (!cell.ok) fail(draft, column.column, text, cell);
  else if (cell.blank) {
    if (cell.erases && slot.erases && column.role === 'value') draft.erased.push(column.field);
  } else put(draft, column, cell.value);
}

function put(draft: Draft, column: Column, value: CellValue): void {
  switch (column.role) {
    case 'value':
      draft.values[column.field] = value;
      break;
    case 'sigma':
      draft.sigmas[column.field] = value as number;
      break;
    case 'method':
      draft.methods[column.field] = value as Basis;
      break;
    case 'row':
      (draft as unknown as Record<string, CellValue>)[column.field] = value;
      break;
    default:
      column.role satisfies never;
  }
}

function fail(draft: Draft, column: string, text: string, error: Extract<CellResult, { ok: false }>): void {
  const { code, message, couldMean } = error;
  draft.errors.push({ column, value: text, code, message, ...(couldMean && { couldMean }) });
}

/** Model years from one cell: both ends from a range, in whichever column it stands; from a single year the end its column names. */
function readYearsInto(draft: Draft, column: string, text: string): void {
  const tidied = tidy(text);
  if (readBlank(tidied)) return;
  const years = readYears(tidied);
  if (!years.ok) {
    fail(draft, column, text, years);
    return;
  }
  const { from, to } = years.value;
  const single = from === to;
  if (!(single && column === 'year_to')) setYear(draft, 'yearFrom', from, column, text);
  if (!(single && column === 'year_from')) setYear(draft, 'yearTo', to, column, text);
}

function setYear(draft: Draft, field: 'yearFrom' | 'yearTo', year: number | null, column: string, text: string): void {
  const stillMade = draft.erased.includes('yearTo');
  const other = field === 'yearTo' && stillMade ? null : draft.values[field];
  if (other !== undefined && other !== year && (year !== null || field === 'yearTo')) {
    const spoken = (y: unknown) => (y === null ? 'still made' : String(y));
    const message = `${quoted(text)} says ${spoken(year)}, another cell of the row ${spoken(other)}.`;
    draft.errors.push({ column, value: text, code: 'two-values', message, couldMean: [spoken(year), spoken(other)] });
  } else if (year !== null) draft.values[field] = year;
  // Open above is said, not left blank: a stored last year goes.
  else if (field === 'yearTo' && !stillMade) draft.erased.push('yearTo');
}

function refuseStray(draft: Draft, at: number, text: string): void {
  if (readBlank(tidy(text))) return;
  const message = `Cell ${at + 1} has no header above it; a separator or a quote mark too many?`;
  draft.errors.push({ column: String(at + 1), value: text, code: 'cell-without-header', message });
}

function finish(draft: Draft, table: Table, required: readonly Column[]): void {
  const failed = new Set(draft.errors.map((error) => error.column));
  for (const { column, field, label } of required) {
    if (draft.values[field] !== undefined || failed.has(column)) continue;
    draft.errors.push({ column, value: '', code: 'required', message: `${label} is missing; every row needs ${column}.` });
  }
  for (const breach of hardRules(table, draft.values)) {
    const value = String(draft.values[findColumn(table, breach.column)?.field ?? ''] ?? '');
    draft.errors.push({ ...breach, value });
  }
  draft.cautions.push(...cautionsOf(table, draft.values));
}
