// The boat's running trim, best basis first: the owner's own measurement, the hull's measured curve, the estimate.
import { addInQuadrature, type Estimate } from '../estimate.ts';
import { degToRad, type Water } from '../units.ts';
import { type EstimateBasis, estimatedTrim, type ThrustLine, type TrimFlag, type TrimHull, volumeFroude } from './estimated-trim.ts';
import { monotoneCubic } from './trim-curve.ts';

export type TrimBasis = 'yours' | 'measured' | 'blended' | EstimateBasis;

/** One raw measurement; null where it was not noted. Radians, m/s, kg; `sigmaRad` is the scatter of the runs. */
export interface TrimPoint {
  speedMps: number;
  trimRad: number;
  sigmaRad: number | null;
  runs: number;
  massKg: number | null;
  motorTrimRad: number | null;
}

export interface TrimQuestion {
  hull: TrimHull;
  line: ThrustLine;
  speedMps: number;
  water: Water;
  /** The owner's own measurement at this speed and load. */
  own: { trimRad: number; sigmaRad: number } | null;
  points: readonly TrimPoint[];
}

/** Scatter of a careful set of runs where nobody noted one (common practice, no source). */
const usualScatterRad = degToRad(0.5);
const sameConditionRad = degToRad(0.3);
const unknownConditionRad = degToRad(0.7);
/** A measurement this far from an unflagged planing estimate is not bent onto it. */
const greatestResidualRad = degToRad(2.5);
/** How fast a measurement stops mattering away from where it was made, in volume Froude number. */
const fadeFroude = 0.5;
/** Measurements at speeds closer than this in volume Froude number count as one place. */
const samePlaceFroude = 0.02;
/** A measurement that is not blended holds this far around its own place: about half a knot for a small boat. */
const ownPlaceFroude = 0.1;

interface Residual {
  froude: number;
  residualRad: number;
  trimRad: number;
  sigmaRad: number;
  blends: boolean;
}

/** Running trim, radians, bow up positive; sigma is that of the method, inputs' own errors not included. */
export function runningTrim(question: TrimQuestion): Estimate<TrimBasis, TrimFlag> {
  const { own, points } = question;
  if (own) return { value: own.trimRad, sigma: addInQuadrature(own.sigmaRad, sameConditionRad), basis: 'yours', flags: [] };
  const estimate = estimatedTrim(question.hull, question.line, question.speedMps, question.water);
  if (points.length === 0) return estimate;
  const froude = volumeFroude(question.speedMps, question.hull.massKg, question.water);
  const places = mergePlaces(points.map((point) => residualOf(point, question)));
  const stubborn = places.find((place) => !place.blends && Math.abs(place.froude - froude) <= ownPlaceFroude);
  if (stubborn) {
    return { value: stubborn.trimRad, sigma: stubborn.sigmaRad, basis: 'measured', flags: [...estimate.flags, 'measurement-disagrees'] };
  }
  const usable = places.filter((place) => place.blends);
  if (usable.length === 0) return { ...estimate, flags: [...estimate.flags, 'measurement-disagrees'] };
  return alongCurve(usable, estimate, froude);
}

function alongCurve(
  places: readonly Residual[],
  estimate: Estimate<EstimateBasis, TrimFlag>,
  froude: number,
): Estimate<TrimBasis, TrimFlag> {
  const first = places[0] as Residual;
  const last = places.at(-1) as Residual;
  const at = places.map((place) => place.froude);
  const alone = estimate.basis === 'class';
  const values = places.map((place) => (alone ? place.trimRad - estimate.value : place.residualRad));
  const outside = Math.max(0, first.froude - froude, froude - last.froude);
  const fade = Math.exp(-outside / fadeFroude);
  const value = estimate.value + fade * monotoneCubic(at, values)(froude);
  const nearest = Math.min(...at.map((place) => Math.abs(place - froude)));
  const trust = Math.exp(-nearest / fadeFroude);
  const scatter = monotoneCubic(
    at,
    places.map((place) => place.sigmaRad),
  )(froude);
  const sigma = Math.sqrt(trust * scatter * scatter + (1 - trust) * estimate.sigma * estimate.sigma);
  const here = outside <= samePlaceFroude;
  const basis = here && (alone || nearest <= samePlaceFroude) ? 'measured' : 'blended';
  return { value, sigma, basis, flags: here ? estimate.flags : [...estimate.flags, 'outside-measured-range'] };
}

/** Measured less estimated, both at the point's own load and motor trim. */
function residualOf(point: TrimPoint, { hull, line, water }: TrimQuestion): Residual {
  const massKg = point.massKg ?? hull.massKg;
  const atPoint = { ...line, motorTrimRad: point.motorTrimRad ?? 0 };
  const estimate = estimatedTrim({ ...hull, massKg }, atPoint, point.speedMps, water);
  const residualRad = point.trimRad - estimate.value;
  const trusted = estimate.basis === 'estimated' && estimate.flags.every((flag) => flag === 'dry-chine');
  const known = point.massKg !== null && point.motorTrimRad !== null;
  const scatter = (point.sigmaRad ?? usualScatterRad) / Math.sqrt(point.sigmaRad === null ? Math.max(1, point.runs) : 1);
  return {
    froude: volumeFroude(point.speedMps, massKg, water),
    residualRad,
    trimRad: point.trimRad,
    sigmaRad: addInQuadrature(scatter, known ? sameConditionRad : unknownConditionRad),
    blends: estimate.basis === 'class' || Math.abs(residualRad) <= (trusted ? greatestResidualRad : 3 * estimate.sigma),
  };
}

/** Sorted by speed; points at one place become their weighted mean. */
function mergePlaces(residuals: readonly Residual[]): Residual[] {
  const places: Residual[] = [];
  for (const next of residuals.toSorted((a, b) => a.froude - b.froude)) {
    const last = places.at(-1);
    if (!last || last.blends !== next.blends || next.froude - last.froude > samePlaceFroude) {
      places.push(next);
      continue;
    }
    const a = 1 / last.sigmaRad ** 2;
    const b = 1 / next.sigmaRad ** 2;
    const mean = (x: number, y: number) => (a * x + b * y) / (a + b);
    places[places.length - 1] = {
      froude: mean(last.froude, next.froude),
      residualRad: mean(last.residualRad, next.residualRad),
      trimRad: mean(last.trimRad, next.trimRad),
      sigmaRad: Math.sqrt(1 / (a + b)),
      blends: last.blends,
    };
  }
  return places;
}
