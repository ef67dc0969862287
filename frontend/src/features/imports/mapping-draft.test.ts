import { describe, expect, it } from 'vitest';
import type { Mapping } from './api/get-mapping.ts';
import { columnChoices, sendable, splitTarget, unitChoices, withColumn, withTarget } from './mapping-draft.ts';

const mapping: Mapping = {
  headerRow: 2,
  columns: [
    { at: 0, to: 'model', erase: false },
    { at: 1, to: 'length_m', unit: 'ft', erase: true },
  ],
  constants: { maker: 'Testyard', form: ' ' },
};

describe('a mapping while it is chosen', () => {
  it('offers the needed columns first, and model years where a table has years', () => {
    const hulls = columnChoices('hulls');
    expect(hulls.slice(0, 4).map(({ value }) => value)).toEqual(['maker', 'model', 'form', 'length_m']);
    expect(hulls.slice(0, 4).every(({ label }) => label.endsWith('(needed)'))).toBe(true);
    expect(hulls.map(({ value }) => value)).toContain('years');
    expect(columnChoices('trim-points').map(({ value }) => value)).not.toContain('years');
  });

  it('offers the units of what a column measures, and none for words, years or two different things', () => {
    expect(unitChoices('hulls', ['length_m'])).toEqual(['m', 'cm', 'mm', 'in', 'ft']);
    expect(unitChoices('hulls', ['deadrise_deg'])).toContain('rad');
    expect(unitChoices('hulls', ['model'])).toEqual([]);
    expect(unitChoices('hulls', ['year_from'])).toEqual([]);
    expect(unitChoices('hulls', ['length_m', 'dry_mass_kg'])).toEqual([]);
  });

  it('keeps a unit that still fits, drops one that cannot be meant', () => {
    expect(withTarget('hulls', mapping, 1, 'beam_m').columns[1]).toEqual({ at: 1, to: 'beam_m', unit: 'ft', erase: true });
    expect(withTarget('hulls', mapping, 1, 'dry_mass_kg').columns[1]).toEqual({ at: 1, to: 'dry_mass_kg', erase: true });
    expect(withTarget('hulls', mapping, 1, '').columns[1]).toEqual({ at: 1, erase: false });
  });

  it('a column that fills what a constant filled takes its place', () => {
    const filled = withTarget('hulls', mapping, 2, 'maker');
    expect(filled.columns[2]).toEqual({ at: 2, to: 'maker', erase: false });
    expect(filled.constants).toEqual({ form: ' ' });
  });

  it('split, a column keeps what it held and takes a second one that is free', () => {
    expect(withTarget('hulls', mapping, 1, splitTarget).columns[1]).toMatchObject({
      split: { by: 'times', into: ['length_m', 'beam_m'] },
      unit: 'ft',
    });
    const both = withColumn('hulls', mapping, { at: 1, split: { by: 'dash', into: ['year_from', 'year_to'] }, unit: 'ft', erase: false });
    expect(both.columns[1]).toEqual({ at: 1, split: { by: 'dash', into: ['year_from', 'year_to'] }, erase: false });
  });

  it('a constant of blanks is not sent', () => {
    expect(sendable(mapping).constants).toEqual({ maker: 'Testyard' });
  });
});
