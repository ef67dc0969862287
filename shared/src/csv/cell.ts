// What reading one cell can give: a value, nothing, or a reason with what the cell could have meant.

export type CellValue = number | string | string[];

export type CellErrorCode =
  | 'ambiguous-choice'
  | 'ambiguous-date'
  | 'ambiguous-number'
  | 'ambiguous-unit'
  | 'approximate'
  | 'bad-date'
  | 'bad-inches'
  | 'bad-years'
  | 'bound'
  | 'control-character'
  | 'doubtful'
  | 'formula'
  | 'not-a-number'
  | 'not-whole'
  | 'out-of-range'
  | 'range'
  | 'refused-drive'
  | 'spreadsheet-error'
  | 'tolerance'
  | 'too-long'
  | 'too-many-items'
  | 'two-values'
  | 'unknown-choice'
  | 'unknown-unit'
  | 'wrong-unit'
  | 'years-order';

export interface CellError {
  ok: false;
  code: CellErrorCode;
  message: string;
  /** Readings that would have been possible, as they could be typed. */
  couldMean?: string[];
}

export interface CellFilled<T = CellValue> {
  ok: true;
  value: T;
  blank?: undefined;
}

export interface CellBlank {
  ok: true;
  blank: true;
  /** True for a dash, `none` or `n/a`: erases the stored value where the mapping says so. An empty cell never does. */
  erases: boolean;
}

/** `if (!r.ok) … else if (r.blank) … else r.value` */
export type CellResult<T = CellValue> = CellFilled<T> | CellBlank | CellError;

export function filled<T>(value: T): CellFilled<T> {
  return { ok: true, value };
}

export function refused(code: CellErrorCode, message: string, couldMean?: readonly string[]): CellError {
  return { ok: false, code, message, ...(couldMean?.length && { couldMean: [...couldMean] }) };
}

const empty: CellBlank = { ok: true, blank: true, erases: false };
const erasing: CellBlank = { ok: true, blank: true, erases: true };

// Said for "nothing here". `na` alone is left out of words: it could be a name.
const erasingWords = new Set(['n/a', 'n.a.', 'n.a', 'n / a', 'none', 'null', 'nil']);
const unknownWords = new Set(['unknown', 'not stated', 'not known', 'not available', 'not specified', 'tbd', 'tba', 'tbc']);
const dashes = /^[-\u2010-\u2015\u2212_]+$/;
const questionMarks = /^\?+$/;
const longestBlankWord = 13;

/** False for nearly every cell that says something: figures, and letters other than the first of a blank word. */
function mayBeBlank(first: number): boolean {
  if (first >= 0x30 && first <= 0x39) return false;
  const letter = first | 0x20;
  return letter < 0x61 || letter > 0x7a || letter === 0x6e || letter === 0x74 || letter === 0x75; // n, t, u
}

/** Reads "nothing stated": an empty cell, dashes, `none`, `n/a`, `?`, `unknown`. Undefined where the cell says something. */
export function readBlank(trimmed: string): CellBlank | undefined {
  if (trimmed === '') return empty;
  if (trimmed.length > longestBlankWord || !mayBeBlank(trimmed.charCodeAt(0))) return undefined;
  if (dashes.test(trimmed)) return erasing;
  if (questionMarks.test(trimmed)) return empty;
  const word = trimmed.toLowerCase();
  if (erasingWords.has(word)) return erasing;
  if (unknownWords.has(word)) return empty;
  return undefined;
}

const invisible = /[\u00AD\u200B-\u200F\u2060\uFEFF]/g;
const oddSpaces = /[\u00A0\u2000-\u200A\u202F\u205F\u3000]/g;

/** Trimmed, without invisible marks, every kind of space a plain one. */
export function tidy(text: string): string {
  // Nearly every cell is plain ASCII: look before replacing.
  // biome-ignore lint/suspicious/noControlCharactersInRegex: the point is to find what is not ASCII
  return /[^\u0000-\u007F]/.test(text) ? text.replace(invisible, '').replace(oddSpaces, ' ').trim() : text.trim();
}

/** A cell's text inside a message, cut where it is long. */
export function quoted(text: string): string {
  return `“${text.length > 40 ? `${text.slice(0, 40)}…` : text}”`;
}

const spreadsheetError = /^#(n\/a|ref!|value!|div\/0!|name\?|num!|null!|spill!|calc!)$/i;

/** Spreadsheets save a failed formula as its error word. */
export function readSpreadsheetError(trimmed: string): CellError | undefined {
  if (!trimmed.startsWith('#') || !spreadsheetError.test(trimmed)) return undefined;
  return refused(
    'spreadsheet-error',
    `${quoted(trimmed)} is what a spreadsheet writes for a failed formula; type the value, or leave it blank.`,
  );
}
