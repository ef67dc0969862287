import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bases, type Table, tables } from '../schemas/catalog-record.ts';
import { type Column, columnsOf } from './columns.ts';
import { parseTable } from './formats.ts';
import { compileRowReader } from './read-row.ts';
import { headerFor, type WritableRecord, writeTable } from './write-table.ts';

function readBack(table: Table, csv: string) {
  const parsed = parseTable(new TextEncoder().encode(csv), { table });
  if (parsed.problem) throw new Error(parsed.message);
  return parsed.rows.map((row) => compileRowReader(table, parsed.header, { decimalComma: false })(row.cells));
}

/** Texts a cell may hold: what a person types, formula characters, apostrophes and separators among it. */
const words = fc
  .array(fc.constantFrom('a', 'Z', '7', ' ', '"', "'", ',', ';', '=', '+', '-', '@', 'é', '½', '′', '–', '\uFF1D'), {
    minLength: 1,
    maxLength: 12,
  })
  .map((letters) => `${letters.join('')}q`.trim().normalize('NFC'));

function valueFor(column: Column): fc.Arbitrary<unknown> {
  const { min = 0, max = 1 } = column;
  switch (column.kind) {
    case 'number':
      return fc.double({ min, max, noNaN: true }).map((value) => value + 0);
    case 'integer':
      return fc.integer({ min, max });
    case 'enum':
      return fc.constantFrom(...(column.values as string[]));
    case 'list':
      if (column.items === 'strake') return fc.constant(['420:150', '650.5:0']);
      if (column.items === 'enum') return fc.uniqueArray(fc.constantFrom(...(column.values as string[])), { minLength: 1 });
      return fc.uniqueArray(words, { minLength: 1, maxLength: 4 });
    default:
      return words;
  }
}

function recordFor(table: Table): fc.Arbitrary<WritableRecord> {
  const columns = columnsOf(table).filter((column) => column.role === 'value');
  const pairs = columns.map((column) => {
    const value = valueFor(column);
    return fc.tuple(fc.constant(column.field), column.required ? value : fc.option(value, { nil: undefined }));
  });
  const numbers = columns.filter((column) => column.kind === 'number').map((column) => column.field);
  return fc.record(
    {
      id: fc.constant('hul_01abc'),
      values: fc.tuple(...pairs).map((all) => Object.fromEntries(all.filter(([, value]) => value !== undefined))),
      sigmas: fc.dictionary(
        fc.constantFrom(...numbers),
        fc.double({ min: 0, max: 1e6, noNaN: true }).map((value) => value + 0),
      ),
      methods: fc.dictionary(fc.constantFrom(...numbers), fc.constantFrom(...bases)),
      method: fc.constantFrom(...bases),
      source: words,
      sourceDate: fc.constantFrom('2024', '2024-05', '2024-05-17'),
    },
    { requiredKeys: ['values', 'sigmas', 'methods'] },
  );
}

/** Rules between cells are not what is tested here: made-up numbers break them. */
const crossRules = /-over-|years-order/;

describe('a written table', () => {
  it.each(tables)('of %s reads back as it was', (table) =>
    fc.assert(
      fc.property(fc.array(recordFor(table), { minLength: 1, maxLength: 5 }), (records) => {
        const readings = readBack(table, writeTable(table, records));
        expect(readings).toHaveLength(records.length);
        readings.forEach(({ errors, cautions: _, erased, ...reading }, at) => {
          expect(errors.filter((error) => !crossRules.test(error.code))).toEqual([]);
          expect(erased).toEqual([]);
          expect(reading).toEqual(records[at]);
        });
      }),
      { numRuns: 100 },
    ),
  );

  it('guards each text that a spreadsheet would run, items of lists too', () => {
    const values = { maker: '=1+1', model: "'@x", form: 'flat', lengthM: 5, lcgM: 2, notes: '-2', aliases: ['+a', 'b'] };
    const csv = writeTable('hulls', [{ values, source: 'a, "b"' }]);
    for (const cell of [`'=1+1`, `''@x`, `'-2`, `'+a|b`, `"a, ""b"""`]) expect(csv).toContain(`,${cell},`);
    expect(readBack('hulls', csv)[0]).toMatchObject({ errors: [], values, source: 'a, "b"' });
  });

  it('leaves negative numbers numbers', () => {
    const values = { maker: 'Q', model: 'S', drive: 'outboard', powerHp: 9.9, trimMinDeg: -4 };
    const csv = writeTable('lower-units', [{ values }]);
    expect(csv).toContain(',-4,');
    expect(readBack('lower-units', csv)[0]?.values).toEqual(values);
  });

  it('writes override columns only where a record has one', () => {
    expect(headerFor('hulls', [{}])).toEqual(columnsOf('hulls').map((column) => column.column));
    const header = headerFor('hulls', [{ sigmas: { beamM: 0.1 } }, { methods: { beamM: 'measured' } }]);
    const at = header.indexOf('beam_m');
    expect(header.slice(at, at + 3)).toEqual(['beam_m', 'beam_m_sigma', 'beam_m_method']);
    expect(header).toHaveLength(columnsOf('hulls').length + 2);
  });
});
