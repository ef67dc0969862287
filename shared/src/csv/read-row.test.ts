import { describe, expect, it } from 'vitest';
import { compileRowReader, readRow } from './read-row.ts';

const header = ['maker', 'model', 'form', 'length_m', 'beam_m', 'chine_beam_m', 'deadrise_deg', 'year_from', 'year_to', 'dry_mass_kg'];
const row = (...cells: string[]) => readRow('hulls', header, cells);
const codes = (reading: { errors: { column: string; code: string }[] }) => reading.errors.map((e) => `${e.column} ${e.code}`);

describe('a row', () => {
  it('gives values by field in the columns’ units', () => {
    const reading = row('Quill', 'Sedge 17', 'Deep V', `16' 8"`, '2.1 m', '72 in', '18°', '2015-18', '', '1000 lb');
    expect(reading.errors).toEqual([]);
    // 16' 8" = 200 in × 25.4 mm; 72 in × 25.4 mm; 1 lb = 0.45359237 kg (international yard and pound, 1959).
    expect(reading.values).toEqual({
      maker: 'Quill',
      model: 'Sedge 17',
      form: 'deep-v',
      lengthM: 5.08,
      beamM: 2.1,
      chineBeamM: 1.8288,
      deadriseDeg: 18,
      yearFrom: 2015,
      yearTo: 2018,
      dryMassKg: 453.59237,
    });
    expect(reading.cautions.map((c) => c.code)).toEqual(['deadrise-against-form']);
  });

  it('leaves blank cells out and erases only where the mapping says so', () => {
    const cells = ['Quill', 'Sedge', 'flat', '4.2', '–', '', 'n/a'];
    expect(row(...cells).values).toEqual({ maker: 'Quill', model: 'Sedge', form: 'flat', lengthM: 4.2 });
    expect(row(...cells).erased).toEqual([]);
    const erase = ['beam_m', 'chine_beam_m'];
    expect(readRow('hulls', header, cells, { erase }).erased).toEqual(['beamM']);
  });

  it('names every required column that is missing', () => {
    expect(codes(row('', 'Sedge', '', ''))).toEqual(['maker required', 'form required', 'length_m required']);
  });

  it('reports a wrong required cell once, as what it is', () => {
    const reading = row('Quill', 'Sedge', 'vee', '200');
    expect(codes(reading)).toEqual(['form ambiguous-choice', 'length_m out-of-range']);
    expect(reading.errors[0]?.couldMean).toEqual(['shallow-v', 'modified-v', 'deep-v']);
  });

  it('refuses a beam that is not below the length and a chine beam above the beam', () => {
    expect(codes(row('Q', 'S', 'flat', '2.0', '2.0'))).toEqual(['beam_m beam-over-length']);
    expect(codes(row('Q', 'S', 'flat', '5', '2.0', '2.1'))).toEqual(['chine_beam_m chine-over-beam']);
    expect(codes(row('Q', 'S', 'flat', '5', '2.0', '2.0'))).toEqual([]);
  });

  it('refuses years out of order and years that contradict each other', () => {
    expect(codes(row('Q', 'S', 'flat', '5', '', '', '', '2018', '2015'))).toEqual(['year_from years-order']);
    expect(codes(row('Q', 'S', 'flat', '5', '', '', '', '2015-18', '2019'))).toEqual(['year_to two-values']);
    expect(codes(row('Q', 'S', 'flat', '5', '', '', '', '2015+', '2019'))).toEqual(['year_to two-values']);
    expect(codes(row('Q', 'S', 'flat', '5', '', '', '', '2015-18', '2018'))).toEqual([]);
  });

  it('takes a stored last year away where the model is said to be still made', () => {
    const reading = readRow('hulls', ['maker', 'model', 'form', 'length_m', 'years'], ['Q', 'S', 'flat', '5', '2019+']);
    expect(reading.values).toMatchObject({ yearFrom: 2019 });
    expect(reading.erased).toEqual(['yearTo']);
  });

  it('reads a years column as first and last year', () => {
    const reading = readRow('hulls', ['maker', 'model', 'form', 'length_m', 'years'], ['Q', 'S', 'flat', '5', '2015–2018']);
    expect(reading.values).toMatchObject({ yearFrom: 2015, yearTo: 2018 });
    const single = row('Q', 'S', 'flat', '5', '', '', '', '2015');
    expect(single.values).not.toHaveProperty('yearTo');
  });

  it('carries provenance of the row and of single cells', () => {
    const reading = readRow(
      'hulls',
      ['id', ...header.slice(0, 5), 'method', 'source', 'source_date', 'beam_m_sigma', 'beam_m_method', 'length_m_method'],
      ['hul_01abc', 'Q', 'S', 'flat', '5', '2', 'Published', 'Sales sheet 12', '2024-05', '20 mm', 'measured', 'class default'],
    );
    expect(reading.errors).toEqual([]);
    expect(reading).toMatchObject({ id: 'hul_01abc', method: 'published', source: 'Sales sheet 12', sourceDate: '2024-05' });
    expect(reading.sigmas).toEqual({ beamM: 0.02 });
    expect(reading.methods).toEqual({ beamM: 'measured', lengthM: 'class' });
  });

  it('refuses a cell with no header above it, but not trailing separators', () => {
    expect(codes(readRow('hulls', header.slice(0, 4), ['Q', 'S', 'flat', '5', '', '']))).toEqual([]);
    expect(codes(readRow('hulls', header.slice(0, 4), ['Q', 'S', 'flat', '5', '', 'x']))).toEqual(['6 cell-without-header']);
  });

  it('takes a constant for a column the file lacks, and units from the mapping', () => {
    const reading = readRow('hulls', ['model', 'form', 'length_m', 'length_m_sigma'], ['S', 'jon', '14', '1'], {
      constants: { maker: 'Quill' },
      units: { length_m: 'ft' },
    });
    expect(reading.errors).toEqual([]);
    expect(reading.values).toEqual({ maker: 'Quill', model: 'S', form: 'flat', lengthM: 4.2672 });
    expect(reading.sigmas).toEqual({ lengthM: 0.3048 });
  });

  it('refuses drives without a lower unit by name', () => {
    const reading = readRow('lower-units', ['maker', 'model', 'drive', 'power_hp'], ['Q', 'S', 'Jet drive', '90']);
    expect(codes(reading)).toEqual(['drive refused-drive']);
  });

  it('holds trim and tilt limits in order', () => {
    const h = ['maker', 'model', 'drive', 'power_hp', 'trim_min_deg', 'trim_max_deg', 'tilt_max_deg'];
    expect(codes(readRow('lower-units', h, ['Q', 'S', 'outboard', '90', '-4', '16', '70']))).toEqual([]);
    expect(codes(readRow('lower-units', h, ['Q', 'S', 'outboard', '90', '5', '4', '70']))).toEqual(['trim_min_deg min-over-max']);
    expect(codes(readRow('lower-units', h, ['Q', 'S', 'outboard', '90', '−4', '20', '15']))).toEqual(['trim_max_deg min-over-max']);
  });

  it.each([
    [{ length_m: '4.2', dry_mass_kg: '2000' }, ['mass-against-length']],
    [{ length_m: '4.2', dry_mass_kg: '140' }, []],
    [{ length_m: '6', beam_m: '0.8' }, ['beam-against-length']],
  ])('cautions about %j: %j', (cells, expected) => {
    const names = ['maker', 'model', 'form', ...Object.keys(cells)];
    const reading = readRow('hulls', names, ['Q', 'S', 'shallow-v', ...Object.values(cells)]);
    expect(reading.errors).toEqual([]);
    expect(reading.cautions.map((c) => c.code)).toEqual(expected);
  });

  it('keeps no state from row to row', () => {
    const read = compileRowReader('hulls', header);
    read(['Q', 'S', 'vee', '5']);
    expect(read(['Q', 'S', 'flat', '5'])).toEqual(row('Q', 'S', 'flat', '5'));
  });

  it('is not made for a header that names a column twice', () => {
    expect(() => compileRowReader('hulls', ['maker', 'maker'])).toThrow('twice');
  });
});
