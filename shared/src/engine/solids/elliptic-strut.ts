/** A right cylinder of elliptic section along its own z axis, about its middle. Metres. */
export interface EllipticStrut {
  kind: 'elliptic-strut';
  /** Half the chord, along x. */
  halfChordM: number;
  /** Half the thickness, along y. */
  halfThicknessM: number;
  halfHeightM: number;
}

/**
 * How far along a ray the strut is met, m; 0 from inside, Infinity where it is missed or lies behind.
 * The section is scaled to a unit circle; origin and unit direction in the strut's own axes.
 */
export function enterEllipticStrut(strut: EllipticStrut, ox: number, oy: number, oz: number, dx: number, dy: number, dz: number): number {
  let near = 0;
  let far = Infinity;
  if (dz !== 0) {
    const a = (-strut.halfHeightM - oz) / dz;
    const b = (strut.halfHeightM - oz) / dz;
    near = Math.max(near, Math.min(a, b));
    far = Math.max(a, b);
  } else if (Math.abs(oz) > strut.halfHeightM) return Infinity;
  const ux = ox / strut.halfChordM;
  const uy = oy / strut.halfThicknessM;
  const vx = dx / strut.halfChordM;
  const vy = dy / strut.halfThicknessM;
  const a = vx * vx + vy * vy;
  const c = ux * ux + uy * uy - 1;
  if (a > 0) {
    const b = ux * vx + uy * vy;
    const root = b * b - a * c;
    if (root < 0) return Infinity;
    const s = Math.sqrt(root);
    near = Math.max(near, (-b - s) / a);
    far = Math.min(far, (-b + s) / a);
  } else if (c > 0) return Infinity;
  return near <= far ? near : Infinity;
}

/** Distance of a point (own axes, m) to the strut; 0 inside. */
export function distanceToEllipticStrut(strut: EllipticStrut, x: number, y: number, z: number): number {
  const grow = ellipseFoot(strut.halfChordM, strut.halfThicknessM, x, y);
  const along = Math.max(0, Math.abs(z) - strut.halfHeightM);
  if (grow === 0) return along;
  const a2 = strut.halfChordM * strut.halfChordM;
  const b2 = strut.halfThicknessM * strut.halfThicknessM;
  const ex = (x * grow) / (grow + a2);
  const ey = (y * grow) / (grow + b2);
  return Math.sqrt(ex * ex + ey * ey + along * along);
}

/**
 * The nearest point of a filled ellipse to (x, y) is (a² x/(t + a²), b² y/(t + b²)); this is t, 0 inside.
 * t solves (a x/(t + a²))² + (b y/(t + b²))² = 1, whose left side falls and is convex for t ≥ 0, so Newton from 0 never overshoots
 * (Hart 1994, Graphics Gems IV, p. 113). Semi-axes a and b, metres.
 */
export function ellipseFoot(a: number, b: number, x: number, y: number): number {
  const ax = (a * x) ** 2;
  const by = (b * y) ** 2;
  let t = 0;
  for (let i = 0; i < 60; i++) {
    const u = 1 / (t + a * a);
    const v = 1 / (t + b * b);
    const p = ax * u * u;
    const q = by * v * v;
    const excess = p + q - 1;
    if (excess <= 0) break;
    const step = excess / (2 * (p * u + q * v));
    t += step;
    if (step <= 1e-15 * (t + a * a)) break;
  }
  return t;
}
