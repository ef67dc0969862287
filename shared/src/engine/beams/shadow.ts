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

/** Rays through the space behind planes (four numbers a plane, in the rays' axes). At most 8 planes. */
export function prismShadow(planes: Float64Array, f: RayFamily, shadow: Shadow): void {
  beginWhole(shadow);
  for (let i = 0; i < planes.length; i += 4) {
    const rate = (planes[i] as number) * f.dx + (planes[i + 1] as number) * f.dy + (planes[i + 2] as number) * f.dz;
    const turn = (planes[i] as number) * f.ex + (planes[i + 1] as number) * f.ey + (planes[i + 2] as number) * f.ez;
    const room =
      (planes[i + 3] as number) - (planes[i] as number) * f.ox - (planes[i + 1] as number) * f.oy - (planes[i + 2] as number) * f.oz;
    // rate · t ≤ room − turn · s, against 0 ≤ t ≤ reach and against every plane of the other sign.
    if (rate >= 0) {
      limit(shadow, turn, room);
      continue;
    }
    limit(shadow, turn, room - rate * f.reachM);
    for (let j = 0; j < planes.length; j += 4) {
      const other = (planes[j] as number) * f.dx + (planes[j + 1] as number) * f.dy + (planes[j + 2] as number) * f.dz;
      if (other <= 0) continue;
      const otherTurn = (planes[j] as number) * f.ex + (planes[j + 1] as number) * f.ey + (planes[j + 2] as number) * f.ez;
      const otherRoom =
        (planes[j + 3] as number) - (planes[j] as number) * f.ox - (planes[j + 1] as number) * f.oy - (planes[j + 2] as number) * f.oz;
      // (room − turn s)/rate ≤ (otherRoom − otherTurn s)/other, with rate < 0 < other.
      limit(shadow, other * turn - rate * otherTurn, other * room - rate * otherRoom);
    }
  }
}
