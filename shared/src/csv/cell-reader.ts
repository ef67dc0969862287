// The one tolerant reader of cells: what a form field, an import and a pasted value go through.
import {
  type CellError,
  type CellFilled,
  type CellResult,
  filled,
  quoted,
  readBlank,
  readSpreadsheetError,
  refused,
  tidy,
} from './cell.ts';
import { choiceReader } from './choices.ts';
import type { Column } from './columns.ts';
import { readDate } from './dates.ts';
import { listReader } from './lists.ts';
import { type NumberOptions, numberReader, plainNumberReader } from './numbers.ts';
import { readWords } from './words.ts';
import { readYears } from './years.ts';

export type CellOptions = NumberOptions;
export type CellReader = (text: string) => CellResult;

/** A reader for one column; make it once for a whole table. */
export function cellReader(column: Column, options: CellOptions = {}): CellReader {
  const readFilled = filledReader(column, options);
  const read: CellReader = (text) => {
    const tidied = tidy(text);
    return readBlank(tidied) ?? readSpreadsheetError(tidied) ?? readFilled(tidied);
  };
  if (column.kind === 'enum' || column.kind === 'date') return remembering(read);
  const isNumber = (column.kind === 'number' || column.kind === 'integer') && column.unit !== 'year';
  const readPlain = isNumber ? plainNumberReader(column, options) : undefined;
  if (!readPlain) return read;
  return (text) => {
    const value = readPlain(text);
    return Number.isNaN(value) ? read(text) : filled(value);
  };
}

/** Choices and dates repeat from row to row: the first few hundred readings are kept. Only for results that nobody changes. */
function remembering(read: CellReader): CellReader {
  const most = 500;
  const known = new Map<string, CellResult>();
  return (text) => {
    let found = known.get(text);
    if (found === undefined) {
      found = read(text);
      if (known.size < most) known.set(text, found);
    }
    return found;
  };
}

/**
 * Reads one cell into the column's unit. What can't be read, or could mean two things, is an error that says what it could mean.
 * @param text the cell as it stands in the file or was typed
 * @param options unit of a bare number where it is not the column's; whether the comma is the decimal mark
 */
export function readCell(text: string, column: Column, options: CellOptions = {}): CellResult {
  return cellReader(column, options)(text);
}

function filledReader(column: Column, options: CellOptions): (tidied: string) => CellFilled | CellError {
  if (column.unit === 'year') return readOneYear;
  switch (column.kind) {
    case 'number':
    case 'integer':
      return numberReader(column, options);
    case 'text': {
      const maxLength = column.maxLength ?? Number.POSITIVE_INFINITY;
      return (tidied) => readWords(tidied, maxLength);
    }
    case 'enum':
      return choiceReader(column.field === 'method' || column.role === 'method' ? 'method' : column.field, column.values ?? []);
    case 'list':
      return listReader(column, options);
    case 'date':
      return readDate;
    default:
      return column.kind satisfies never;
  }
}

function readOneYear(tidied: string): CellFilled<number> | CellError {
  const years = readYears(tidied);
  if (!years.ok) return years;
  const { from, to } = years.value;
  if (from !== null && from === to) return filled(from);
  const ends = [from, to].filter((year) => year !== null).map(String);
  return refused('range', `${quoted(tidied)} reads as a range of years; this column holds one year.`, ends);
}
