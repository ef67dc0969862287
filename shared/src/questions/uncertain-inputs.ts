// Everything of a prepared question that is not certain, and one draw of it all.
import type { FilledHull } from './fill-hull.ts';
import type { Filled } from './filled.ts';
import type { FitNumbers, Prepared } from './prepare.ts';

/** One uncertain number: where it stands, its middle value and one standard deviation, in trade units. */
export interface UncertainInput {
  name: string;
  value: number;
  sigma: number;
  /** Whether the running trim, or the beam's way past the parts, depends on it. */
  bears: { trim: boolean; clearance: boolean };
  put: (draft: Draft, value: number) => void;
}

type Loose = Record<string, number>;
/** Numbers that are being filled with a draw. */
interface Draft {
  hull: Loose;
  lowerUnits: Loose[];
  transducer: Loose;
  engines: Loose[];
  own: Loose;
}

/** How well a careful owner sets and measures things, one standard deviation (common practice, no source). */
const settingSigmas = { offsetMm: 3, dropMm: 2, rollDeg: 0.5, yawDeg: 0.5 };
const engineSigmas = { offsetMm: 5, setbackMm: 3, raiseMm: 3, motorTrimDeg: 1, steerDeg: 1 };
/** How well a tilt is set on a bracket, degrees. */
export const setTiltSigmaDeg = 0.5;

const trimOnly = new Set<keyof FilledHull>(['loadedMassKg', 'lcgM', 'vcgM', 'staticTrimDeg']);
const clearanceOnly = new Set<keyof FilledHull>(['keelPadMm', 'notchMm']);
/** What places the propeller, and with it the thrust. */
const thrustFields = new Set(['shaftLengthMm', 'plateBelowKeelMm', 'plateAboveShaftMm', 'propAftMm', 'driveshaftAftMm']);
const notSizes = new Set(['trimRefTransomDeg', 'trimMinDeg', 'trimMaxDeg', 'tiltMaxDeg', 'steerMaxDeg']);

/** Names are those of the question's fields, as in `assumptions`. Exact inputs (sigma 0) are left out. */
export function uncertainInputs(p: Prepared): UncertainInput[] {
  const inputs: UncertainInput[] = [];
  const add = (input: UncertainInput) => {
    if (input.sigma > 0) inputs.push(input);
  };
  const addPart = (
    prefix: string,
    part: Filled<string>,
    bears: (field: string) => UncertainInput['bears'],
    of: (draft: Draft) => Loose,
  ) => {
    for (const [field, { value, sigma }] of Object.entries(part)) {
      const put = (draft: Draft, drawn: number) => {
        of(draft)[field] = keepsSign(field, value) ? Math.max(0.05 * value, drawn) : drawn;
      };
      add({ name: `${prefix}.${field}`, value, sigma, bears: bears(field), put });
    }
  };
  addPart(
    'hull',
    p.hull,
    (field) => ({ trim: !clearanceOnly.has(field as keyof FilledHull), clearance: !trimOnly.has(field as keyof FilledHull) }),
    (draft) => draft.hull,
  );
  p.lowerUnits.forEach((unit, i) => {
    const bears = (field: string) => ({ trim: thrustFields.has(field), clearance: !notSizes.has(field) });
    addPart(`lowerUnits.${i}`, unit, bears, (draft) => draft.lowerUnits[i] as Loose);
    for (const [field, sigma] of Object.entries(engineSigmas)) {
      const value = (p.engines[i] as unknown as Loose)[field] as number;
      const put = (draft: Draft, drawn: number) => {
        (draft.engines[i] as Loose)[field] = drawn;
      };
      add({ name: `lowerUnits.${i}.${field}`, value, sigma, bears: { trim: field === 'motorTrimDeg', clearance: true }, put });
    }
  });
  addPart(
    'transducer',
    p.transducer,
    (field) => ({ trim: false, clearance: field !== 'sideFrequencyKhz' }),
    (draft) => draft.transducer,
  );
  const place = (field: string, value: number, sigma: number) => {
    const put = (draft: Draft, drawn: number) => {
      draft.own[field] = drawn;
    };
    add({ name: `placement.${field}`, value, sigma, bears: { trim: false, clearance: true }, put });
  };
  for (const [field, sigma] of Object.entries(settingSigmas)) place(field, p.placing[field as keyof typeof settingSigmas], sigma);
  if (p.forwardMm) place('forwardMm', p.forwardMm.value, p.forwardMm.sigma);
  else place('standoffMm', p.standoffMm.value, p.standoffMm.sigma);
  return inputs;
}

/** Sizes and deadrise cannot turn negative; distances that may lie either way can. */
function keepsSign(field: string, value: number): boolean {
  return (
    value >= 0 &&
    !['tiltAxisAboveMm', 'plateBelowKeelMm', 'vcgM', 'staticTrimDeg', 'skegAftMm', 'plateForwardMm', 'transomAngleDeg'].includes(field)
  );
}

/** The middle numbers with one draw of the given inputs put in; `scores` are standard normal, in the order of the inputs. */
export function drawnNumbers(n: FitNumbers, inputs: readonly UncertainInput[], scores: readonly Float64Array[], draw: number): FitNumbers {
  const draft: Draft = {
    hull: { ...n.hull },
    lowerUnits: n.lowerUnits.map((unit) => ({ ...unit })),
    transducer: { ...n.transducer },
    engines: n.engines.map((engine) => ({ ...engine })),
    own: {},
  };
  inputs.forEach(({ value, sigma, put }, k) => {
    put(draft, value + sigma * ((scores[k] as Float64Array)[draw] as number));
  });
  const { own, ...parts } = draft;
  return { ...n, ...(parts as unknown as FitNumbers), ...own };
}
