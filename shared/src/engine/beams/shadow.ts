// Parallel rays that start along a line: which of them meet a solid?
// Rays o + s e + t d share their direction d; their starts lie along e. For a convex solid {(s, t)} is convex, so the rays that meet it
// within 0 ≤ t ≤ reach form one interval of s, whatever the direction. All vectors are in the solid's own axes; e and d are unit vectors.
// The interval's ends are extremes of s over that region: a tangent line, or a corner of two faces.
import type { Box } from '../solids/box.ts';

/** The rays' common frame in a solid's own axes. */
export interface RayFamily {
  ox: number;
  oy: number;
  oz: number;
  ex: number;
  ey: number;
  ez: number;
  dx: number;
  dy: number;
  dz: number;
  reachM: number;
  /** The rays' starts lie within ±half of o. */
  halfM: number;
}

/**
 * The interval of s that was found, empty where low > high. An end whose touch lies behind the start or out of reach is not exact:
 * the true interval then lies inside this one.
 */
export interface Shadow {
  low: number;
  high: number;
  lowExact: boolean;
  highExact: boolean;
}

export const emptyShadow = (): Shadow => ({ low: 1, high: -1, lowExact: true, highExact: true });

/** Everything is shaded until a face says otherwise. */
function beginWhole(shadow: Shadow): void {
  shadow.low = Number.NEGATIVE_INFINITY;
  shadow.high = Number.POSITIVE_INFINITY;
  shadow.lowExact = true;
  shadow.highExact = true;
}

function limit(shadow: Shadow, rate: number, room: number): void {
  // rate · s ≤ room
  if (rate > 0) shadow.high = Math.min(shadow.high, room / rate);
  else if (rate < 0) shadow.low = Math.max(shadow.low, room / rate);
  else if (room < 0) shadow.low = Number.POSITIVE_INFINITY;
}

/** Rays through a box. Eliminates t from the six face inequalities (Fourier and Motzkin). */
export function boxShadow(box: Box, f: RayFamily, shadow: Shadow): void {
  beginWhole(shadow);
  // Along axis k: t lies within a_k + g_k s ± w_k.
  const ix = 1 / f.dx;
  const iy = 1 / f.dy;
  const iz = 1 / f.dz;
  const flatX = !Number.isFinite(ix);
  const flatY = !Number.isFinite(iy);
  const flatZ = !Number.isFinite(iz);
  if (flatX) between(shadow, f.ox, f.ex, box.halfLengthM);
  else alongRay(shadow, -f.ox * ix, -f.ex * ix, box.halfLengthM * Math.abs(ix), f.reachM);
  if (flatY) between(shadow, f.oy, f.ey, box.halfWidthM);
  else alongRay(shadow, -f.oy * iy, -f.ey * iy, box.halfWidthM * Math.abs(iy), f.reachM);
  if (flatZ) between(shadow, f.oz, f.ez, box.halfHeightM);
  else alongRay(shadow, -f.oz * iz, -f.ez * iz, box.halfHeightM * Math.abs(iz), f.reachM);
  if (!flatX && !flatY) {
    between(shadow, f.oy * iy - f.ox * ix, f.ey * iy - f.ex * ix, box.halfLengthM * Math.abs(ix) + box.halfWidthM * Math.abs(iy));
  }
  if (!flatX && !flatZ) {
    between(shadow, f.oz * iz - f.ox * ix, f.ez * iz - f.ex * ix, box.halfLengthM * Math.abs(ix) + box.halfHeightM * Math.abs(iz));
  }
  if (!flatY && !flatZ) {
    between(shadow, f.oz * iz - f.oy * iy, f.ez * iz - f.ey * iy, box.halfWidthM * Math.abs(iy) + box.halfHeightM * Math.abs(iz));
  }
}

/** |at + rate · s| ≤ half */
function between(shadow: Shadow, at: number, rate: number, half: number): void {
  limit(shadow, rate, half - at);
  limit(shadow, -rate, half + at);
}

/** The stretch a + g s ± w of the ray overlaps 0 … reach. */
function alongRay(shadow: Shadow, a: number, g: number, w: number, reachM: number): void {
  limit(shadow, g, reachM - a + w);
  limit(shadow, -g, a + w);
}

/** What of a prism's planes does not change with the rays' direction. */
export interface PrismTerms {
  planes: Float64Array;
  /** Two numbers a plane: how fast s turns toward it, and the room from o to it. */
  room: Float64Array;
  /** Room for one number a plane: how fast t turns toward it. */
  rates: Float64Array;
}

export function prismTerms(planes: Float64Array, { ox, oy, oz, ex, ey, ez }: RayFamily): PrismTerms {
  const count = planes.length / 4;
  const room = new Float64Array(2 * count);
  for (let i = 0; i < count; i++) {
    const x = planes[4 * i] as number;
    const y = planes[4 * i + 1] as number;
    const z = planes[4 * i + 2] as number;
    room[2 * i] = x * ex + y * ey + z * ez;
    room[2 * i + 1] = (planes[4 * i + 3] as number) - x * ox - y * oy - z * oz;
  }
  return { planes, room, rates: new Float64Array(count) };
}

/** Rays through the space behind planes, given in the rays' axes. */
export function prismShadow({ planes, room, rates }: PrismTerms, f: RayFamily, shadow: Shadow): void {
  beginWhole(shadow);
  const count = rates.length;
  for (let i = 0; i < count; i++) {
    const rate = (planes[4 * i] as number) * f.dx + (planes[4 * i + 1] as number) * f.dy + (planes[4 * i + 2] as number) * f.dz;
    const turn = room[2 * i] as number;
    const free = room[2 * i + 1] as number;
    rates[i] = rate;
    // rate · t ≤ free − turn · s, against 0 ≤ t ≤ reach.
    const furthest = rate >= 0 ? free : free - rate * f.reachM;
    limit(shadow, turn, furthest);
    // Every ray starts outside this plane and none comes back in reach.
    if (furthest + Math.abs(turn) * f.halfM < 0) {
      shadow.low = Number.POSITIVE_INFINITY;
      return;
    }
  }
  for (let i = 0; i < count; i++) {
    const rate = rates[i] as number;
    if (rate >= 0) continue;
    const turn = room[2 * i] as number;
    const free = room[2 * i + 1] as number;
    for (let j = 0; j < count; j++) {
      const other = rates[j] as number;
      if (other <= 0) continue;
      // (free − turn s)/rate ≤ (free' − turn' s)/rate', with rate < 0 < rate'.
      limit(shadow, other * turn - rate * (room[2 * j] as number), other * free - rate * (room[2 * j + 1] as number));
    }
  }
}
