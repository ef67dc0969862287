// The directions of one side's fan and how much each counts.
import type { SideElement } from '../sensor.ts';
import { degToRad } from '../units.ts';
import { lineHalfWidth, twoWayWeight } from './pattern.ts';

export type Side = 'port' | 'starboard';

/** Depressions from the sensor's level, radians, in equal steps; the same for both sides. */
export interface Fan {
  depressionsRad: Float64Array;
  cosines: Float64Array;
  sines: Float64Array;
  /** Two-way weight of each depression; they do not add up to 1. */
  weights: Float64Array;
  totalWeight: number;
  stepRad: number;
}

const greatestStepRad = degToRad(0.5);

/**
 * The fan of a side element: from axis − half width (not above level) to axis + half width (not past straight down),
 * ends included, in equal steps of at most half a degree.
 */
export function fanOf(element: SideElement): Fan {
  const half = element.verticalWidthRad / 2;
  const from = Math.max(0, element.depressionRad - half);
  const to = Math.min(Math.PI / 2, element.depressionRad + half);
  const steps = Math.max(1, Math.ceil((to - from) / greatestStepRad - 1e-9));
  const kappa = lineHalfWidth(element.levelDb, element.levelWay) / Math.sin(half);
  const depressionsRad = new Float64Array(steps + 1);
  const weights = new Float64Array(steps + 1);
  let totalWeight = 0;
  for (let i = 0; i <= steps; i++) {
    const depression = i === steps ? to : from + ((to - from) * i) / steps;
    const weight = twoWayWeight(depression, element.depressionRad, kappa);
    depressionsRad[i] = depression;
    weights[i] = weight;
    totalWeight += weight;
  }
  const cosines = depressionsRad.map(Math.cos);
  const sines = depressionsRad.map(Math.sin);
  return { depressionsRad, cosines, sines, weights, totalWeight, stepRad: (to - from) / steps };
}
