// The running angle read with a spirit level and shims, and the stack of shims for an angle.
import { addInQuadrature, type Estimate } from './estimate.ts';

/** Angle whose sine is shim height over contact length; the shim under the aft end means bow up, so positive. Metres in, radians out.
 * @throws RangeError where the shim is longer than the contact length or the length is not positive */
export function angleOfShim(shimM: number, contactLengthM: number): number {
  if (!(contactLengthM > 0) || !(Math.abs(shimM) <= contactLengthM)) {
    throw new RangeError(`a shim of ${shimM} m does not stand under a level of ${contactLengthM} m`);
  }
  return Math.asin(shimM / contactLengthM);
}

/** Height of the shim that makes a level of this contact length read an angle. Radians and metres in, metres out. */
export function shimForAngle(angleRad: number, contactLengthM: number): number {
  return contactLengthM * Math.sin(angleRad);
}

/** Thickness per unit of base of a wedge of this angle: tan. */
export function wedgeRise(angleRad: number): number {
  return Math.tan(Math.abs(angleRad));
}

export interface ShimPiece {
  id: string;
  /** mm; a shop's unit on purpose, stacks are built and read in it. */
  thicknessMm: number;
}

/** Plywood as it is sold (common practice, no source). */
export const plywood: readonly ShimPiece[] = [
  { id: 'plywood-3', thicknessMm: 3 },
  { id: 'plywood-6', thicknessMm: 6 },
  { id: 'plywood-12', thicknessMm: 12 },
];

/** Thickness of coins in use: US Mint specification. */
export const usCoins: readonly ShimPiece[] = [
  { id: 'us-1-cent', thicknessMm: 1.52 },
  { id: 'us-5-cent', thicknessMm: 1.95 },
  { id: 'us-10-cent', thicknessMm: 1.35 },
  { id: 'us-25-cent', thicknessMm: 1.75 },
  { id: 'us-50-cent', thicknessMm: 2.15 },
  { id: 'us-1-dollar', thicknessMm: 2.0 },
];

/** Council Regulation (EU) 729/2014, seen in secondary lists. */
export const euroCoins: readonly ShimPiece[] = [
  { id: 'euro-1-2-5-cent', thicknessMm: 1.67 },
  { id: 'euro-10-cent', thicknessMm: 1.93 },
  { id: 'euro-20-cent', thicknessMm: 2.14 },
  { id: 'euro-50-cent', thicknessMm: 2.38 },
  { id: 'euro-1', thicknessMm: 2.33 },
  { id: 'euro-2', thicknessMm: 2.2 },
];

export interface Stack {
  pieces: { id: string; count: number }[];
  heightMm: number;
  /** Height less the wanted one, mm. */
  errorMm: number;
}

const greatestPieces = 12;

/**
 * Stacks nearest to a height, best first: plywood for the bulk, at most six coins of one kind for the rest; fewer pieces win a tie of 0.1 mm.
 * Height 0 to 120 mm. @throws RangeError outside it
 */
export function stacksFor(heightMm: number, coins: readonly ShimPiece[], best = 3): Stack[] {
  if (!(heightMm >= 0 && heightMm <= 120)) throw new RangeError(`a stack is 0 to 120 mm high, got ${heightMm}`);
  const found: (Stack & { count: number })[] = [];
  const none: ShimPiece = { id: '', thicknessMm: 0 };
  for (let twelves = 0; twelves <= 10; twelves++) {
    for (let sixes = 0; sixes <= 1; sixes++) {
      for (let threes = 0; threes <= 1; threes++) {
        const bulk = 12 * twelves + 6 * sixes + 3 * threes;
        if (bulk > heightMm + 3) continue;
        for (const coin of [none, ...coins]) {
          const wanted = coin === none ? 0 : Math.min(6, Math.max(1, Math.round((heightMm - bulk) / coin.thicknessMm)));
          const count = twelves + sixes + threes + wanted;
          if (count > greatestPieces) continue;
          const height = bulk + wanted * coin.thicknessMm;
          const pieces = [
            { id: 'plywood-12', count: twelves },
            { id: 'plywood-6', count: sixes },
            { id: 'plywood-3', count: threes },
            { id: coin.id, count: wanted },
          ].filter((piece) => piece.count > 0);
          found.push({ pieces, heightMm: height, errorMm: height - heightMm, count });
        }
      }
    }
  }
  const cost = (stack: { errorMm: number; count: number }) => Math.round(Math.abs(stack.errorMm) / 0.1) + stack.count * 1e-3;
  return found
    .sort((a, b) => cost(a) - cost(b))
    .slice(0, best)
    .map(({ pieces, heightMm: height, errorMm }) => ({ pieces, heightMm: height, errorMm }));
}

/** One run under way: shim under the aft end positive, both in metres. */
export interface LevelRun {
  shimM: number;
  contactLengthM: number;
}

export const levelFlags = ['fewer-than-three-runs', 'one-direction-only'] as const;
export type LevelFlag = (typeof levelFlags)[number];

/** Half a millimetre a metre, the usual spirit level, as an angle. */
const levelErrorRad = 0.0005;

/**
 * Running angle from runs with a level: the median of the runs, less what the level reads on the trailer with the keel level (soles slope).
 * Error 0.5 mm/m ⊕ the scatter of the runs over √n. Radians. @throws RangeError without a run
 */
export function runningAngle(runs: readonly LevelRun[], trailerReadingRad: number, bothDirections: boolean): Estimate<'yours', LevelFlag> {
  if (runs.length === 0) throw new RangeError('an angle needs at least one run');
  const angles = runs.map(({ shimM, contactLengthM }) => angleOfShim(shimM, contactLengthM)).sort((a, b) => a - b);
  const middle = (angles.length - 1) / 2;
  const median = ((angles[Math.floor(middle)] as number) + (angles[Math.ceil(middle)] as number)) / 2;
  const flags: LevelFlag[] = [];
  if (runs.length < 3) flags.push('fewer-than-three-runs');
  if (!bothDirections) flags.push('one-direction-only');
  return {
    value: median - trailerReadingRad,
    sigma: addInQuadrature(levelErrorRad, scatterOf(angles) / Math.sqrt(angles.length)),
    basis: 'yours',
    flags,
  };
}

/** Sample standard deviation; 0 for a single value. */
function scatterOf(values: readonly number[]): number {
  if (values.length < 2) return 0;
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  return Math.sqrt(values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (values.length - 1));
}
