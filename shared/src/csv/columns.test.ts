import { describe, expect, it } from 'vitest';
import { tables } from '../schemas/catalog-record.ts';
import { columnOfField, columnsOf, fieldOfColumn, findColumn } from './columns.ts';
import { canonicalName, likelyColumn, matchHeader, splitHeaderUnit } from './headers.ts';

describe('columns', () => {
  it('spells a field and its column both ways', () => {
    for (const table of tables) {
      for (const { column, field } of columnsOf(table)) {
        expect(columnOfField(field)).toBe(column);
        expect(fieldOfColumn(column)).toBe(field);
      }
    }
    expect(columnOfField('sideFrequencyKhz')).toBe('side_frequency_khz');
  });

  it('takes unit, limits and label from the schema', () => {
    expect(findColumn('hulls', 'deadrise_deg')).toMatchObject({
      field: 'deadriseDeg',
      kind: 'number',
      unit: 'deg',
      min: 0,
      max: 30,
      label: 'Deadrise',
      required: false,
    });
    expect(findColumn('hulls', 'steps')).toMatchObject({ kind: 'integer', min: 0, max: 5 });
    expect(findColumn('hulls', 'strakes')).toMatchObject({ kind: 'list', items: 'strake', maxItems: 12 });
    expect(findColumn('transducers', 'kinds')).toMatchObject({
      kind: 'list',
      items: 'enum',
      values: ['side', 'down', 'cone'],
      required: true,
    });
    expect(findColumn('mounts', 'aliases')).toMatchObject({ kind: 'list', items: 'text', maxItems: 30, maxLength: 80 });
  });

  it.each([
    ['hulls', ['maker', 'model', 'form', 'length_m']],
    ['lower-units', ['maker', 'model', 'drive', 'power_hp']],
    ['transducers', ['maker', 'model', 'kinds']],
    ['mounts', ['maker', 'model', 'kind']],
    ['trim-points', ['hull_maker', 'hull_model', 'speed_kn', 'trim_deg']],
  ] as const)('asks a row of %s for %j and no more', (table, required) => {
    expect(columnsOf(table).flatMap((c) => (c.required ? [c.column] : []))).toEqual(required);
  });

  it('has id and provenance in every table, and overrides for each value', () => {
    for (const table of tables) {
      for (const name of ['id', 'method', 'source', 'source_date']) expect(findColumn(table, name)?.role).toBe('row');
    }
    expect(findColumn('hulls', 'length_m_sigma')).toMatchObject({ role: 'sigma', field: 'lengthM', of: 'length_m', unit: 'm', min: 0 });
    expect(findColumn('hulls', 'form_method')).toMatchObject({ role: 'method', field: 'form', kind: 'enum' });
    expect(findColumn('hulls', 'form_sigma')).toBeUndefined();
    expect(findColumn('trim-points', 'sigma_deg')?.role).toBe('value');
  });
});

describe('headers', () => {
  it('knows a canonical name in any case', () => {
    expect(canonicalName('hulls', ' Length_M ')).toBe('length_m');
    expect(canonicalName('hulls', 'chine beam m')).toBe('chine_beam_m');
    expect(canonicalName('hulls', 'Years')).toBe('years');
    expect(canonicalName('trim-points', 'years')).toBeUndefined();
    expect(canonicalName('hulls', 'LOA')).toBeUndefined();
  });

  it('tells own, repeated and missing headers', () => {
    const match = matchHeader('hulls', ['maker', 'Boat', 'beam_m', 'BEAM_M', '']);
    expect(match.columns.map((c) => c?.column)).toEqual(['maker', undefined, 'beam_m', 'beam_m', undefined]);
    expect(match.unknown).toEqual([{ index: 1, header: 'Boat' }]);
    expect(match.repeated).toEqual(['beam_m']);
    expect(match.missing.map((c) => c.column)).toEqual(['model', 'form', 'length_m']);
  });

  it.each([
    ['Length (ft)', 'length', 'ft'],
    ['Beam, in', 'beam', 'in'],
    ['Dry weight [lbs]', 'dry weight', 'lb'],
    ['Transom height mm', 'transom height', 'mm'],
    ['Deadrise (°)', 'deadrise', 'deg'],
    ['Length (overall)', 'length', undefined],
    ['Model', 'model', undefined],
  ])('splits %s into words and unit', (header, words, unit) => {
    expect(splitHeaderUnit(header)).toEqual({ words, ...(unit && { unit }) });
  });

  it.each([
    ['hulls', 'LOA (ft)', 'length_m', 'ft'],
    ['hulls', 'Brand', 'maker', undefined],
    ['hulls', 'Deadrise at transom', 'deadrise_deg', undefined],
    ['hulls', 'Model years', 'years', undefined],
    ['lower-units', 'HP', 'power_hp', undefined],
    ['transducers', 'Length (mm)', 'housing_length_mm', 'mm'],
    ['trim-points', 'Boat speed (mph)', 'speed_kn', 'mph'],
  ] as const)('in %s offers for “%s” the column %s', (table, header, column, unit) => {
    expect(likelyColumn(table, header)).toEqual({ column, ...(unit && { unit }) });
  });

  it('offers nothing for a header it has no word for', () => {
    expect(likelyColumn('hulls', 'Colour')).toBeUndefined();
  });
});
