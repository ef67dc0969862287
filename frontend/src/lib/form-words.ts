import type { HullForm } from '@tiltwright/shared/schemas/hull.ts';

const words: Record<HullForm, string> = {
  flat: 'flat bottom',
  'shallow-v': 'shallow vee',
  'modified-v': 'modified vee',
  'deep-v': 'deep vee',
  'tri-hull': 'tri-hull',
  pontoon: 'pontoon boat',
  catamaran: 'catamaran',
  other: 'another form',
};

/** The shape of a bottom in two or three words, for lists and sheets. */
export function hullFormWords(form: HullForm): string {
  return words[form];
}
