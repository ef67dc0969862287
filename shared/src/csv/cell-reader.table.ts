// Spellings met in tables, each with what it says. Expected values are worked out by hand from the exact definitions:
// 1 in = 25.4 mm, 1 ft = 12 in = 304.8 mm, 1 lb = 0.45359237 kg (1959 yard and pound), 1 nautical mile = 1852 m, 1 mile = 1609.344 m,
// 1 hp = 745.699871582 W, 1 metric hp = 735.49875 W.
import type { Table } from '../schemas/catalog-record.ts';
import type { CellErrorCode, CellValue } from './cell.ts';
import type { CellOptions } from './cell-reader.ts';

export interface Refusal {
  code: CellErrorCode;
  couldMean?: string[];
}
export type Expected = { value: CellValue } | { blank: 'kept' | 'erasable' } | Refusal;
export interface Spelling {
  column: string;
  text: string;
  expected: Expected;
  options?: CellOptions;
}
export interface SpellingGroup {
  table: Table;
  spellings: Spelling[];
}

const is = (column: string, text: string, value: CellValue, options?: CellOptions): Spelling => ({
  column,
  text,
  expected: { value },
  options,
});
const not = (column: string, text: string, code: CellErrorCode, couldMean?: string[], options?: CellOptions): Spelling => ({
  column,
  text,
  expected: { code, couldMean },
  options,
});
const blank = (column: string, text: string, kind: 'kept' | 'erasable'): Spelling => ({ column, text, expected: { blank: kind } });

const lengths: Spelling[] = [
  is('length_m', '5.08', 5.08),
  is('length_m', `16' 8"`, 5.08),
  is('length_m', `16'8"`, 5.08),
  is('length_m', `16'8`, 5.08),
  is('length_m', `16' 8`, 5.08),
  is('length_m', `16'-8"`, 5.08),
  is('length_m', '16′ 8″', 5.08),
  is('length_m', '16’8”', 5.08),
  is('length_m', `16' 8''`, 5.08),
  is('length_m', '16 ft 8 in', 5.08),
  is('length_m', '16ft8in', 5.08),
  is('length_m', '16 ft. 8 in.', 5.08),
  is('length_m', '16 Feet 8 Inches', 5.08),
  is('length_m', '16 ft 8', 5.08),
  is('length_m', `16' 8 1/2"`, 5.0927), // 200.5 in
  is('length_m', `16'`, 4.8768),
  is('length_m', '16.8 ft', 5.12064),
  is('length_m', '5,08 m', 5.08),
  is('length_m', '5 m 8 cm', 5.08),
  is('length_m', '508 cm', 5.08),
  is('length_m', '5080mm', 5.08),
  is('length_m', '5080 MM', 5.08),
  is('length_m', '+5.08', 5.08),
  is('length_m', '5.', 5),
  is('length_m', '5,080 mm', 5.08, { decimalComma: false }),
  is('length_m', '5.080 mm', 5.08, { decimalComma: true }),
  is('length_m', '5 080 mm', 5.08),
  is('length_m', '5\u202f080 mm', 5.08),
  is('length_m', '5.08e0', 5.08),
  is('length_m', `16'8" (5.08 m)`, 5.08),
  is('length_m', `5.08 m / 16'8"`, 5.08),
  is('length_m', `16' 8"`, 5.08, { unit: 'mm' }),
  is('length_m', '16.5', 5.0292, { unit: 'ft' }),
  not('length_m', `16' 14"`, 'bad-inches'),
  not('length_m', `16.5' 3"`, 'two-values'),
  not('length_m', `16'8" (4.9 m)`, 'two-values', [`16'8"`, '4.9 m']),
  not('length_m', '1,234 m', 'ambiguous-number', ['1.234', '1234']),
  not('length_m', '5.0-5.4', 'range', ['5.0', '5.4']),
  not('length_m', '16-8', 'range', ['16', '8', `16' 8"`]),
  not('length_m', '5 to 6 m', 'range', ['5 m', '6 m']),
  not('length_m', '~5.1', 'approximate', ['5.1']),
  not('length_m', 'ca. 5.1 m', 'approximate', ['5.1 m']),
  not('length_m', '5.1 ± 0.1', 'tolerance', ['5.1']),
  not('length_m', '> 5', 'bound', ['5']),
  not('length_m', '5.1?', 'doubtful', ['5.1']),
  not('length_m', '5.1*', 'doubtful', ['5.1']),
  not('length_m', '5 kg', 'wrong-unit'),
  not('length_m', '14°', 'wrong-unit'),
  not('length_m', '5 fathoms', 'unknown-unit'),
  not('length_m', '5 constructor', 'unknown-unit'),
  not('length_m', 'long', 'not-a-number'),
  not('length_m', '5 6', 'not-a-number'),
  not('length_m', '5.1.2', 'not-a-number'),
  not('length_m', '12,34,567', 'not-a-number'),
  not('length_m', 'NaN', 'not-a-number'),
  not('length_m', '=5+1', 'not-a-number'),
  not('length_m', '#REF!', 'spreadsheet-error'),
  not('length_m', '#N/A', 'spreadsheet-error'),
  not('length_m', '16.8"', 'out-of-range'), // 0.42672 m, its unit is stated
  not('length_m', '200', 'out-of-range', ['200 in', '200 cm']), // 5.08 m and 2 m; 200 ft is 60.96 m, 200 mm 0.2 m
  is('transom_height_mm', '508', 508),
  is('transom_height_mm', '508mm', 508),
  is('transom_height_mm', '50,8 cm', 508),
  is('transom_height_mm', '0.508 m', 508),
  is('transom_height_mm', '20 in', 508),
  is('transom_height_mm', '20"', 508),
  is('transom_height_mm', '20″', 508),
  is('transom_height_mm', '20 in (508 mm)', 508),
  is('transom_height_mm', '20" / 510 mm', 508), // rounded twin, 0.4 % off
  is('transom_height_mm', '20 1/2 in', 520.7),
  is('transom_height_mm', '20-1/2 in', 520.7),
  is('transom_height_mm', '20½"', 520.7),
  is('transom_height_mm', '20 ½ in', 520.7),
  is('transom_height_mm', '20\u00a01⁄2 in', 520.7),
  is('transom_height_mm', '20⅝ in', 523.875),
  is('transom_height_mm', '20.5', 520.7, { unit: 'in' }),
  is('transom_height_mm', '1,020', 1020, { decimalComma: false }),
  is('transom_height_mm', '508,5', 508.5, { decimalComma: true }),
  is('transom_height_mm', '508,5', 508.5),
  is('transom_height_mm', '1.020', 1020, { decimalComma: true }),
  not('transom_height_mm', '1,020', 'ambiguous-number', ['1.02', '1020']),
  not('transom_height_mm', '20', 'out-of-range', ['20 in', '20 cm']), // 508 mm and 200 mm
  not('transom_height_mm', '20 3/7 in', 'not-a-number'),
  is('keel_pad_mm', '1/2 in', 12.7),
  is('keel_pad_mm', '¾"', 19.05),
  is('keel_pad_mm', '0', 0),
  is('notch_mm', '-0', 0),
  not('notch_mm', '-4', 'out-of-range'),
];

const anglesOfHulls: Spelling[] = [
  is('deadrise_deg', '14', 14),
  is('deadrise_deg', '14°', 14),
  is('deadrise_deg', '14º', 14),
  is('deadrise_deg', '14˚', 14),
  is('deadrise_deg', '14 deg', 14),
  is('deadrise_deg', '14 deg.', 14),
  is('deadrise_deg', '14 degrees', 14),
  is('deadrise_deg', '14,5°', 14.5),
  is('deadrise_deg', '14½°', 14.5),
  is('deadrise_deg', `14°30'`, 14.5),
  is('deadrise_deg', `14° 30' 0"`, 14.5),
  is('transom_angle_deg', '−4', -4),
  is('transom_angle_deg', '-4°', -4),
  is('transom_angle_deg', '- 4', -4),
  not('deadrise_deg', '12-14', 'range', ['12', '14']),
  not('deadrise_deg', '12–14°', 'range', ['12°', '14°']),
  not('deadrise_deg', '35', 'out-of-range'),
  not('deadrise_deg', `14'`, 'wrong-unit'),
  not('deadrise_deg', '14 °C', 'not-a-number'),
];

const massesAndShares: Spelling[] = [
  is('dry_mass_kg', '450', 450),
  is('dry_mass_kg', '450 kg', 450),
  is('dry_mass_kg', '450Kg', 450),
  is('dry_mass_kg', '1000 lb', 453.59237),
  is('dry_mass_kg', '1,000 lbs', 453.59237, { decimalComma: false }),
  is('dry_mass_kg', '1,000.5 kg', 1000.5),
  is('dry_mass_kg', '1.000,5 kg', 1000.5),
  is('dry_mass_kg', `1'200 kg`, 1200),
  is('dry_mass_kg', '0.45 t', 450),
  is('dry_mass_kg', '0,450 t', 450),
  is('loaded_mass_kg', '2000 pounds', 907.18474),
  not('dry_mass_kg', '2 tons', 'ambiguous-unit', ['1000 kg (tonne)', '2000 lb (short ton)', '2240 lb (long ton)']),
  not('dry_mass_kg', '1,200 lb', 'ambiguous-number', ['1.2', '1200']),
  not('dry_mass_kg', 'approx 450 kg', 'approximate', ['450 kg']),
  not('dry_mass_kg', 'max 450', 'bound', ['450']),
  is('max_power_hp', '90 hp', 90),
  is('tab_span_ratio', '0.65', 0.65),
  is('tab_span_ratio', '.65', 0.65),
  is('tab_span_ratio', '65 %', 0.65),
  not('tab_span_ratio', '65', 'out-of-range', ['65 %']),
  is('steps', '2', 2),
  is('steps', '2.0', 2),
  not('steps', '1.5', 'not-whole'),
  not('steps', '9', 'out-of-range'),
];

const years: Spelling[] = [
  is('year_from', '2015', 2015),
  is('year_from', '2015.0', 2015),
  is('year_from', 'MY2015', 2015),
  not('year_from', '2015-18', 'range', ['2015', '2018']),
  not('year_from', '15', 'bad-years', ['2015']),
  not('year_from', '1815', 'out-of-range'),
];

const wordsAndChoices: Spelling[] = [
  is('model', '  Sedge 17 ', 'Sedge 17'),
  is('model', 'Bre\u0302me', 'Brême'),
  is('model', 'Sedge\u00a017', 'Sedge 17'),
  is('model', `'=Sedge`, '=Sedge'),
  is('model', `'Tween`, `'Tween`),
  is('model', '17', '17'),
  not('model', '=1+1', 'formula'),
  not('model', '@SUM(A1)', 'formula'),
  not('model', '+cmd', 'formula'),
  not('model', '-2+3', 'formula'),
  not('model', 'Sedge\n18', 'control-character'),
  not('model', 'Sedge\t18', 'control-character'),
  not('model', 'x'.repeat(81), 'too-long'),
  is('form', 'deep-v', 'deep-v'),
  is('form', 'Deep V', 'deep-v'),
  is('form', 'DEEP_VEE', 'deep-v'),
  is('form', 'Modified-Vee', 'modified-v'),
  is('form', 'jon', 'flat'),
  is('form', 'Jon boat', 'flat'),
  is('form', 'Tri Hull', 'tri-hull'),
  is('form', 'cat', 'catamaran'),
  not('form', 'vee', 'ambiguous-choice', ['shallow-v', 'modified-v', 'deep-v']),
  not('form', 'semi-V', 'ambiguous-choice', ['shallow-v', 'modified-v']),
  not('form', 'deeply', 'unknown-choice', ['deep-v']),
  not('form', 'submarine', 'unknown-choice'),
  not('form', 'constructor', 'unknown-choice'),
  not('form', '__proto__', 'unknown-choice'),
  is('material', 'aluminum', 'aluminium'),
  is('material', 'Aluminium', 'aluminium'),
  is('material', 'alloy', 'aluminium'),
  is('material', 'fiberglass', 'glass-fibre'),
  is('material', 'GRP', 'glass-fibre'),
  is('material', 'Glass fibre', 'glass-fibre'),
  is('material', 'plywood', 'wood'),
  not('material', 'RIB', 'ambiguous-choice', ['inflatable', 'glass-fibre', 'aluminium']),
  is('strakes', '420:150|650:150', ['420:150', '650:150']),
  is('strakes', '420 mm : 15 cm | 25.5":0', ['420:150', '647.7:0']),
  not('strakes', '420', 'not-a-number'),
  not('strakes', '-420:150', 'out-of-range'),
  is('aliases', 'Sedge Seventeen | S17', ['Sedge Seventeen', 'S17']),
  is('aliases', 'Sedge, the long one', ['Sedge, the long one']),
  is('aliases', 'S17||S17|', ['S17']),
  not('aliases', 'S17|=1+1', 'formula'),
  not('aliases', Array.from({ length: 31 }, (_, i) => `S${i}`).join('|'), 'too-many-items'),
];

const blanks: Spelling[] = [
  blank('beam_m', '', 'kept'),
  blank('beam_m', '   ', 'kept'),
  blank('beam_m', '\u00a0', 'kept'),
  blank('beam_m', '?', 'kept'),
  blank('beam_m', 'unknown', 'kept'),
  blank('beam_m', 'TBD', 'kept'),
  blank('beam_m', '-', 'erasable'),
  blank('beam_m', '–', 'erasable'),
  blank('beam_m', '—', 'erasable'),
  blank('beam_m', '---', 'erasable'),
  blank('beam_m', 'n/a', 'erasable'),
  blank('beam_m', 'N/A', 'erasable'),
  blank('beam_m', 'None', 'erasable'),
  blank('notes', 'none', 'erasable'),
  blank('material', '–', 'erasable'),
  blank('aliases', 'n.a.', 'erasable'),
];

const provenance: Spelling[] = [
  is('method', 'Measured', 'measured'),
  is('method', 'class default', 'class'),
  not('method', 'guessed', 'unknown-choice'),
  is('source_date', '2024', '2024'),
  is('source_date', '2024-05', '2024-05'),
  is('source_date', '2024-05-17', '2024-05-17'),
  is('source_date', '17.5.2024', '2024-05-17'),
  is('source_date', '17/05/2024', '2024-05-17'),
  is('source_date', '5/17/2024', '2024-05-17'),
  is('source_date', '17 May 2024', '2024-05-17'),
  is('source_date', 'May 2024', '2024-05'),
  is('source_date', '2024-05-17T08:30:00Z', '2024-05-17'),
  is('source_date', '2024-02-29', '2024-02-29'),
  not('source_date', '05/06/2024', 'ambiguous-date', ['2024-06-05', '2024-05-06']),
  not('source_date', '2023-02-29', 'bad-date'),
  not('source_date', '2024-13', 'bad-date'),
  not('source_date', 'last spring', 'bad-date'),
  is('beam_m_sigma', '20 mm', 0.02),
  not('beam_m_sigma', '-0.1', 'out-of-range'),
];

const motors: Spelling[] = [
  is('power_hp', '90', 90),
  is('power_hp', '90HP', 90),
  is('power_hp', '745.699871582 W', 1), // rounded definition; twelve figures are kept
  is('power_hp', '100 PS', 98.632007062), // 100 × 735.49875 / 745.6998715823
  is('power_hp', '9.9', 9.9),
  not('power_hp', '55 lb', 'wrong-unit'),
  not('power_hp', '8 / 10', 'not-a-number'),
  is('trim_min_deg', '−4°', -4),
  is('shaft_length_mm', '20"', 508),
  not('shaft_length_mm', '20', 'out-of-range', ['20 in', '20 cm']),
  not('shaft_length_mm', '15/20/25 in', 'not-a-number'),
  is('drive', 'I/O', 'sterndrive'),
  is('drive', 'Stern drive', 'sterndrive'),
  is('drive', 'trolling motor', 'electric'),
  not('drive', 'jet', 'refused-drive'),
  not('drive', 'Jet Drive', 'refused-drive'),
  not('drive', 'shaft', 'refused-drive'),
  not('drive', 'inboard', 'refused-drive'),
  is('rotation', 'RH', 'right'),
  is('rotation', 'counter-rotating', 'left'),
];

const transducers: Spelling[] = [
  is('kinds', 'side|down', ['side', 'down']),
  is('kinds', 'Side, Down', ['side', 'down']),
  is('kinds', 'side looking + cone', ['side', 'cone']),
  not('kinds', 'side|up', 'unknown-choice'),
  is('side_frequency_khz', '455', 455),
  is('side_frequency_khz', '455kHz', 455),
  is('side_frequency_khz', '1.2 MHz', 1200),
  is('side_frequency_khz', '455000 Hz', 455),
  not('side_frequency_khz', '1.2', 'out-of-range', ['1.2 mhz']),
  not('side_frequency_khz', '455/800', 'not-a-number'),
  is('beam_level_db', '-3', -3),
  is('beam_level_db', '−3 dB', -3),
  not('beam_level_db', '3', 'out-of-range', ['-3']),
  is('beam_level_way', '2-way', 'two'),
  is('max_speed_kn', '20 kn', 20),
  is('max_speed_kn', '20 kts', 20),
  is('max_speed_kn', '37.04 km/h', 20), // 20 × 1.852
  is('max_speed_kn', '37.04 kph', 20),
  is('max_speed_kn', '57.5 mph', 49.9661339093), // 57.5 × 1609.344 / 1852
  is('mount_kinds', 'Thru-hull | transom', ['through-hull', 'transom-bracket']),
];

export const spellingGroups: readonly SpellingGroup[] = [
  {
    table: 'hulls',
    spellings: [...lengths, ...anglesOfHulls, ...massesAndShares, ...years, ...wordsAndChoices, ...blanks, ...provenance],
  },
  { table: 'lower-units', spellings: motors },
  { table: 'transducers', spellings: transducers },
];
