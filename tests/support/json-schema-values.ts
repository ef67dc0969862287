// Values from a JSON schema for fast-check: mostly what the schema asks for, at its edges, and now and then what nobody should send.
import fc from 'fast-check';

export type Schema = {
  $ref?: string;
  type?: string | string[];
  enum?: unknown[];
  const?: unknown;
  anyOf?: Schema[];
  oneOf?: Schema[];
  allOf?: Schema[];
  properties?: Record<string, Schema>;
  required?: string[];
  additionalProperties?: boolean | Schema;
  items?: Schema;
  prefixItems?: Schema[];
  minItems?: number;
  maxItems?: number;
  minimum?: number;
  maximum?: number;
  exclusiveMinimum?: number;
  exclusiveMaximum?: number;
  minLength?: number;
  maxLength?: number;
};
export type Components = Record<string, Schema>;

/** What breaks programs: wrong types, edges of numbers, strange text, names of the language's own objects, depth. */
export const hostile: fc.Arbitrary<unknown> = fc.oneof(
  fc.constantFrom<unknown>(null, true, false, 0, -0, -1, 1e308, -1e308, 5e-324, 2 ** 53, 0.1, '', ' ', 'null', 'NaN', '1e999'),
  fc.constantFrom<unknown>(
    '\u0000',
    '\ud800',
    '\u202eabc',
    '🚤'.repeat(50),
    'Ǆ',
    '%s%n',
    "'; DROP TABLE hulls; --",
    '../../etc/passwd',
    '<script>',
  ),
  fc.constantFrom<unknown>('__proto__', 'constructor', 'toString', 'hasOwnProperty', '#__proto__', 'x'.repeat(5000)),
  fc.constantFrom<unknown>([], {}, [[]], [null], [[[[[[[[{}]]]]]]]], { length: -1 }, { toString: 1 }),
  fc.string({ unit: 'binary', maxLength: 40 }),
  fc.double(),
  fc.maxSafeInteger(),
  fc.json({ maxDepth: 3 }).map((text) => JSON.parse(text) as unknown),
);

const rarely = <T>(usual: fc.Arbitrary<T>): fc.Arbitrary<unknown> =>
  fc.oneof({ arbitrary: usual, weight: 50 }, { arbitrary: hostile, weight: 1 });

export function schemaValue(schema: Schema | undefined, components: Components, depth = 0): fc.Arbitrary<unknown> {
  if (!schema || depth > 12) return fc.constant(null);
  const inner = (next: Schema | undefined) => schemaValue(next, components, depth + 1);
  if (schema.$ref) return inner(components[schema.$ref.split('/').at(-1)!]);
  const choices = schema.anyOf ?? schema.oneOf;
  if (choices) return fc.oneof(...choices.map(inner));
  if (schema.allOf) return inner(Object.assign({}, ...schema.allOf) as Schema);
  if (schema.const !== undefined) return rarely(fc.constant(schema.const));
  if (schema.enum) return rarely(fc.constantFrom(...schema.enum));
  const types = Array.isArray(schema.type) ? schema.type : [schema.type];
  return fc.oneof(...types.map((type) => rarely(ofType(type, schema, inner))));
}

function ofType(
  type: string | undefined,
  schema: Schema,
  inner: (next: Schema | undefined) => fc.Arbitrary<unknown>,
): fc.Arbitrary<unknown> {
  switch (type) {
    case 'object':
      return objectOf(schema, inner);
    case 'array':
      if (schema.prefixItems) return fc.tuple(...schema.prefixItems.map(inner));
      return fc.array(inner(schema.items), {
        minLength: Math.min(schema.minItems ?? 0, 5),
        maxLength: Math.max(schema.minItems ?? 0, Math.min(schema.maxItems ?? 4, 4)),
      });
    case 'string':
      return fc.string({ minLength: Math.min(schema.minLength ?? 0, 100), maxLength: Math.min(schema.maxLength ?? 30, 200) });
    case 'integer':
    case 'number':
      return numberOf(type, schema);
    case 'boolean':
      return fc.boolean();
    case 'null':
      return fc.constant(null);
    default:
      return hostile;
  }
}

function numberOf(type: 'integer' | 'number', schema: Schema): fc.Arbitrary<number> {
  const least = schema.minimum ?? schema.exclusiveMinimum ?? -1e6;
  const most = Math.max(least, schema.maximum ?? schema.exclusiveMaximum ?? 1e6);
  const edges = [least, most, least - 1, most + 1, 0];
  const within =
    type === 'integer'
      ? fc.integer({ min: Math.ceil(least), max: Math.max(Math.ceil(least), Math.floor(most)) })
      : fc.double({ min: least, max: most, noNaN: true });
  return fc.oneof({ arbitrary: within, weight: 6 }, { arbitrary: fc.constantFrom(...edges), weight: 1 });
}

function objectOf(schema: Schema, inner: (next: Schema | undefined) => fc.Arbitrary<unknown>): fc.Arbitrary<unknown> {
  const fields = Object.fromEntries(Object.entries(schema.properties ?? {}).map(([name, field]) => [name, inner(field)]));
  const known = fc.record(fields, { requiredKeys: (schema.required ?? []).filter((name) => name in fields) });
  const extra = typeof schema.additionalProperties === 'object' ? inner(schema.additionalProperties) : undefined;
  const names = fc.oneof(fc.string({ maxLength: 12 }), fc.constantFrom('__proto__', 'constructor', 'hasOwnProperty'));
  const more = extra ? fc.dictionary(names, extra, { maxKeys: 3 }) : fc.constant({});
  const stranger = fc.oneof(
    { arbitrary: fc.constant({}), weight: 30 },
    { arbitrary: fc.dictionary(names, hostile, { maxKeys: 2 }), weight: 1 },
  );
  return fc.tuple(known, more, stranger).map(([a, b, c]) => ({ ...a, ...b, ...c }));
}
