// What a catalog value is: its label, unit and how a CSV cell of it is read.
// zod schemas are the one source; this registry carries what zod has no place for.
import * as z from 'zod';

export type Unit = 'm' | 'mm' | 'deg' | 'kg' | 'hp' | 'kn' | 'khz' | 'db' | 'year';

export interface FieldMeta {
  /** Short label as the screens show it, without the unit. */
  label: string;
  /** Unit of the stored number; absent for words and pure numbers. */
  unit?: Unit;
  /** Where an owner finds or measures it, one sentence. */
  help?: string;
}

export const fieldMeta = z.registry<FieldMeta>();

const number = (unit: Unit | undefined, min: number, max: number, label: string, help?: string) => {
  const schema = z
    .number()
    .min(min)
    .max(max)
    .describe(describe(label, unit, min, max, help));
  fieldMeta.add(schema, { label, ...(unit && { unit }), ...(help && { help }) });
  return schema;
};

function describe(label: string, unit: Unit | undefined, min: number, max: number, help?: string) {
  return `${label}${unit ? `, ${unit}` : ''}, ${min} to ${max}.${help ? ` ${help}` : ''}`;
}

type Bounded = (min: number, max: number, label: string, help?: string) => z.ZodNumber;
export const metres: Bounded = (...rest) => number('m', ...rest);
export const millimetres: Bounded = (...rest) => number('mm', ...rest);
export const degrees: Bounded = (...rest) => number('deg', ...rest);
export const kilograms: Bounded = (...rest) => number('kg', ...rest);
export const horsepower: Bounded = (...rest) => number('hp', ...rest);
export const knots: Bounded = (...rest) => number('kn', ...rest);
export const kilohertz: Bounded = (...rest) => number('khz', ...rest);
export const decibels: Bounded = (...rest) => number('db', ...rest);
export const ratio: Bounded = (...rest) => number(undefined, ...rest);

export function count(min: number, max: number, label: string, help?: string) {
  const schema = z
    .int()
    .min(min)
    .max(max)
    .describe(describe(label, undefined, min, max, help));
  fieldMeta.add(schema, { label, ...(help && { help }) });
  return schema;
}

export function year(label: string) {
  const schema = z.int().min(1900).max(2100).describe(`${label}, 1900 to 2100.`);
  fieldMeta.add(schema, { label, unit: 'year' });
  return schema;
}

/** One line of words, trimmed; control characters are refused. */
export function words(max: number, label: string, help?: string) {
  const schema = z
    .string()
    .trim()
    .min(1)
    .max(max)
    .regex(/^[^\p{Cc}]*$/u, 'must not contain control characters')
    .describe(help ? `${label}. ${help}` : `${label}.`);
  fieldMeta.add(schema, { label, ...(help && { help }) });
  return schema;
}

export function oneOf<const T extends readonly [string, ...string[]]>(values: T, label: string, help?: string) {
  const schema = z.enum(values).describe(`${label}: ${values.join(', ')}.`);
  fieldMeta.add(schema as unknown as z.ZodEnum, { label, ...(help && { help }) });
  return schema;
}

/** A list; in a CSV cell its items stand between `|`. */
export function listOf<T extends z.ZodType>(item: T, max: number, label: string, help?: string) {
  const schema = z.array(item).max(max).describe(`${label}; between | in a CSV cell.`);
  fieldMeta.add(schema as unknown as z.ZodArray, { label, ...(help && { help }) });
  return schema;
}
