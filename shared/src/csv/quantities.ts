// Numbers with their units, as people write them: 16' 8", 20 1/2 in, 508mm, 14°, −4.
import { type CellError, quoted, refused } from './cell.ts';
import { type DecimalComma, readNumberText } from './number-text.ts';
import { ambiguousUnits, type CellUnit, convert, type Dimension, unitFacts, unitOfWord } from './units.ts';

export interface Quantity {
  ok: true;
  /** In the unit asked for. */
  value: number;
  /** The unit the cell itself stated; absent for a bare number. */
  stated?: CellUnit;
}

interface Part {
  value: number;
  /** True for digits alone: whole feet, whole degrees. */
  whole: boolean;
  unit?: CellUnit;
}

const fractionSigns: Readonly<Record<string, number>> = {
  '½': 1 / 2,
  '¼': 1 / 4,
  '¾': 3 / 4,
  '⅓': 1 / 3,
  '⅔': 2 / 3,
  '⅛': 1 / 8,
  '⅜': 3 / 8,
  '⅝': 5 / 8,
  '⅞': 7 / 8,
};
const signs = Object.keys(fractionSigns).join('');
/** Denominators on a rule or tape; 508/20 is not one. */
const tapeDenominators = new Set([2, 3, 4, 8, 10, 16, 32, 64]);

const mixed = new RegExp(`(\\d+)(?:\\s+|-|(?=[${signs}]))(?:(\\d+)/(\\d+)|([${signs}]))`, 'y');
const fraction = new RegExp(`(\\d+)/(\\d+)|([${signs}])`, 'y');
const digits = /\d+(?:\.\d+)?e[+-]?\d+|\d{1,3}(?: \d{3})+(?!\d)(?:[.,]\d+)?|\d(?:[\d.,]*\d)?\.?|\.\d+/iy;
const swissDigits = /\d{1,3}(?:'\d{3})+(?!\d)(?:\.\d+)?/y;
const unitWord = /(?:km\/h|mi\/h|m\/s|[a-z]+\.?|[°'"%])/iy;

/** Primes, curly quotes, ring signs and minus signs as the plain marks they stand for. */
export function plainMarks(text: string): string {
  return text
    .replace(/[\u2018\u2019\u2032\u00B4`]/g, "'")
    .replace(/[\u201C\u201D\u2033\u201E]/g, '"')
    .replace(/''|""/g, '"')
    .replace(/[\u00BA\u02DA]/g, '°')
    .replace(/\u2212/g, '-')
    .replace(/\u2044/g, '/');
}

/** Next smaller units, with how many make one of the unit before. */
const smaller: Readonly<Partial<Record<CellUnit, readonly [CellUnit, number]>>> = {
  ft: ['in', 12],
  m: ['cm', 100],
  cm: ['mm', 10],
  deg: ['arcmin', 60],
  arcmin: ['arcsec', 60],
};

class Scanner {
  private at = 0;
  private readonly text: string;
  private readonly dimension: Dimension;
  private readonly decimalComma: DecimalComma;

  constructor(text: string, dimension: Dimension, decimalComma: DecimalComma) {
    this.text = text;
    this.dimension = dimension;
    this.decimalComma = decimalComma;
  }

  get done(): boolean {
    return this.at >= this.text.length;
  }

  take(pattern: RegExp): RegExpExecArray | undefined {
    pattern.lastIndex = this.at;
    const found = pattern.exec(this.text);
    if (!found) return undefined;
    this.at = pattern.lastIndex;
    return found;
  }

  sign(): number {
    return this.take(/([+-])\s*/y)?.[1] === '-' ? -1 : 1;
  }

  number(): Part | CellError | undefined {
    const whole = this.take(mixed);
    if (whole) return fractionPart(Number(whole[1]), whole[2], whole[3], whole[4]);
    const part = this.take(fraction);
    if (part) return fractionPart(0, part[1], part[2], part[3]);
    const run = (this.dimension === 'length' || this.dimension === 'angle' ? undefined : this.take(swissDigits)) ?? this.take(digits);
    if (!run) return undefined;
    const reading = readNumberText(run[0], this.decimalComma);
    if (!reading) return undefined;
    if ('couldMean' in reading) {
      const [a, b] = reading.couldMean;
      return refused(
        'ambiguous-number',
        `${quoted(run[0])} could mean ${a} or ${b}: say which mark is the decimal mark.`,
        reading.couldMean,
      );
    }
    return { value: reading.value, whole: Number.isInteger(reading.value) };
  }

  /** Undefined at a digit or the end, an error for a word that is no unit of this dimension. */
  unit(before: CellUnit | undefined): CellUnit | CellError | undefined {
    this.take(/\s+/y);
    const word = this.take(unitWord)?.[0];
    this.take(/\s+/y);
    if (word === undefined) return undefined;
    if (this.dimension === 'angle' && before === 'deg' && word === "'") return 'arcmin';
    if (this.dimension === 'angle' && before === 'arcmin' && word === '"') return 'arcsec';
    const ambiguous = ambiguousUnits.get(word.toLowerCase().replace(/\.$/, ''));
    if (ambiguous) return refused('ambiguous-unit', `${quoted(word)} could mean ${ambiguous.join(', ')}.`, ambiguous);
    const unit = unitOfWord(word);
    if (!unit) return refused('unknown-unit', `${quoted(word)} is not a unit known here.`);
    if (unitFacts[unit].dimension !== this.dimension) return wrongUnit(unit, this.dimension);
    return unit;
  }

  /** A hyphen may stand between feet and inches: 16'-8". */
  hyphenAfterFeet(unit: CellUnit | undefined): void {
    if (unit === 'ft') this.take(/-\s*/y);
  }
}

function fractionPart(whole: number, top: string | undefined, bottom: string | undefined, sign: string | undefined): Part | undefined {
  if (sign) return { value: whole + (fractionSigns[sign] as number), whole: false };
  const [over, under] = [Number(top), Number(bottom)];
  if (!tapeDenominators.has(under) || over >= under || over === 0) return undefined;
  return { value: whole + over / under, whole: false };
}

const article: Readonly<Record<Dimension, string>> = {
  length: 'a length',
  angle: 'an angle',
  mass: 'a mass',
  power: 'a power',
  speed: 'a speed',
  frequency: 'a frequency',
  level: 'a level',
  ratio: 'a pure number',
  count: 'a count',
};

function wrongUnit(unit: CellUnit, wanted: Dimension): CellError {
  return refused(
    'wrong-unit',
    `${unitFacts[unit].name} measure ${article[unitFacts[unit].dimension]}; this column holds ${article[wanted]}.`,
  );
}

/**
 * Reads one quantity and converts it to `unit`. Undefined where the text is not one: the caller says why.
 * @param text tidy text with plain marks
 * @param unit unit of the result
 * @param bareUnit unit of a number that states none
 */
export function readQuantity(
  text: string,
  dimension: Dimension,
  unit: CellUnit,
  bareUnit: CellUnit,
  decimalComma: DecimalComma,
): Quantity | CellError | undefined {
  const scan = new Scanner(text, dimension, decimalComma);
  const sign = scan.sign();
  const parts: Part[] = [];
  while (!scan.done) {
    const part = scan.number();
    if (!part || 'ok' in part) return part;
    const before = parts.at(-1)?.unit;
    const stated = scan.unit(before);
    if (typeof stated === 'object') return stated;
    if (parts.length > 0) {
      const wrong = checkStep(parts.at(-1) as Part, part, stated ?? (before === 'ft' ? 'in' : undefined));
      if (wrong) return wrong === 'no' ? undefined : wrong;
    }
    part.unit = stated ?? (before === 'ft' ? 'in' : undefined);
    parts.push(part);
    scan.hyphenAfterFeet(part.unit);
    if (part.unit === undefined) break;
  }
  if (!scan.done || parts.length === 0) return undefined;
  if (text.endsWith('-')) return undefined;
  const sum = parts.reduce((total, part) => total + part.value * unitFacts[part.unit ?? bareUnit].factor, 0);
  const first = parts[0] as Part;
  if (parts.length === 1) return { ok: true, value: sign * convert(first.value, first.unit ?? bareUnit, unit), stated: first.unit };
  return { ok: true, value: sign * Number((sum / unitFacts[unit].factor).toPrecision(12)), stated: first.unit };
}

function checkStep(before: Part, part: Part, unit: CellUnit | undefined): CellError | 'no' | undefined {
  const step = before.unit && smaller[before.unit];
  if (!step || step[0] !== unit) return 'no';
  if (!before.whole) return refused('two-values', `A part of a ${before.unit} and ${unit} beside it: state one of them.`);
  if (part.value < step[1]) return undefined;
  const name = unitFacts[step[0]].name;
  return refused('bad-inches', `${part.value} ${name}: there are only ${step[1]} in one ${before.unit}.`);
}
