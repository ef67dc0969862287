// The API's field paths in words, with the quantity their unit ending names.
import type { Quantity } from '../../lib/format-units.ts';
import { motorName } from './fit-question.ts';
import type { FitState } from './fit-state.ts';

const endings: readonly [ending: string, quantity: Quantity][] = [
  ['Mm', 'lengthMm'],
  ['Deg', 'angleDeg'],
  ['Kg', 'massKg'],
  ['Kn', 'speedKn'],
  ['Hp', 'powerHp'],
  ['Khz', 'frequencyKhz'],
  ['Db', 'levelDb'],
  ['M', 'lengthM'],
];

/** Short names of the trade that do not read well letter by letter. */
const special: Record<string, string> = {
  lcg: 'centre of gravity, ahead of the transom',
  vcg: 'centre of gravity, above the keel',
  propAxial: 'propeller depth along the shaft',
  tiltZero: 'zero of the bracket’s scale',
  trimRefTransom: 'transom angle that the trim limits are stated for',
  trimMin: 'least motor trim',
  trimMax: 'greatest motor trim under power',
  tiltMax: 'full motor tilt',
  'mount tiltMin': 'least tilt on the scale',
  'mount tiltMax': 'greatest tilt on the scale',
  steerMax: 'greatest steering angle',
  measuredTrim: 'running angle',
  measuredSigma: 'scatter of your measurement',
};

const subjects: Record<string, string> = { hull: 'boat', transducer: 'sensor', mount: 'mount', placement: 'place', running: 'running' };

export interface FieldWords {
  /** "boat", "port motor", "sensor" */
  subject: string;
  /** "transom angle" */
  name: string;
  quantity: Quantity;
}

/** `hull.transomAngleDeg` → boat, transom angle, angleDeg; `lowerUnits.1.swivelAftMm` → starboard motor, swivel aft, lengthMm. */
export function fieldWords(path: string, state: Pick<FitState, 'motors'>): FieldWords {
  const steps = path.split('.');
  const field = steps[steps.length - 1] ?? path;
  const [ending, quantity] = endings.find(([unit]) => field.endsWith(unit) && field.length > unit.length) ?? ['', 'plain' as const];
  const stem = field.slice(0, field.length - ending.length);
  const subject = steps[0] === 'lowerUnits' ? motorName(state, Number(steps[1] ?? 0)) : (subjects[steps[0] ?? ''] ?? steps[0] ?? '');
  return { subject, name: special[tiltLimit(steps[0], stem)] ?? spaced(stem), quantity };
}

/** A bracket's tilt limits share their names with a motor's. */
function tiltLimit(part: string | undefined, stem: string): string {
  return part === 'mount' && (stem === 'tiltMax' || stem === 'tiltMin') ? `mount ${stem}` : stem;
}

function spaced(stem: string): string {
  return stem
    .replace(/([A-Z])/g, ' $1')
    .replace(/^prop /, 'propeller ')
    .toLowerCase()
    .trim();
}
