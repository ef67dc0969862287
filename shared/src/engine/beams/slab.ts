// One side's fan cast as a slab: close to the face the beam is as wide as the aperture, so rays start all along it.
// Rays of one direction are parallel, so each convex solid takes an unbroken run of them: runs are kept as bits, one a cell.
import type { Pose } from '../frames.ts';
import type { SideElement } from '../sensor.ts';
import type { Solid } from '../solids/solid.ts';
import { reachM } from '../thresholds.ts';
import { depressionSpan } from './depression-span.ts';
import type { Fan, Side } from './fan.ts';
import { type SeenSolid, seenBy } from './seen-solid.ts';
import { allCells, apertureCells, bitCount, markRuns, raysADirection, ways } from './slab-runs.ts';

/** What is blocked, direction by direction, in the order of the fan's depressions. */
export interface SlabProfile {
  /** Share of the slab's rays lost, 0 to 1. */
  blocked: Float64Array;
  /** What each solid alone would take, one array a solid; null where it takes nothing. */
  bySolid: (Float64Array | null)[];
}

/** Cells that are taken, three along-track directions a step: by what is opaque, and by what lets some through. */
interface Taken {
  opaque: Int32Array;
  veils: { opacity: number; cells: Int32Array }[];
}

/**
 * Share of the slab lost in every direction of the fan, for one side.
 * A ray keeps Π(1 − opacity) of the solids it meets within the limit (5 m); each direction averages cells × {−h/2, 0, +h/2}.
 */
export function castSlab(
  solids: readonly Solid[],
  sensor: Pose,
  element: SideElement,
  fan: Fan,
  side: Side,
  limitM: number = reachM,
): SlabProfile {
  const steps = fan.depressionsRad.length;
  const taken: Taken = { opaque: new Int32Array(steps * ways), veils: [] };
  const bySolid = solids.map((solid) => {
    const seen = seenBy(sensor, solid);
    const span = depressionSpan(seen, side, fan, element, limitM);
    if (!span) return null;
    const own = new Float64Array(steps);
    const lost = markRuns(seen, span, element, fan, side, cellsFor(solid, taken, steps), limitM, own, Number.POSITIVE_INFINITY);
    return lost > 0 ? own : null;
  });
  const blocked = new Float64Array(steps);
  for (let i = 0; i < steps * ways; i++) {
    const step = (i / ways) | 0;
    blocked[step] = (blocked[step] as number) + lostAt(taken, i) / raysADirection;
  }
  return { blocked, bySolid };
}

function cellsFor({ opacity }: Solid, { opaque, veils }: Taken, steps: number): Int32Array {
  if (opacity >= 1) return opaque;
  const cells = new Int32Array(steps * ways);
  veils.push({ opacity, cells });
  return cells;
}

/**
 * Clear share of a side, Σ w (1 − blocked) / Σ w, 0 to 1. Below `least` it may stop early and answer with any value below it:
 * as soon as one solid alone takes too much.
 */
export function slabShare(solids: readonly SeenSolid[], element: SideElement, fan: Fan, side: Side, least = 0): number {
  const steps = fan.depressionsRad.length;
  const budget = least > 0 ? (1 - least + 1e-12) * fan.totalWeight : Number.POSITIVE_INFINITY;
  let taken: Taken | null = null;
  let from = steps;
  let to = -1;
  for (const seen of solids) {
    const span = depressionSpan(seen, side, fan, element, reachM);
    if (!span) continue;
    taken ??= { opaque: new Int32Array(steps * ways), veils: [] };
    const lost = markRuns(seen, span, element, fan, side, cellsFor(seen.solid, taken, steps), reachM, null, budget);
    if (lost > budget) return Math.min(least / 2, 1 - lost / fan.totalWeight);
    if (lost === 0) continue;
    from = Math.min(from, span.first);
    to = Math.max(to, span.last);
  }
  if (!taken) return 1;
  let lost = 0;
  for (let step = from; step <= to; step++) {
    const at = step * ways;
    lost += (fan.weights[step] as number) * (lostAt(taken, at) + lostAt(taken, at + 1) + lostAt(taken, at + 2));
  }
  return Math.min(1, Math.max(0, 1 - lost / raysADirection / fan.totalWeight));
}

/** Whether one solid by itself leaves a side less than a clear share of `least`. */
export function hidesAlone(seen: SeenSolid, element: SideElement, fan: Fan, side: Side, least: number): boolean {
  const span = depressionSpan(seen, side, fan, element, reachM);
  if (!span) return false;
  const budget = (1 - least + 1e-12) * fan.totalWeight;
  return markRuns(seen, span, element, fan, side, null, reachM, null, budget) > budget;
}

/** Rays lost in one direction, of its aperture's cells. */
function lostAt({ opaque, veils }: Taken, at: number): number {
  const hidden = opaque[at] as number;
  if (veils.length === 0) return bitCount(hidden);
  return bitCount(hidden) + veiled(veils, at, allCells & ~hidden);
}

/** Share of the side's two-way weight that is taken, 0 to 1. */
export function shareTaken(fan: Fan, taken: Float64Array): number {
  let lost = 0;
  for (let i = 0; i < taken.length; i++) lost += (fan.weights[i] as number) * (taken[i] as number);
  return lost / fan.totalWeight;
}

/** Rays lost to what lets some through, among the cells still open. */
function veiled(veils: readonly { opacity: number; cells: Int32Array }[], at: number, open: number): number {
  let lost = 0;
  let touched = 0;
  let several = 0;
  for (const { opacity, cells } of veils) {
    const own = (cells[at] as number) & open;
    several |= touched & own;
    touched |= own;
    lost += opacity * bitCount(own);
  }
  if (several === 0) return lost;
  lost = 0;
  for (let cell = 0; cell < apertureCells; cell++) {
    const bit = 1 << cell;
    if ((open & bit) === 0) continue;
    let kept = 1;
    for (const { opacity, cells } of veils) if (((cells[at] as number) & bit) !== 0) kept *= 1 - opacity;
    lost += 1 - kept;
  }
  return lost;
}
