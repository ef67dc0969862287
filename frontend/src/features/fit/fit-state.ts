// What the page asks about, as one flat value. The address carries it whole (see fit-url.ts).
import type { HullForm } from '@tiltwright/shared/schemas/hull.ts';
import { type FitField, type FitFieldName, fitFieldNames, fitFields } from './fit-fields.ts';

type FieldValue<F extends FitField> = F['standard'] extends null ? number | null : number;
type FitNumbers = { [K in FitFieldName]: FieldValue<(typeof fitFields)[K]> };

export const motorCounts = ['one', 'two', 'none'] as const;
export type MotorCount = (typeof motorCounts)[number];
export const waterKinds = ['fresh', 'sea'] as const;
export const sidesWanted = ['both', 'port', 'starboard'] as const;

/** Every form the schema knows; written out so that the schema's code is not fetched for it, and checked to be complete by its type. */
const everyForm: Record<HullForm, true> = {
  flat: true,
  'shallow-v': true,
  'modified-v': true,
  'deep-v': true,
  'tri-hull': true,
  pontoon: true,
  catamaran: true,
  other: true,
};
export const hullForms = Object.keys(everyForm) as HullForm[];

export interface FitState extends FitNumbers {
  /** Catalog ids; null where the boat or part is described by its class instead. */
  hull: string | null;
  motor: string | null;
  sensor: string | null;
  mount: string | null;
  form: HullForm;
  motors: MotorCount;
  water: (typeof waterKinds)[number];
  wanted: (typeof sidesWanted)[number];
}

/** The words that are chosen from a list: name, choices, and which stands where nothing is said. */
export const fitChoices = {
  form: { choices: hullForms, standard: 'shallow-v' },
  motors: { choices: motorCounts, standard: 'one' },
  water: { choices: waterKinds, standard: 'fresh' },
  wanted: { choices: sidesWanted, standard: 'both' },
} as const;
export type FitChoiceName = keyof typeof fitChoices;

export const fitParts = ['hull', 'motor', 'sensor', 'mount'] as const;
export type FitPartName = (typeof fitParts)[number];

/** A 4.5 m shallow vee with one 30 hp motor and a sensor 380 mm to starboard, scanning at 4 kn. */
export const standardState: FitState = {
  ...(Object.fromEntries(fitFieldNames.map((name) => [name, fitFields[name].standard])) as FitNumbers),
  hull: null,
  motor: null,
  sensor: null,
  mount: null,
  form: fitChoices.form.standard,
  motors: fitChoices.motors.standard,
  water: fitChoices.water.standard,
  wanted: fitChoices.wanted.standard,
};

/** True where one of these has been set to something else than what stands there by itself. */
export function isSet(state: FitState, names: readonly (keyof FitState)[]): boolean {
  return names.some((name) => state[name] !== standardState[name]);
}
