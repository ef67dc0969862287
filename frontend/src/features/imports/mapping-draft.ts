// What a person chooses in the mapping step, as plain data in, plain data out.
import { type Column, columnsOf, findColumn } from '@tiltwright/shared/csv/columns.ts';
import { yearsColumn } from '@tiltwright/shared/csv/headers.ts';
import { type CellUnit, type Dimension, dimensionOf, unitFacts } from '@tiltwright/shared/csv/units.ts';
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { SplitMark } from '@tiltwright/shared/schemas/mapping.ts';
import type { MappedColumn, Mapping } from './api/get-mapping.ts';

/** The choice "two values in one cell"; no canonical column is called so. */
export const splitTarget = '(split)';

export const splitMarkWords: Record<SplitMark, string> = {
  times: '×, x or “by”',
  stroke: '/',
  dash: '– or -',
  comma: ',',
  semicolon: ';',
  bar: '|',
  space: 'a blank',
};

/** "Deadrise, deg": the label of a canonical column with the unit of its bare numbers. */
export function columnWords(table: Table, name: string): string {
  if (name === yearsColumn) return 'Model years, such as 2015-18';
  const column = findColumn(table, name);
  if (!column) return name;
  return column.unit && column.unit !== 'year' ? `${column.label}, ${column.unit}` : column.label;
}

/** Canonical columns to choose from, the needed ones first. */
export function columnChoices(table: Table): { value: string; label: string }[] {
  const columns = columnsOf(table);
  const words = ({ column, required }: Column) => ({ value: column, label: `${columnWords(table, column)}${required ? ' (needed)' : ''}` });
  const years = columns.some(({ column }) => column === 'year_from')
    ? [{ value: yearsColumn, label: columnWords(table, yearsColumn) }]
    : [];
  return [...columns.filter(({ required }) => required).map(words), ...years, ...columns.filter(({ required }) => !required).map(words)];
}

export const namesOf = ({ to, split }: MappedColumn): string[] => (split ? [...split.into] : to ? [to] : []);

export function columnAt({ columns }: Mapping, at: number): MappedColumn {
  return columns.find((column) => column.at === at) ?? { at, erase: false };
}

/** Canonical columns that the file or a constant fills. */
export function filledNames({ columns, constants }: Mapping): Set<string> {
  return new Set([...columns.flatMap(namesOf), ...Object.keys(constants)]);
}

/** Units that a bare number of all these columns may be meant in; none for words, counts and years. */
export function unitChoices(table: Table, names: readonly string[]): CellUnit[] {
  const dimensions = new Set(names.map((name) => dimensionOfName(table, name)));
  const [dimension] = dimensions;
  if (dimensions.size !== 1 || dimension === undefined || dimension === 'count') return [];
  return (Object.keys(unitFacts) as CellUnit[]).filter((unit) => unitFacts[unit].dimension === dimension && unit !== '1');
}

function dimensionOfName(table: Table, name: string): Dimension | undefined {
  const column = findColumn(table, name);
  return column && (column.kind === 'number' || column.kind === 'integer') ? dimensionOf(column) : undefined;
}

/** A column of the file is given another meaning; a unit that cannot be its own is dropped, and so is a constant it replaces. */
export function withTarget(table: Table, mapping: Mapping, at: number, target: string): Mapping {
  const { unit, erase, to } = columnAt(mapping, at);
  const meaning: Pick<MappedColumn, 'to' | 'split'> =
    target === splitTarget ? { split: firstSplit(table, mapping, to) } : target === '' ? {} : { to: target };
  return withColumn(table, mapping, { at, ...meaning, ...(unit && { unit }), erase: target !== '' && erase });
}

/** Two columns that are still free, the one it had before first; hulls are most often written length × beam. */
function firstSplit(table: Table, mapping: Mapping, before: string | undefined): NonNullable<MappedColumn['split']> {
  const filled = filledNames(mapping);
  const free = columnsOf(table).flatMap(({ column }) => (filled.has(column) || column === 'id' ? [] : [column]));
  const likely = ['length_m', 'beam_m', 'year_from', 'year_to'].filter((column) => free.includes(column));
  const [first = 'notes', second = 'aliases'] = [...(before && before !== yearsColumn ? [before] : []), ...likely, ...free];
  return { by: 'times', into: [first, second] };
}

export function withColumn(table: Table, mapping: Mapping, column: MappedColumn): Mapping {
  const names = namesOf(column);
  const { unit, ...rest } = column;
  const fits = unit !== undefined && unitChoices(table, names).includes(unit);
  const others = mapping.columns.filter(({ at }) => at !== column.at);
  return {
    ...mapping,
    columns: [...others, { ...rest, ...(fits && { unit }) }].sort((a, b) => a.at - b.at),
    constants: Object.fromEntries(Object.entries(mapping.constants).filter(([name]) => !names.includes(name))),
  };
}

/** As it may be sent: a constant nobody has written yet is none. */
export function sendable(mapping: Mapping): Mapping {
  const written = Object.entries(mapping.constants).filter(([, text]) => text.trim() !== '');
  return { ...mapping, constants: Object.fromEntries(written) };
}
