// A cell of a number column: its value in the column's unit, or why it has none and what it could mean.
import { type CellError, type CellFilled, filled, quoted, refused } from './cell.ts';
import type { Column } from './columns.ts';
import type { DecimalComma } from './number-text.ts';
import { plainMarks, type Quantity, readQuantity } from './quantities.ts';
import { type CellUnit, convert, type Dimension, dimensionOf, likelyUnits, unitFacts } from './units.ts';

export interface NumberOptions {
  /** Unit of a bare number where the header or the mapping states another than the column's. */
  unit?: CellUnit;
  decimalComma?: DecimalComma;
}

type NumberReader = (tidied: string) => CellFilled<number> | CellError;

/** The column's own unit; counts and ratios have none. */
function ownUnit(column: Column): CellUnit {
  return column.unit && column.unit !== 'year' ? column.unit : '1';
}

/** Nobody writes one value longer, twice in two units included. */
const longestNumber = 80;
const plainNumber = /^-?\d{1,9}(?:\.\d{1,9})?$/;

/**
 * The short way for the plain numbers that most cells hold: the value, or NaN where the cell needs a closer look.
 * Undefined where there is no short way, because a point may group thousands.
 */
export function plainNumberReader(column: Column, options: NumberOptions = {}): ((text: string) => number) | undefined {
  if (options.decimalComma === true) return undefined;
  const unit = ownUnit(column);
  const bareUnit = bareUnitOf(column, options);
  const { min = Number.NEGATIVE_INFINITY, max = Number.POSITIVE_INFINITY } = column;
  const integer = column.kind === 'integer';
  return (text) => {
    if (!plainNumber.test(text)) return Number.NaN;
    const value = convert(Number(text), bareUnit, unit);
    return value >= min && value <= max && (!integer || Number.isInteger(value)) ? value + 0 : Number.NaN; // + 0: no negative zero
  };
}

function bareUnitOf(column: Column, options: NumberOptions): CellUnit {
  const { unit } = options;
  return unit && unitFacts[unit].dimension === dimensionOf(column) ? unit : ownUnit(column);
}

/** A reader for one number column, its unit and limits settled once. */
export function numberReader(column: Column, options: NumberOptions = {}): NumberReader {
  const dimension = dimensionOf(column);
  const unit = ownUnit(column);
  const bareUnit = bareUnitOf(column, options);
  const { decimalComma } = options;
  const { min = Number.NEGATIVE_INFINITY, max = Number.POSITIVE_INFINITY } = column;
  const integer = column.kind === 'integer';
  const read = (text: string) => readQuantity(text, dimension, unit, bareUnit, decimalComma);

  return (tidied) => {
    if (tidied.length > longestNumber) return refused('not-a-number', `${quoted(tidied)} does not read as a number.`);
    const text = plainMarks(tidied);
    const found = readOrExplain(text, read);
    if (!found.ok) return found;
    if (integer && !Number.isInteger(found.value)) return refused('not-whole', `${quoted(tidied)} is not a whole number.`);
    if (found.value >= min && found.value <= max) return filled(found.value + 0);
    return outOfRange(tidied, found, column, dimension, unit, bareUnit);
  };
}

function unitSuffix(unit: CellUnit): string {
  return unit === '1' ? '' : unit === 'deg' ? '°' : ` ${unit}`;
}

function outOfRange(tidied: string, found: Quantity, column: Column, dimension: Dimension, unit: CellUnit, bareUnit: CellUnit): CellError {
  const { min = Number.NEGATIVE_INFINITY, max = Number.POSITIVE_INFINITY } = column;
  const suffix = unitSuffix(unit);
  const fits = (value: number) => value >= min && value <= max;
  const is = found.stated || bareUnit !== unit ? `${quoted(tidied)} is ${found.value}${suffix}` : `${found.value}`;
  let message = `${is}${found.stated || bareUnit !== unit ? ', which' : ''} is outside ${min} to ${max}${suffix}.`;
  const couldMean: string[] = [];
  if (!found.stated) {
    const bare = Number(convert(found.value, unit, bareUnit).toPrecision(12));
    for (const other of likelyUnits[dimension]) {
      const value = convert(bare, other, unit);
      if (other === bareUnit || !fits(value)) continue;
      message += ` ${bare} would be ${value}${suffix} if it were ${unitFacts[other].name}.`;
      couldMean.push(`${bare} ${other}`);
    }
  }
  if (dimension === 'level' && fits(-found.value)) {
    message += ` A level below the peak is negative: ${-found.value}.`;
    couldMean.push(String(-found.value));
  }
  return refused('out-of-range', message, couldMean);
}

type Read = (text: string) => Quantity | CellError | undefined;

const range = /^(.*\d.*?)(?:\s*(?:[-\u2010-\u2015]|\.\.+|…)\s*|\s+(?:to|or|and)\s+)([-+]?\d.*)$/i;
const approximate =
  /^(?:(?:~|≈|±|ca\.?|c\.|circa|about|approx\.?|approximately|roughly|around|some|est\.?)\s*(.+)|(.+?)\s*(?:approx\.?|approximately|or so))$/i;
const bound = /^(?:<=?|>=?|≤|≥|max\.?|min\.?|up to|under|over|at least|at most|less than|more than)\s*(.+)$/i;
const boundAfter = /^(.+?)\s*(?:\+|max\.?|min\.?|or more|or less)$/i;
const doubtful = /^(.+?)\s*[?*†!]+$/;
const tolerance = /^(.+?)\s*(?:±|\+\/-|\+-)\s*(.+)$/;
const inBrackets = /^(.+?)\s*[([]\s*(.+?)\s*[)\]]$/;
const byStroke = /^(.*[a-z"'°])\s*[/=]\s*(\d.*)$/i;

/** Two statements of one value, `20 in (508 mm)`, may differ by the rounding of either. */
const roundingShare = 0.01;

/** A word where a unit should stand may be part of a range or a remark: that says more than an unknown unit. */
function readOrExplain(text: string, read: Read): Quantity | CellError {
  const found = read(text);
  if (found?.ok || (found && found.code !== 'unknown-unit')) return found;
  const explained = explain(text, read);
  return found && !explained.ok && explained.code === 'not-a-number' ? found : explained;
}

/** A text that is no plain quantity: perhaps one stated twice, else an error that says what it could mean. */
function explain(text: string, read: Read): Quantity | CellError {
  const twice = inBrackets.exec(text) ?? byStroke.exec(text);
  if (twice) {
    const both = readTwice(twice[1] as string, twice[2] as string, text, read);
    if (both) return both;
  }
  const readable = (...texts: (string | undefined)[]) => texts.filter((t): t is string => t !== undefined && read(t)?.ok === true);
  const plusMinus = tolerance.exec(text);
  if (plusMinus) {
    const message = `${quoted(text)} states a tolerance: write the value here and the standard deviation in the column’s _sigma column.`;
    return refused('tolerance', message, readable(plusMinus[1]));
  }
  const about = approximate.exec(text);
  if (about) {
    const message = `${quoted(text)} is approximate: write the number, and say estimated in the column’s _method column.`;
    return refused('approximate', message, readable(about[1] ?? about[2]));
  }
  const limit = bound.exec(text) ?? boundAfter.exec(text);
  if (limit) return refused('bound', `${quoted(text)} is a limit, not a value.`, readable(limit[1]));
  const doubt = doubtful.exec(text);
  if (doubt) return refused('doubtful', `${quoted(text)} carries a mark of doubt or a footnote.`, readable(doubt[1]));
  const ends = range.exec(text);
  if (ends) return explainRange(text, ends[1] as string, ends[2] as string, read);
  return refused('not-a-number', `${quoted(text)} does not read as a number.`);
}

function readTwice(first: string, second: string, text: string, read: Read): Quantity | CellError | undefined {
  const [a, b] = [read(first), read(second)];
  if (!a?.ok || !b?.ok || !b.stated) return undefined;
  if (Math.abs(a.value - b.value) <= roundingShare * Math.max(Math.abs(a.value), Math.abs(b.value))) return a;
  return refused('two-values', `${quoted(text)} states two values that differ: keep one.`, [first, second]);
}

function explainRange(text: string, from: string, to: string, read: Read): CellError {
  // A unit after the second number speaks for both: 12-14 mm.
  const unitAfter = /[a-z"'°%/]+\.?$/i.exec(to)?.[0] ?? '';
  const low =
    read(from)?.ok && !(read(from) as Quantity).stated && unitAfter ? `${from}${unitAfter.startsWith('°') ? '' : ' '}${unitAfter}` : from;
  const couldMean = [low, to].filter((t) => read(t)?.ok);
  const asFeet = /^\d+$/.test(from) && /^\d{1,2}$/.test(to) ? `${from}' ${to}"` : undefined;
  const feet = asFeet && read(asFeet)?.ok ? [asFeet] : [];
  const also = feet.length > 0 ? ` It could also mean ${feet[0]}.` : '';
  return refused('range', `${quoted(text)} reads as a range: write one value.${also}`, [...couldMean, ...feet]);
}
