// Units a cell may be written in, each with its factor to the dimension's base unit.
// Factors are exact by definition: international foot and pound (1959), nautical mile (1929), metric horsepower = 75 kgf·m/s,
// mechanical horsepower = 550 ft·lbf/s, standard gravity 9.80665 m/s² (3rd CGPM, 1901).
import type { Unit } from '../schemas/field.ts';

export type Dimension = 'length' | 'angle' | 'mass' | 'power' | 'speed' | 'frequency' | 'level' | 'ratio' | 'count';

/** A unit that a header, a mapping or a cell may state. */
export type CellUnit =
  | 'm'
  | 'cm'
  | 'mm'
  | 'in'
  | 'ft'
  | 'deg'
  | 'arcmin'
  | 'arcsec'
  | 'rad'
  | 'kg'
  | 'lb'
  | 't'
  | 'hp'
  | 'ps'
  | 'kw'
  | 'w'
  | 'kn'
  | 'km/h'
  | 'mph'
  | 'm/s'
  | 'khz'
  | 'mhz'
  | 'hz'
  | 'db'
  | '%'
  | '1';

interface UnitFact {
  dimension: Dimension;
  /** Base units in one of this unit. */
  factor: number;
  /** As a sentence names it. */
  name: string;
}

const standardGravity = 9.80665;
const pound = 0.45359237;
const foot = 0.3048;

export const unitFacts: Readonly<Record<CellUnit, UnitFact>> = {
  m: { dimension: 'length', factor: 1, name: 'metres' },
  cm: { dimension: 'length', factor: 0.01, name: 'centimetres' },
  mm: { dimension: 'length', factor: 0.001, name: 'millimetres' },
  in: { dimension: 'length', factor: 0.0254, name: 'inches' },
  ft: { dimension: 'length', factor: foot, name: 'feet' },
  deg: { dimension: 'angle', factor: 1, name: 'degrees' },
  arcmin: { dimension: 'angle', factor: 1 / 60, name: 'minutes of arc' },
  arcsec: { dimension: 'angle', factor: 1 / 3600, name: 'seconds of arc' },
  rad: { dimension: 'angle', factor: 180 / Math.PI, name: 'radians' },
  kg: { dimension: 'mass', factor: 1, name: 'kilograms' },
  lb: { dimension: 'mass', factor: pound, name: 'pounds' },
  t: { dimension: 'mass', factor: 1000, name: 'tonnes' },
  w: { dimension: 'power', factor: 1, name: 'watts' },
  kw: { dimension: 'power', factor: 1000, name: 'kilowatts' },
  hp: { dimension: 'power', factor: 550 * foot * pound * standardGravity, name: 'horsepower' },
  ps: { dimension: 'power', factor: 75 * standardGravity, name: 'metric horsepower' },
  'm/s': { dimension: 'speed', factor: 1, name: 'metres a second' },
  'km/h': { dimension: 'speed', factor: 1 / 3.6, name: 'kilometres an hour' },
  kn: { dimension: 'speed', factor: 1852 / 3600, name: 'knots' },
  mph: { dimension: 'speed', factor: (5280 * foot) / 3600, name: 'miles an hour' },
  hz: { dimension: 'frequency', factor: 1, name: 'hertz' },
  khz: { dimension: 'frequency', factor: 1000, name: 'kilohertz' },
  mhz: { dimension: 'frequency', factor: 1e6, name: 'megahertz' },
  db: { dimension: 'level', factor: 1, name: 'decibels' },
  '%': { dimension: 'ratio', factor: 0.01, name: 'per cent' },
  '1': { dimension: 'ratio', factor: 1, name: '' },
};

const spellings: Readonly<Record<CellUnit, readonly string[]>> = {
  m: ['m', 'metre', 'metres', 'meter', 'meters', 'mtr', 'mtrs'],
  cm: ['cm', 'cms', 'centimetre', 'centimetres', 'centimeter', 'centimeters'],
  mm: ['mm', 'mms', 'millimetre', 'millimetres', 'millimeter', 'millimeters'],
  in: ['in', 'ins', 'inch', 'inches', '"'],
  ft: ['ft', 'feet', 'foot', "'"],
  deg: ['deg', 'degs', 'degree', 'degrees', '°'],
  arcmin: ['arcmin'],
  arcsec: ['arcsec'],
  rad: ['rad', 'rads', 'radian', 'radians'],
  kg: ['kg', 'kgs', 'kilo', 'kilos', 'kilogram', 'kilograms', 'kilogramme', 'kilogrammes'],
  lb: ['lb', 'lbs', 'pound', 'pounds'],
  t: ['t', 'tonne', 'tonnes'],
  hp: ['hp', 'bhp', 'horsepower'],
  ps: ['ps'],
  kw: ['kw', 'kilowatt', 'kilowatts'],
  w: ['w', 'watt', 'watts'],
  kn: ['kn', 'kns', 'kt', 'kts', 'knot', 'knots'],
  'km/h': ['km/h', 'kmh', 'kph'],
  mph: ['mph', 'mi/h'],
  'm/s': ['m/s', 'mps'],
  khz: ['khz', 'kilohertz'],
  mhz: ['mhz', 'megahertz'],
  hz: ['hz', 'hertz'],
  db: ['db', 'decibel', 'decibels'],
  '%': ['%', 'percent'],
  '1': [],
};

const bySpelling = new Map<string, CellUnit>(
  (Object.keys(spellings) as CellUnit[]).flatMap((unit) => spellings[unit].map((word) => [word, unit] as const)),
);

/** A unit by any of its trade spellings, case and a closing full stop aside; undefined for a word that is none. */
export function unitOfWord(word: string): CellUnit | undefined {
  const plain = word.trim().toLowerCase().replace(/\.$/, '');
  return bySpelling.get(plain === '\u2032' ? "'" : plain === '\u2033' ? '"' : plain);
}

const tons = ['1000 kg (tonne)', '2000 lb (short ton)', '2240 lb (long ton)'];
/** Words that mean different units to different people, with what they could mean. */
export const ambiguousUnits: ReadonlyMap<string, readonly string[]> = new Map([
  ['ton', tons],
  ['tons', tons],
  ['cwt', ['100 lb (short hundredweight)', '112 lb (long hundredweight)']],
]);

const dimensionOfField: Readonly<Record<Unit, Dimension>> = {
  m: 'length',
  mm: 'length',
  deg: 'angle',
  kg: 'mass',
  hp: 'power',
  kn: 'speed',
  khz: 'frequency',
  db: 'level',
  year: 'count',
};

/** What a column measures. Whole numbers without a unit are counts, other numbers without one are ratios. */
export function dimensionOf(column: { kind: string; unit?: Unit }): Dimension {
  if (column.unit) return dimensionOfField[column.unit];
  return column.kind === 'integer' ? 'count' : 'ratio';
}

/** A number stated in `from`, in a column's own unit. Twelve figures are kept, so that 16 ft 8 in is 5.08 m and not 5.0800000000000001. */
export function convert(value: number, from: CellUnit, to: CellUnit): number {
  if (from === to) return value;
  return Number(((value * unitFacts[from].factor) / unitFacts[to].factor).toPrecision(12));
}

/** Units a bare number may well have been meant in, likeliest first; offered in messages, never assumed. */
export const likelyUnits: Readonly<Record<Dimension, readonly CellUnit[]>> = {
  length: ['in', 'ft', 'mm', 'cm', 'm'],
  angle: [],
  mass: ['lb', 't', 'kg'],
  power: ['kw', 'w', 'hp'],
  speed: ['mph', 'km/h', 'kn'],
  frequency: ['mhz', 'hz', 'khz'],
  level: [],
  ratio: ['%'],
  count: [],
};
