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
  const across = distanceToEllipse(strut.halfChordM, strut.halfThicknessM, Math.abs(x), Math.abs(y));
  const along = Math.max(0, Math.abs(z) - strut.halfHeightM);
  return Math.sqrt(across * across + along * along);
}

/**
 * Distance of a point in the first quadrant to a filled ellipse, m; 0 inside.
 * The foot of the normal solves (a x/(t+a²))² + (b y/(t+b²))² = 1, which falls steadily for t ≥ 0: Newton from t = 0 never
 * overshoots because the left side is convex (Hart 1994, Graphics Gems IV, p. 113).
 */
function distanceToEllipse(a: number, b: number, x: number, y: number): number {
  const u = x / a;
  const v = y / b;
  if (u * u + v * v <= 1) return 0;
  let t = 0;
  for (let i = 0; i < 60; i++) {
    const p = (a * x) / (t + a * a);
    const q = (b * y) / (t + b * b);
    const excess = p * p + q * q - 1;
    const slope = -2 * ((p * p) / (t + a * a) + (q * q) / (t + b * b));
    const step = excess / slope;
    t -= step;
    if (Math.abs(step) <= 1e-15 * (t + a * a)) break;
  }
  const footX = (a * a * x) / (t + a * a);
  const footY = (b * b * y) / (t + b * b);
  return Math.hypot(x - footX, y - footY);
}
