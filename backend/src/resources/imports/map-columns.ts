// What a mapping fills, what it lacks, and the mapping a header suggests.
import { createHash } from 'node:crypto';
import { tidy } from '@tiltwright/shared/csv/cell.ts';
import { columnsOf, findColumn } from '@tiltwright/shared/csv/columns.ts';
import { canonicalName, likelyColumn, splitHeaderUnit, yearsColumn } from '@tiltwright/shared/csv/headers.ts';
import { type CellUnit, dimensionOf, unitFacts, unitOfWord } from '@tiltwright/shared/csv/units.ts';
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { MappedColumn, Mapping } from '@tiltwright/shared/schemas/mapping.ts';
import type { ProblemIssue } from '@tiltwright/shared/schemas/problem.ts';

export const isColumn = (table: Table, name: string) =>
  findColumn(table, name) !== undefined || (name === yearsColumn && findColumn(table, 'year_from') !== undefined);

/** Columns that the mapping reads from the file. */
export const filledColumns = ({ columns }: Pick<Mapping, 'columns'>): string[] =>
  columns.flatMap(({ to, split }) => [...(to ? [to] : []), ...(split?.into ?? [])]);

/** Required columns that nothing fills. */
export function missingColumns(table: Table, mapping: Mapping): string[] {
  const filled = new Set([...filledColumns(mapping), ...Object.keys(mapping.constants)]);
  return columnsOf(table).flatMap(({ column, required }) => (required && !filled.has(column) ? [column] : []));
}

/** What cannot be right about a mapping, by JSON Pointer. */
export function mappingFaults(table: Table, header: readonly string[], mapping: Mapping): ProblemIssue[] {
  const issues: ProblemIssue[] = [];
  const add = (path: string, code: string, message: string) => issues.push({ path, code, message });
  const seen = new Set<string>();
  const places = new Set<number>();
  mapping.columns.forEach(({ at, to, split, unit }, index) => {
    const path = `/columns/${index}`;
    if (at >= header.length) add(`${path}/at`, 'no-such-column', `The file has ${header.length} columns.`);
    if (places.has(at)) add(`${path}/at`, 'mapped-twice', `Column ${at} of the file is mapped twice; split it instead.`);
    places.add(at);
    for (const name of [to, ...(split?.into ?? [])]) {
      if (name === undefined) continue;
      if (!isColumn(table, name)) add(`${path}/to`, 'unknown-column', `${table} has no column ${name}.`);
      else if (seen.has(name)) add(`${path}/to`, 'filled-twice', `${name} is filled by two columns of the file.`);
      else if (unit && !fits(table, name, unit))
        add(`${path}/unit`, 'wrong-unit', `${name} is not measured in ${unitFacts[unit].name || unit}.`);
      seen.add(name);
    }
  });
  for (const name in mapping.constants) {
    const path = `/constants/${name}`;
    if (!isColumn(table, name)) add(path, 'unknown-column', `${table} has no column ${name}.`);
    else if (seen.has(name)) add(path, 'filled-twice', `${name} is filled by a column of the file already.`);
  }
  return issues;
}

function fits(table: Table, name: string, unit: CellUnit): boolean {
  const column = findColumn(table, name);
  return (
    column !== undefined && (column.kind === 'number' || column.kind === 'integer') && dimensionOf(column) === unitFacts[unit].dimension
  );
}

/** A header's words whatever their order, case and blanks; the column of reasons that an errors file carries does not count. */
export function fingerprint(header: readonly string[]): string {
  const words = header.map((text) => tidy(text).toLowerCase()).filter((text) => text !== '' && text !== 'reason');
  return createHash('sha256').update(JSON.stringify(words.sort())).digest('hex');
}

/** The mapping that the header's words and a row of units below it speak for; offered, never taken without a person's word. */
export function suggestMapping(table: Table, header: readonly string[], headerRow: number, unitRow: readonly string[] = []): Mapping {
  const taken = new Set<string>();
  const exact = header.map((text) => canonicalName(table, text));
  const columns = header.map((text, at): MappedColumn => {
    const likely = exact[at] === undefined ? likelyColumn(table, text) : { column: exact[at] };
    const pair = likely === undefined ? lengthTimesBeam(table, text) : undefined;
    const names = pair ?? (likely ? [likely.column] : []);
    // Of two claims to a column the exact name stands, then the first.
    const free = names.length > 0 && names.every((name) => !taken.has(name) && (exact[at] === name || !exact.includes(name)));
    if (!free) return { at, erase: false };
    for (const name of names) taken.add(name);
    const unit = [likely && 'unit' in likely ? likely.unit : splitHeaderUnit(text).unit, unitOfWord(unitRow[at] ?? '')].find(
      (stated) => stated !== undefined && names.every((name) => fits(table, name, stated)),
    );
    const target = pair ? { split: { by: 'times' as const, into: pair } } : { to: names[0]! };
    return { at, ...target, ...(unit && exact[at] === undefined && { unit }), erase: false };
  });
  return { headerRow, columns, constants: {} };
}

/** `Size (L x B)`, `Length × beam`: one cell for both. Common practice, no source. */
function lengthTimesBeam(table: Table, text: string): [string, string] | undefined {
  const words = splitHeaderUnit(text).words;
  const both = /^(l|loa|length)\s*(x|by|and)?\s*(b|w|beam|width)$/.test(words) || /^(size|dimensions?)( l x? ?[bw])?$/.test(words);
  return both && table === 'hulls' ? ['length_m', 'beam_m'] : undefined;
}

/** A remembered mapping laid over a header of the same words in another order. */
export function relocate(mapping: Mapping, rememberedHeader: readonly string[], header: readonly string[], headerRow: number): Mapping {
  const places = new Map(header.map((text, at) => [tidy(text).toLowerCase(), at] as const));
  const columns = mapping.columns.flatMap((column) => {
    const at = places.get(tidy(rememberedHeader[column.at] ?? '').toLowerCase());
    return at === undefined ? [] : [{ ...column, at }];
  });
  return { ...mapping, headerRow, columns };
}
