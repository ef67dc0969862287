// A table of any length, of invented hulls; the same rows every time.
const header =
  'maker,model,package,year_from,year_to,form,length_m,beam_m,chine_beam_m,deadrise_deg,transom_angle_deg,transom_height_mm,transom_width_mm,material,dry_mass_kg,loaded_mass_kg,lcg_m,max_power_hp,source,source_date';

const consonants = 'bcdfghklmnprst';
const vowels = 'aeiou';

/** An invented word for a number, by Knuth's multiplicative hash. */
function word(seed: number): string {
  let state = Math.imul(seed, 2654435761) >>> 0;
  let text = '';
  for (let syllable = 0; syllable < 3; syllable++) {
    text += consonants[state % consonants.length]! + vowels[(state >>> 8) % vowels.length]!;
    state = (Math.imul(state, 1103515245) + 12345) >>> 0;
  }
  return text;
}

/**
 * `rows` hulls of 200 makers, 20 columns each.
 * @param round 0: as first published; 1: a later list, in which two or three values of every hull differ
 */
export function manyHulls(rows: number, round: 0 | 1 = 0): string {
  const lines = [header];
  for (let i = 0; i < rows; i++) {
    const name = `${word(i % 200)} yard,${word(i % 5000)} ${10 + Math.floor(i / 5000)},`;
    const size = `2010,2018,modified-v,${(4 + (i % 300) / 100).toFixed(2)},2.0,1.7,${12 + (i % 6) + round * 0.5},13,508,1600,aluminium`;
    const mass = `${300 + (i % 200)},${700 + (i % 300) + round},2.1,${50 + (i % 100) + (i % 2) * round}`;
    lines.push(`${name},${size},${mass},list ${i % 10},2024-0${5 + round}`);
  }
  return lines.join('\n');
}
