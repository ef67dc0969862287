/** What a turning propeller sweeps: a round cylinder along its own x axis, about its middle. Metres. */
export interface PropDisc {
  kind: 'prop-disc';
  radiusM: number;
  halfDepthM: number;
}

/**
 * How far along a ray the disc is met, m; 0 from inside, Infinity where it is missed or lies behind.
 * Origin and unit direction in the disc's own axes.
 */
export function enterPropDisc(disc: PropDisc, ox: number, oy: number, oz: number, dx: number, dy: number, dz: number): number {
  let near = 0;
  let far = Infinity;
  if (dx !== 0) {
    const a = (-disc.halfDepthM - ox) / dx;
    const b = (disc.halfDepthM - ox) / dx;
    near = Math.max(near, Math.min(a, b));
    far = Math.max(a, b);
  } else if (Math.abs(ox) > disc.halfDepthM) return Infinity;
  const a = dy * dy + dz * dz;
  const c = oy * oy + oz * oz - disc.radiusM * disc.radiusM;
  if (a > 0) {
    const b = oy * dy + oz * dz;
    const root = b * b - a * c;
    if (root < 0) return Infinity;
    const s = Math.sqrt(root);
    near = Math.max(near, (-b - s) / a);
    far = Math.min(far, (-b + s) / a);
  } else if (c > 0) return Infinity;
  return near <= far ? near : Infinity;
}

/** Distance of a point (own axes, m) to the disc; 0 inside. */
export function distanceToPropDisc(disc: PropDisc, x: number, y: number, z: number): number {
  const along = Math.max(0, Math.abs(x) - disc.halfDepthM);
  const across = Math.max(0, Math.sqrt(y * y + z * z) - disc.radiusM);
  return Math.sqrt(along * along + across * across);
}
