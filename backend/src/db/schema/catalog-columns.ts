// Catalog columns are derived from the zod fields, so that a value has one name, one unit and one range
// from the CSV header to the table's CHECK constraint.
import { columnOfField } from '@tiltwright/shared/csv/columns.ts';
import { type SQL, sql } from 'drizzle-orm';
import { type CheckBuilder, check, integer, real, text } from 'drizzle-orm/sqlite-core';
import * as z from 'zod';

type Shape = Record<string, z.ZodType>;

const number = (name: string) => real(name);
const whole = (name: string) => integer(name);
const word = (name: string) => text(name);
const list = (name: string) => text(name, { mode: 'json' }).$type<string[]>();

type ColumnFor<T> =
  NonNullable<T> extends number
    ? ReturnType<typeof number>
    : NonNullable<T> extends string
      ? ReturnType<typeof word>
      : ReturnType<typeof list>;
type ColumnsOf<S extends Shape> = {
  [K in keyof S & string]: undefined extends z.output<S[K]> ? ColumnFor<z.output<S[K]>> : ReturnType<ColumnFor<z.output<S[K]>>['notNull']>;
};

function unwrap(schema: z.ZodType): { inner: z.ZodType; required: boolean } {
  return schema instanceof z.ZodOptional ? { inner: schema.unwrap() as z.ZodType, required: false } : { inner: schema, required: true };
}

const isWhole = (schema: z.ZodType) => schema instanceof z.ZodNumber && schema.isInt;

/** One column a field, named in snake case; a required field is NOT NULL. */
export function columnsOf<S extends Shape>(shape: S): ColumnsOf<S> {
  const columns = Object.entries(shape).map(([field, schema]) => {
    const { inner, required } = unwrap(schema);
    const name = columnOfField(field);
    const column =
      inner instanceof z.ZodNumber ? (isWhole(inner) ? whole(name) : number(name)) : inner instanceof z.ZodArray ? list(name) : word(name);
    return [field, required ? column.notNull() : column];
  });
  return Object.fromEntries(columns) as ColumnsOf<S>;
}

/** CHECK constraints that mirror the fields' ranges and choices. */
export function checksOf(table: string, shape: Shape): CheckBuilder[] {
  return Object.entries(shape).flatMap(([field, schema]) => {
    const rule = ruleOf(columnOfField(field), unwrap(schema).inner);
    return rule ? [check(`${table}_${columnOfField(field)}`, rule)] : [];
  });
}

function ruleOf(column: string, schema: z.ZodType): SQL | undefined {
  if (schema instanceof z.ZodNumber) return sql.raw(`${column} BETWEEN ${schema.minValue} AND ${schema.maxValue}`);
  if (schema instanceof z.ZodEnum) return sql.raw(`${column} IN (${schema.options.map((option) => `'${option}'`).join(', ')})`);
  if (schema instanceof z.ZodArray) return sql.raw(`${column} IS NULL OR json_valid(${column})`);
  return undefined;
}
