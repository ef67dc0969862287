// The columns of each table, read off the zod fields: a CSV header and an API property are one name in two spellings.
import * as z from 'zod';
import { bases, type Table } from '../schemas/catalog-record.ts';
import { type FieldMeta, fieldMeta, type Unit } from '../schemas/field.ts';
import { hullFields, Strake } from '../schemas/hull.ts';
import { lowerUnitFields } from '../schemas/lower-unit.ts';
import { mountFields } from '../schemas/mount.ts';
import { transducerFields } from '../schemas/transducer.ts';
import { trimPointFields } from '../schemas/trim-point.ts';

/** `date` is an ISO date of the precision stated: 2024, 2024-05 or 2024-05-17. */
export type ColumnKind = 'number' | 'integer' | 'text' | 'enum' | 'list' | 'date';
/**
 * `value`: a field of the record. `row`: id and provenance of the whole row.
 * `sigma`, `method`: override for one cell; `field` and `of` name the field and column they speak of.
 */
export type ColumnRole = 'value' | 'row' | 'sigma' | 'method';

export interface Column {
  /** Canonical header, snake_case with its unit: chine_beam_m. */
  column: string;
  /** The record's property: chineBeamM. */
  field: string;
  role: ColumnRole;
  required: boolean;
  kind: ColumnKind;
  label: string;
  help?: string;
  /** Unit of the number; absent for words, counts and ratios. */
  unit?: Unit;
  min?: number;
  max?: number;
  /** Most characters of a text (of one item, in a list). */
  maxLength?: number;
  /** The words a choice, or each item of a list of choices, may be. */
  values?: readonly string[];
  /** Most items of a list. */
  maxItems?: number;
  /** What a list holds. */
  items?: 'text' | 'enum' | 'strake';
  /** The column that a sigma or method column speaks of. */
  of?: string;
}

const fieldsByTable = {
  hulls: hullFields,
  'lower-units': lowerUnitFields,
  transducers: transducerFields,
  mounts: mountFields,
  'trim-points': trimPointFields,
} satisfies Readonly<Record<Table, Readonly<Record<string, z.ZodType>>>>;

type Fields<T extends Table> = (typeof fieldsByTable)[T];
/** What a row of a table can say: every field of its record, none of them sure to be there. */
export type ValuesOf<T extends Table> = { [K in keyof Fields<T>]?: Fields<T>[K] extends z.ZodType ? z.infer<Fields<T>[K]> : never };

/** chineBeamM → chine_beam_m */
export function columnOfField(field: string): string {
  return field.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);
}

/** chine_beam_m → chineBeamM */
export function fieldOfColumn(column: string): string {
  return column.replace(/_([a-z0-9])/g, (_, letter: string) => letter.toUpperCase());
}

function unwrap(schema: z.ZodType): { inner: z.ZodType; required: boolean } {
  if (schema instanceof z.ZodOptional) return { inner: schema.unwrap() as z.ZodType, required: false };
  return { inner: schema, required: true };
}

function metaOf(schema: z.ZodType): FieldMeta | undefined {
  return fieldMeta.get(schema as never) as FieldMeta | undefined;
}

/** zod tells the greatest length of a text, but keeps that of an array among its checks. */
function mostItems(array: z.ZodArray): number | undefined {
  const limits = (array._zod.def.checks ?? []).map((check) => check._zod.def as { check: string; maximum?: number });
  return limits.find((limit) => limit.check === 'max_length')?.maximum;
}

type Shape = Pick<Column, 'kind' | 'min' | 'max' | 'maxLength' | 'values' | 'maxItems' | 'items'>;

function shapeOf(inner: z.ZodType, field: string): Shape {
  if (inner instanceof z.ZodNumber) {
    return { kind: inner.isInt ? 'integer' : 'number', min: inner.minValue ?? undefined, max: inner.maxValue ?? undefined };
  }
  if (inner instanceof z.ZodEnum) return { kind: 'enum', values: inner.options.map(String) };
  if (inner instanceof z.ZodString) return { kind: 'text', maxLength: inner.maxLength ?? undefined };
  if (inner instanceof z.ZodArray) {
    const maxItems = mostItems(inner);
    const item = inner.element as z.ZodType;
    if (item === Strake) return { kind: 'list', items: 'strake', maxItems };
    if (item instanceof z.ZodEnum) return { kind: 'list', items: 'enum', values: item.options.map(String), maxItems };
    if (item instanceof z.ZodString) return { kind: 'list', items: 'text', maxLength: item.maxLength ?? undefined, maxItems };
  }
  throw new Error(`no way to write ${field} in a CSV cell`);
}

function valueColumn(field: string, schema: z.ZodType): Column {
  const { inner, required } = unwrap(schema);
  const meta = metaOf(inner);
  return {
    column: columnOfField(field),
    field,
    role: 'value',
    required,
    label: meta?.label ?? field,
    ...(meta?.help && { help: meta.help }),
    ...(meta?.unit && { unit: meta.unit }),
    ...shapeOf(inner, field),
  };
}

const rowColumns: readonly Column[] = [
  { column: 'id', field: 'id', role: 'row', required: false, kind: 'text', label: 'Id', maxLength: 80 },
  { column: 'method', field: 'method', role: 'row', required: false, kind: 'enum', label: 'Method', values: bases },
  { column: 'source', field: 'source', role: 'row', required: false, kind: 'text', label: 'Source', maxLength: 300 },
  { column: 'source_date', field: 'sourceDate', role: 'row', required: false, kind: 'date', label: 'Source date' },
];

function sigmaColumn(of: Column): Column {
  const { unit } = of;
  return {
    column: `${of.column}_sigma`,
    field: of.field,
    role: 'sigma',
    required: false,
    kind: 'number',
    label: `${of.label}, σ`,
    ...(unit && unit !== 'year' && { unit }),
    min: 0,
    max: 1e6,
    of: of.column,
  };
}

function methodColumn(of: Column): Column {
  return {
    column: `${of.column}_method`,
    field: of.field,
    role: 'method',
    required: false,
    kind: 'enum',
    label: `${of.label}, method`,
    values: bases,
    of: of.column,
  };
}

interface TableColumns {
  /** The canonical header in its order: id, the record's fields, method, source, source_date. */
  list: readonly Column[];
  /** All of them and every `_sigma` and `_method` column, by name. */
  byName: ReadonlyMap<string, Column>;
}

function build(table: Table): TableColumns {
  const values = Object.entries(fieldsByTable[table]).map(([field, schema]) => valueColumn(field, schema));
  const [id, ...provenance] = rowColumns as [Column, ...Column[]];
  const list = [id, ...values, ...provenance];
  const overrides = values.flatMap((column) =>
    column.kind === 'number' || column.kind === 'integer' ? [sigmaColumn(column), methodColumn(column)] : [methodColumn(column)],
  );
  // A field of the record wins should an override ever spell the same.
  const byName = new Map([...overrides, ...list].map((column) => [column.column, column]));
  return { list, byName };
}

const cache = new Map<Table, TableColumns>();
function columnsByTable(table: Table): TableColumns {
  let found = cache.get(table);
  if (!found) {
    found = build(table);
    cache.set(table, found);
  }
  return found;
}

/** The canonical columns of a table in their order, without the `_sigma` and `_method` overrides. */
export function columnsOf(table: Table): readonly Column[] {
  return columnsByTable(table).list;
}

/** A column of a table by its exact canonical name, `<column>_sigma` and `<column>_method` included. */
export function findColumn(table: Table, name: string): Column | undefined {
  return columnsByTable(table).byName.get(name);
}
