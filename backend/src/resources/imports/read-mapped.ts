// One row of a file, read through the mapping, the fixes for cells alike and the row's own edits.
import { readBlank, tidy } from '@tiltwright/shared/csv/cell.ts';
import { canonicalName } from '@tiltwright/shared/csv/headers.ts';
import { compileRowReader, type RowError, type RowOptions, type RowReader, type RowReading } from '@tiltwright/shared/csv/read-row.ts';
import type { CellUnit } from '@tiltwright/shared/csv/units.ts';
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { Fix, Mapping, SplitMark } from '@tiltwright/shared/schemas/mapping.ts';

export type RowEdits = Readonly<Record<string, string>>;

export interface MappedReader {
  read(cells: readonly string[], edits?: RowEdits): RowReading;
  /** The text that stands for a canonical column in this row; undefined where nothing does. */
  textOf(cells: readonly string[], column: string, edits?: RowEdits): string | undefined;
  /** Canonical columns that are read from the file, in order. */
  columns: readonly string[];
}

const splitters: Record<SplitMark, RegExp> = {
  times: /\s*[x×*]\s*|\s+by\s+/i,
  stroke: /\s*\/\s*/,
  dash: /\s*[-\u2010-\u2015\u2212]\s*/,
  comma: /\s*,\s*/,
  semicolon: /\s*;\s*/,
  bar: /\s*\|\s*/,
  space: /\s+/,
};

interface Part {
  at: number;
  split?: { by: SplitMark; half: 0 | 1; into: readonly [string, string] };
}

/**
 * @param header the file's own header
 * @param mapping null where the canonical headers say all
 */
export function mappedReader(
  table: Table,
  header: readonly string[],
  mapping: Mapping | null,
  options: Pick<RowOptions, 'decimalComma'> & { fixes?: readonly Fix[] } = {},
): MappedReader {
  const { names, parts } = mapping ? mappedColumns(mapping) : straightColumns(table, header);
  const decimalComma = mapping?.decimalComma ?? options.decimalComma;
  const rowOptions: RowOptions = { decimalComma, ...(mapping && optionsOf(mapping)) };
  const fixes = options.fixes ?? [];
  const places = new Map(names.map((name, place) => [name, place] as const));
  const readers = new Map<string, RowReader>();
  const readerFor = (more: readonly string[]) => {
    const key = more.join(',');
    const reader = readers.get(key) ?? compileRowReader(table, [...names, ...more], rowOptions);
    readers.set(key, reader);
    return reader;
  };
  const plainReader = readerFor([]);
  const isPlain = mapping === null && fixes.length === 0;

  const working = (cells: readonly string[], errors: RowError[]): string[] => {
    const picked = mapping ? parts.map((part) => pick(cells, part, errors)) : [...cells];
    for (const { column, from, to } of fixes) {
      const place = places.get(column);
      if (place !== undefined && (picked[place] ?? '').trim() === from.trim()) picked[place] = to;
    }
    return picked;
  };

  return {
    columns: names.filter((name) => name !== '' && !name.startsWith(unreadPrefix)),
    read(cells, edits) {
      if (isPlain && !edits) return plainReader(cells);
      const errors: RowError[] = [];
      const texts = working(cells, errors);
      const more = Object.keys(edits ?? {}).filter((column) => !places.has(column));
      for (const column in edits) {
        const place = places.get(column);
        if (place !== undefined) texts[place] = edits[column]!;
      }
      // Edits of columns the file has not stand behind its own; cells without a header stay behind those.
      if (more.length > 0) texts.splice(names.length, 0, ...padding(texts, names.length), ...more.map((column) => edits![column]!));
      const reading = readerFor(more)(texts);
      if (mapping) errors.push(...strayCells(cells, header.length));
      reading.errors.push(...errors.filter(({ column }) => edits?.[column] === undefined));
      return reading;
    },
    textOf(cells, column, edits) {
      if (edits?.[column] !== undefined) return edits[column];
      const place = places.get(column);
      return place === undefined ? mapping?.constants[column] : working(cells, [])[place];
    },
  };
}

const padding = (texts: readonly string[], length: number): string[] =>
  Array.from({ length: Math.max(0, length - texts.length) }, () => '');

/** A header nobody takes for a column. */
const unreadPrefix = '(left out ';

function mappedColumns(mapping: Mapping): { names: string[]; parts: Part[] } {
  const names: string[] = [];
  const parts: Part[] = [];
  for (const { at, to, split } of mapping.columns) {
    if (to) {
      names.push(to);
      parts.push({ at });
    }
    if (split)
      for (const half of [0, 1] as const) {
        names.push(split.into[half]);
        parts.push({ at, split: { by: split.by, half, into: split.into } });
      }
  }
  return { names, parts };
}

function straightColumns(table: Table, header: readonly string[]): { names: string[]; parts: Part[] } {
  const names = header.map((text, at) => canonicalName(table, text) ?? (text.trim() === '' ? '' : `${unreadPrefix}${at + 1})`));
  return { names, parts: names.map((_, at) => ({ at })) };
}

function optionsOf({ columns, constants }: Mapping): Pick<RowOptions, 'units' | 'erase' | 'constants'> {
  const units: Record<string, CellUnit> = {};
  const erase: string[] = [];
  for (const { to, split, unit, erase: erases } of columns) {
    for (const name of [to, ...(split?.into ?? [])]) {
      if (name === undefined) continue;
      if (unit) units[name] = unit;
      if (erases) erase.push(name);
    }
  }
  return { units, erase, constants };
}

function pick(cells: readonly string[], { at, split }: Part, errors: RowError[]): string {
  const text = cells[at] ?? '';
  if (!split) return text;
  const whole = tidy(text);
  if (readBlank(whole)) return whole;
  const halves = whole.split(splitters[split.by]);
  if (halves.length === 2 && halves.every((half) => half !== '')) return halves[split.half]!;
  if (split.half === 0) {
    const message = `“${whole.slice(0, 40)}” does not split into ${split.into[0]} and ${split.into[1]}.`;
    errors.push({ column: split.into[0], value: text, code: 'not-two-values', message });
  }
  return '';
}

function strayCells(cells: readonly string[], width: number): RowError[] {
  return cells.slice(width).flatMap((text, index) =>
    readBlank(tidy(text))
      ? []
      : [
          {
            column: String(width + index + 1),
            value: text,
            code: 'cell-without-header',
            message: `Cell ${width + index + 1} has no header above it; a separator or a quote mark too many?`,
          },
        ],
  );
}
