// From the headers a file has to the columns a table knows.
import type { Table } from '../schemas/catalog-record.ts';
import { tidy } from './cell.ts';
import { type Column, columnsOf, findColumn } from './columns.ts';
import { type CellUnit, unitOfWord } from './units.ts';

/** One column of model years, 2015-18, in place of year_from and year_to. */
export const yearsColumn = 'years';

/** Longer cells are no names of columns, and not worth a closer look. */
const longestHeader = 120;

/** The canonical name a header is, its case and its spaces or hyphens for underscores aside; undefined for an own header. */
export function canonicalName(table: Table, header: string): string | undefined {
  if (header.length > longestHeader) return undefined;
  const name = tidy(header)
    .toLowerCase()
    .replace(/[\s-]+/g, '_');
  if (findColumn(table, name)) return name;
  return name === yearsColumn && findColumn(table, 'year_from') ? name : undefined;
}

export interface HeaderMatch {
  /** In the order of the header: the column, or undefined for an own header. */
  columns: (Column | undefined)[];
  /** Place of a `years` column. */
  yearsAt?: number;
  /** Own headers, with their places. */
  unknown: { index: number; header: string }[];
  /** Canonical names that stand twice. */
  repeated: string[];
  /** Required columns that no header names. */
  missing: Column[];
}

/** Matches a whole header against a table's canonical columns. */
export function matchHeader(table: Table, header: readonly string[]): HeaderMatch {
  const match: HeaderMatch = { columns: [], unknown: [], repeated: [], missing: [] };
  const seen = new Set<string>();
  header.forEach((text, index) => {
    const name = canonicalName(table, text);
    match.columns.push(name === undefined ? undefined : findColumn(table, name));
    if (name === undefined) {
      if (tidy(text) !== '') match.unknown.push({ index, header: tidy(text) });
      return;
    }
    if (seen.has(name)) match.repeated.push(name);
    seen.add(name);
    if (name === yearsColumn) match.yearsAt = index;
  });
  match.missing = columnsOf(table).filter((column) => column.required && !seen.has(column.column));
  return match;
}

/** Headers met in the trade, by field; common practice, no source. Offered, never taken without a person's word. */
const tradeHeaders: Readonly<Record<string, readonly string[]>> = {
  maker: ['brand', 'manufacturer', 'builder', 'make', 'boat builder'],
  model: ['model name', 'name', 'boat', 'boat model', 'type'],
  package: ['trim', 'trim level', 'version', 'variant', 'edition'],
  yearFrom: ['first year', 'from', 'start year', 'year from'],
  yearTo: ['last year', 'to', 'end year', 'year to'],
  form: ['hull form', 'hull shape', 'hull type', 'bottom', 'shape'],
  lengthM: ['loa', 'length overall', 'overall length', 'boat length', 'hull length', 'length over all'],
  beamM: ['boa', 'width', 'beam overall', 'overall beam', 'max beam'],
  chineBeamM: ['bottom width', 'chine width', 'beam at chine', 'chine beam'],
  deadriseDeg: ['deadrise at transom', 'transom deadrise', 'vee angle', 'dead rise'],
  transomHeightMm: ['transom', 'shaft height'],
  material: ['hull material', 'construction', 'built of'],
  dryMassKg: ['weight', 'dry weight', 'mass', 'hull weight', 'boat weight'],
  loadedMassKg: ['loaded weight', 'displacement', 'weight loaded', 'running weight'],
  maxPowerHp: ['max hp', 'max power', 'maximum power', 'maximum horsepower', 'max horsepower'],
  powerHp: ['hp', 'horsepower', 'power', 'engine power'],
  drive: ['drive type', 'engine type', 'motor type'],
  shaftLengthMm: ['shaft', 'shaft length', 'leg length'],
  propDiameterMm: ['prop diameter', 'propeller'],
  housingLengthMm: ['length', 'transducer length'],
  housingWidthMm: ['width', 'transducer width'],
  housingHeightMm: ['height', 'transducer height'],
  sideFrequencyKhz: ['frequency', 'side frequency'],
  maxSpeedKn: ['max speed', 'top speed', 'maximum speed'],
  hullMaker: ['maker', 'brand', 'boat maker', 'builder', 'manufacturer'],
  hullModel: ['model', 'boat', 'boat model'],
  hullPackage: ['package', 'trim level'],
  hullYear: ['year', 'model year'],
  speedKn: ['speed', 'boat speed'],
  trimDeg: ['trim', 'trim angle', 'running angle'],
  runs: ['number of runs', 'passes'],
  notes: ['remarks', 'comment', 'comments'],
  aliases: ['also known as', 'other names', 'aka'],
  sourceDate: ['date', 'source date'],
};
const yearsHeaders = ['years', 'year', 'model year', 'model years', 'production years', 'years made'];

/** Words of a header in order, without unit, marks or case. */
function plainWords(text: string): string {
  return text
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .trim();
}

/** Splits `Length (ft)`, `Beam, in` or `Beam in` into the words and the unit they state. */
export function splitHeaderUnit(header: string): { words: string; unit?: CellUnit } {
  const text = tidy(header);
  const inBrackets = /^(.*?)\s*[([]\s*([^()[\]]+?)\s*[)\]]\s*$/.exec(text);
  const parts = inBrackets ?? /^(.+?)[\s,_/]+(\S+)$/.exec(text);
  const unit = parts ? unitOfWord(parts[2] as string) : undefined;
  if (parts && unit) return { words: plainWords(parts[1] as string), unit };
  return { words: plainWords(inBrackets ? (inBrackets[1] as string) : text) };
}

export interface LikelyColumn {
  column: string;
  /** Unit the header states, where it does. */
  unit?: CellUnit;
}

function spokenNames(column: Column): string[] {
  const suffix = column.unit ? `_${column.unit}` : '';
  const bare = suffix && column.column.endsWith(suffix) ? column.column.slice(0, -suffix.length) : column.column;
  return [bare, column.column, column.label, ...(tradeHeaders[column.field] ?? [])].map(plainWords);
}

const namesByTable = new Map<Table, Map<string, string>>();
function namesOf(table: Table): Map<string, string> {
  let names = namesByTable.get(table);
  if (!names) {
    names = new Map();
    const columns = columnsOf(table);
    // A column's own words come before what the trade calls it: of two claims to a header the first stands.
    for (const at of [0, 1, 2]) for (const column of columns) setFirst(names, spokenNames(column)[at] as string, column.column);
    if (findColumn(table, 'year_from')) for (const words of yearsHeaders) setFirst(names, words, yearsColumn);
    for (const column of columns) for (const words of spokenNames(column).slice(3)) setFirst(names, words, column.column);
    namesByTable.set(table, names);
  }
  return names;
}

function setFirst(names: Map<string, string>, words: string, column: string): void {
  if (!names.has(words)) names.set(words, column);
}

/** The column an own header most likely is, with the unit it states; to be offered in the mapping, never assumed. */
export function likelyColumn(table: Table, header: string): LikelyColumn | undefined {
  if (header.length > longestHeader) return undefined;
  const names = namesOf(table);
  const { words, unit } = splitHeaderUnit(header);
  const column = names.get(words) ?? names.get(plainWords(tidy(header)));
  if (column === undefined) return undefined;
  return { column, ...(unit && { unit }) };
}
