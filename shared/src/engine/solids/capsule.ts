/** A cylinder along its own x axis with hemispherical ends, about its middle. Metres. */
export interface Capsule {
  kind: 'capsule';
  /** Half the distance between the centres of the two ends; 0 makes a sphere. */
  halfAxisM: number;
  radiusM: number;
}

/**
 * How far along a ray the capsule is met, m; 0 from inside, Infinity where it is missed or lies behind.
 * Origin and unit direction in the capsule's own axes.
 */
export function enterCapsule(capsule: Capsule, ox: number, oy: number, oz: number, dx: number, dy: number, dz: number): number {
  const { halfAxisM, radiusM } = capsule;
  if (distanceToCapsule(capsule, ox, oy, oz) <= 0) return 0;
  const rr = radiusM * radiusM;
  let entry = Infinity;
  // The barrel: the ray seen along the axis is a line past a circle.
  const a = dy * dy + dz * dz;
  if (a > 1e-24) {
    const b = oy * dy + oz * dz;
    const c = oy * oy + oz * oz - rr;
    const root = b * b - a * c;
    if (root < 0) return Infinity;
    const t = (-b - Math.sqrt(root)) / a;
    if (t >= 0 && Math.abs(ox + t * dx) <= halfAxisM) entry = t;
  }
  for (let side = -1; side <= 1; side += 2) {
    const px = ox - side * halfAxisM;
    const b = px * dx + oy * dy + oz * dz;
    const root = b * b - (px * px + oy * oy + oz * oz - rr);
    if (root < 0) continue;
    const t = -b - Math.sqrt(root);
    if (t >= 0 && t < entry) entry = t;
  }
  return entry;
}

/** Distance of a point (own axes, m) to the capsule; 0 inside. */
export function distanceToCapsule({ halfAxisM, radiusM }: Capsule, x: number, y: number, z: number): number {
  const ex = Math.max(0, Math.abs(x) - halfAxisM);
  return Math.max(0, Math.sqrt(ex * ex + y * y + z * z) - radiusM);
}
