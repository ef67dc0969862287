import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { spellingGroups } from './cell-reader.table.ts';
import { cellReader, readCell } from './cell-reader.ts';
import { columnsOf, findColumn } from './columns.ts';
import { readYears } from './years.ts';

const all = spellingGroups.flatMap(({ table, spellings }) => spellings.map((spelling) => ({ table, ...spelling })));

describe('spellings', () => {
  it('are at least 120, all different', () => {
    expect(all.length).toBeGreaterThanOrEqual(120);
    const keys = all.map((s) => JSON.stringify([s.table, s.column, s.text, s.options]));
    expect(new Set(keys).size).toBe(all.length);
  });

  it.each(all)('$table $column: $text', ({ table, column: name, text, expected, options }) => {
    const column = findColumn(table, name);
    if (!column) throw new Error(`no column ${name}`);
    const found = readCell(text, column, options);
    if ('value' in expected) expect(found).toEqual({ ok: true, value: expected.value });
    else if ('blank' in expected) expect(found).toEqual({ ok: true, blank: true, erases: expected.blank === 'erasable' });
    else {
      expect(found).toMatchObject({ ok: false, code: expected.code, message: expect.stringMatching(/^.{10,}\.$/s) });
      if (!found.ok && expected.couldMean) expect(found.couldMean).toEqual(expected.couldMean);
    }
  });
});

describe('years', () => {
  it.each([
    ['2015', 2015, 2015],
    ['2015-18', 2015, 2018],
    ['2015–18', 2015, 2018],
    ["2015-'18", 2015, 2018],
    ['2015–2018', 2015, 2018],
    ['2015 - 2018', 2015, 2018],
    ['2015 to 2018', 2015, 2018],
    ['2009-12', 2009, 2012],
    ['1998-2002', 1998, 2002],
    ['2019+', 2019, null],
    ['2019-', 2019, null],
    ['2019–', 2019, null],
    ['2019 –', 2019, null],
    ['2019 onwards', 2019, null],
    ['2019-present', 2019, null],
    ['since 2019', 2019, null],
    ['up to 2018', null, 2018],
    ['–2018', null, 2018],
  ])('%s', (text, from, to) => {
    expect(readYears(text)).toEqual({ ok: true, value: { from, to } });
  });

  it.each([
    ['2018-2015', 'years-order', ['2015-2018']],
    ['1998-02', 'bad-years', ['1998-2002', '1998']],
    ['2010-10', 'bad-years', ['2010']],
    ['15-18', 'bad-years', ['2015-2018']],
    ["'98", 'bad-years', ['1998']],
    ['2015, 2017', 'bad-years', ['2015', '2017']],
    ['1850-2000', 'out-of-range', undefined],
    ['new', 'bad-years', undefined],
  ])('%s is an error: %s', (text, code, couldMean) => {
    const found = readYears(text);
    expect(found).toMatchObject({ ok: false, code });
    if (!found.ok) expect(found.couldMean).toEqual(couldMean);
  });
});

describe('any cell', () => {
  const numbers = columnsOf('hulls').filter((column) => column.kind === 'number');

  it('gives a number back as it was written, in the column’s own unit', () => {
    return fc.assert(
      fc.property(fc.constantFrom(...numbers), fc.double({ min: 0, max: 1, noNaN: true }), (column, share) => {
        const value = Number(((column.min as number) + share * ((column.max as number) - (column.min as number))).toFixed(3));
        fc.pre(value >= (column.min as number) && value <= (column.max as number));
        const reading = { ok: true, value: value + 0 };
        expect(readCell(String(value), column)).toEqual(reading);
        expect(readCell(` ${String(value).replace('-', '−')} ${column.unit ?? ''}`, column)).toEqual(reading);
      }),
    );
  });

  it('never gives a number outside the limits, nor throws, whatever stands in it', () => {
    const text = fc.oneof(
      fc.string({ maxLength: 30 }),
      fc.string({ unit: 'binary', maxLength: 30 }),
      fc
        .array(fc.constantFrom('1', '20', '.', ',', ' ', '-', '/', '½', "'", '"', '°', 'ft', 'in', 'm', 'kg', '(', ')', 'to', '±', 'e'))
        .map((a) => a.join('')),
    );
    return fc.assert(
      fc.property(fc.constantFrom(...columnsOf('hulls')), text, fc.constantFrom(true, false, undefined), (column, cell, decimalComma) => {
        const found = cellReader(column, { decimalComma })(cell);
        if (!found.ok) expect(found.message).not.toBe('');
        else if (!found.blank && typeof found.value === 'number') {
          expect(found.value).toBeGreaterThanOrEqual(column.min as number);
          expect(found.value).toBeLessThanOrEqual(column.max as number);
        }
      }),
      { numRuns: 2000 },
    );
  });

  it('is refused or read at once, however long it is', () => {
    for (const unit of ['1', ' ', '1 ', "1'", '- ', '2015-', 'a|', '(', '420:', 'é', '="']) {
      const text = `1${unit.repeat(200_000 / unit.length)}x`;
      for (const column of columnsOf('hulls')) {
        const from = performance.now();
        readCell(text, column);
        // The mark is wide: what has to be told apart is a few milliseconds from the minutes of a pattern that backtracks.
        expect(performance.now() - from, `${column.column} ${unit}`).toBeLessThan(500);
      }
    }
  });

  it('offers only readings that it would take', () => {
    for (const { table, column: name, text, options } of all) {
      const column = findColumn(table, name);
      if (!column || !['number', 'integer'].includes(column.kind)) continue;
      const found = readCell(text, column, options);
      if (found.ok || !['range', 'approximate', 'bound', 'doubtful', 'tolerance', 'out-of-range'].includes(found.code)) continue;
      for (const reading of found.couldMean ?? [])
        expect(`${reading}: ${JSON.stringify(readCell(reading, column).ok)}`).toBe(`${reading}: true`);
    }
  });
});
