// Running trim from a hull's figures alone: at rest, planing, the step between, and class values where no theory applies.
import { addInQuadrature, type Estimate } from '../estimate.ts';
import { degToRad, gravityMps2, type Water } from '../units.ts';
import { type PlaningHull, planingTrim, type SavitskyFlag, type Thrust, thrustAt } from './savitsky.ts';

/** What the trim depends on. `planing` is false for pontoons, catamarans, stepped hulls and where a figure is missing. */
export interface TrimHull extends PlaningHull {
  planing: boolean;
  staticTrimRad: number;
}

/** Where the thrust acts, boat lengths forward of the transom and up from the keel (both below 0 for an outboard), m. */
export interface ThrustLine {
  forwardM: number;
  upM: number;
  /** Motor trim; the thrust line is inclined by as much the other way. Null where it is not known under way. */
  motorTrimRad: number | null;
}

export const trimFlags = ['no-planing-solution', 'motor-trim-unknown', 'measurement-disagrees', 'outside-measured-range'] as const;
export type TrimFlag = (typeof trimFlags)[number] | SavitskyFlag;
export type EstimateBasis = 'estimated' | 'class';

/** Volume Froude number V/√(g ∇^⅓). */
export function volumeFroude(speedMps: number, massKg: number, water: Water): number {
  return speedMps / Math.sqrt(gravityMps2 * Math.cbrt(massKg / water.densityKgM3));
}

/** Below the first the boat floats at its static trim, above the second it planes (our judgement). */
const floatsBelow = 0.8;
const planesAbove = 1.8;

const staticSigmaRad = degToRad(1);
const savitskySigmaRad = degToRad(1);
const doubtfulSigmaRad = degToRad(2);
const unknownMotorTrimSigmaRad = degToRad(1);
const classSigmaRad = degToRad(2);
/** Savitsky's formulas are trusted from this volume Froude number up. */
const trustedFrom = 2.5;

/** Class value by volume Froude number: trolling 1°, hump 7°, cruise 4° (common practice, no source). */
export function classTrimRad(froude: number): number {
  if (froude < floatsBelow) return degToRad(1);
  return degToRad(froude <= 2 ? 7 : 4);
}

export function smoothstep(x: number): number {
  const t = Math.min(1, Math.max(0, x));
  return t * t * (3 - 2 * t);
}

/** Running trim without any measurement, radians, bow up positive, with its model error (inputs' own errors not included). */
export function estimatedTrim(hull: TrimHull, line: ThrustLine, speedMps: number, water: Water): Estimate<EstimateBasis, TrimFlag> {
  const froude = volumeFroude(speedMps, hull.massKg, water);
  if (!hull.planing) return { value: classTrimRad(froude), sigma: classSigmaRad, basis: 'class', flags: [] };
  const share = smoothstep((froude - floatsBelow) / (planesAbove - floatsBelow));
  if (share === 0) return { value: hull.staticTrimRad, sigma: staticSigmaRad, basis: 'estimated', flags: [] };
  const planing = planingTrim(hull, thrustOf(hull, line), speedMps, water);
  if (!planing) return { value: classTrimRad(froude), sigma: classSigmaRad, basis: 'class', flags: ['no-planing-solution'] };
  const flags: TrimFlag[] = [...planing.flags];
  const unknown = line.motorTrimRad === null;
  if (unknown) flags.push('motor-trim-unknown');
  const trusted = planing.flags.every((flag) => flag === 'dry-chine') && froude >= trustedFrom;
  const model = addInQuadrature(trusted ? savitskySigmaRad : doubtfulSigmaRad, unknown ? unknownMotorTrimSigmaRad : 0);
  return {
    value: hull.staticTrimRad + share * (planing.trimRad - hull.staticTrimRad),
    sigma: (1 - share) * staticSigmaRad + share * model,
    basis: 'estimated',
    flags,
  };
}

function thrustOf(hull: TrimHull, line: ThrustLine): Thrust {
  return thrustAt(hull, line.forwardM, line.upM, -(line.motorTrimRad ?? 0));
}
