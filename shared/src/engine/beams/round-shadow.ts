// Parallel rays past round solids; see shadow.ts for what is looked for. An end of the interval is a line that touches the solid:
// tangent to its barrel, through a corner where barrel and end face meet, or tangent to a ball.
import type { Capsule } from '../solids/capsule.ts';
import type { EllipticStrut } from '../solids/elliptic-strut.ts';
import type { PropDisc } from '../solids/prop-disc.ts';
import type { RayFamily, Shadow } from './shadow.ts';

function beginNone(shadow: Shadow): void {
  shadow.low = Number.POSITIVE_INFINITY;
  shadow.high = Number.NEGATIVE_INFINITY;
  shadow.lowExact = true;
  shadow.highExact = true;
}

/** Takes in the ray at s, which touches the solid at t. */
function touch(shadow: Shadow, s: number, t: number, reachM: number): void {
  const exact = t >= 0 && t <= reachM;
  if (s < shadow.low) {
    shadow.low = s;
    shadow.lowExact = exact;
  }
  if (s > shadow.high) {
    shadow.high = s;
    shadow.highExact = exact;
  }
}

/** Rays through a strut of elliptic section along z. */
export function strutShadow(strut: EllipticStrut, f: RayFamily, shadow: Shadow): void {
  const a = 1 / strut.halfChordM;
  const b = 1 / strut.halfThicknessM;
  const h = strut.halfHeightM;
  cylinderShadow(f.ox * a, f.oy * b, f.oz, f.ex * a, f.ey * b, f.ez, f.dx * a, f.dy * b, f.dz, h, f.reachM, shadow);
}

/** Rays through a propeller's disc along x. */
export function discShadow(disc: PropDisc, f: RayFamily, shadow: Shadow): void {
  const r = 1 / disc.radiusM;
  const h = disc.halfDepthM;
  cylinderShadow(f.oy * r, f.oz * r, f.ox, f.ey * r, f.ez * r, f.ex, f.dy * r, f.dz * r, f.dx, h, f.reachM, shadow);
}

/** A cylinder about w, scaled so that its section in u, v is the unit circle. */
function cylinderShadow(
  ou: number,
  ov: number,
  ow: number,
  eu: number,
  ev: number,
  ew: number,
  du: number,
  dv: number,
  dw: number,
  half: number,
  reachM: number,
  shadow: Shadow,
): void {
  beginNone(shadow);
  const turn = eu * dv - ev * du;
  const dd = du * du + dv * dv;
  if (turn !== 0) {
    const across = ou * dv - ov * du;
    const size = Math.sqrt(dd);
    for (let sign = -1; sign <= 1; sign += 2) {
      const s = (sign * size - across) / turn;
      const t = -((ou + s * eu) * du + (ov + s * ev) * dv) / dd;
      if (Math.abs(ow + s * ew + t * dw) <= half) touch(shadow, s, t, reachM);
    }
  }
  // On an end face w = ±half the better conditioned of s and t gives way to the other: a quadratic for where it meets the circle.
  const byRay = Math.abs(ew) >= Math.abs(dw);
  const lead = byRay ? ew : dw;
  if (lead === 0) {
    if (Math.abs(ow) > half) beginNone(shadow);
    return;
  }
  const k = (byRay ? dw : ew) / lead;
  const vu = byRay ? du - k * eu : eu - k * du;
  const vv = byRay ? dv - k * ev : ev - k * dv;
  const a = vu * vu + vv * vv;
  for (let sign = -1; sign <= 1; sign += 2) {
    const base = (sign * half - ow) / lead;
    const pu = ou + base * (byRay ? eu : du);
    const pv = ov + base * (byRay ? ev : dv);
    const b = pu * vu + pv * vv;
    const root = b * b - a * (pu * pu + pv * pv - 1);
    if (root < 0) continue;
    const spread = Math.sqrt(root);
    for (let way = -1; way <= 1; way += 2) {
      const free = (-b + way * spread) / a;
      const bound = base - k * free;
      touch(shadow, byRay ? bound : free, byRay ? free : bound, reachM);
    }
  }
}

/** Rays through a capsule along x. */
export function capsuleShadow({ halfAxisM, radiusM }: Capsule, f: RayFamily, shadow: Shadow): void {
  beginNone(shadow);
  const { ox, oy, oz, ex, ey, ez, dx, dy, dz, reachM } = f;
  const turn = ey * dz - ez * dy;
  if (turn !== 0) {
    const dd = dy * dy + dz * dz;
    const across = oy * dz - oz * dy;
    const size = radiusM * Math.sqrt(dd);
    for (let sign = -1; sign <= 1; sign += 2) {
      const s = (sign * size - across) / turn;
      const t = -((oy + s * ey) * dy + (oz + s * ez) * dz) / dd;
      if (Math.abs(ox + s * ex + t * dx) <= halfAxisM) touch(shadow, s, t, reachM);
    }
  }
  const ed = ex * dx + ey * dy + ez * dz;
  const a = 1 - ed * ed;
  for (let end = -1; end <= 1; end += 2) {
    const px = ox - end * halfAxisM;
    const pe = px * ex + oy * ey + oz * ez;
    const pd = px * dx + oy * dy + oz * dz;
    const b = pe - pd * ed;
    const root = b * b - a * (px * px + oy * oy + oz * oz - pd * pd - radiusM * radiusM);
    if (root < 0) continue;
    const spread = Math.sqrt(root);
    for (let sign = -1; sign <= 1; sign += 2) {
      const s = (-b + sign * spread) / a;
      touch(shadow, s, -(pd + s * ed), reachM);
    }
  }
}
