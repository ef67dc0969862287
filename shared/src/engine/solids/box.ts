/** A box about its own origin. Half sizes in metres. */
export interface Box {
  kind: 'box';
  halfLengthM: number;
  halfWidthM: number;
  halfHeightM: number;
}

/**
 * How far along a ray the box is met, m; 0 from inside, Infinity where it is missed or lies behind.
 * Slab method (Kay & Kajiya 1986). Origin and unit direction in the box's own axes.
 */
export function enterBox(box: Box, ox: number, oy: number, oz: number, dx: number, dy: number, dz: number): number {
  let near = 0;
  let far = Infinity;
  if (dx !== 0) {
    const a = (-box.halfLengthM - ox) / dx;
    const b = (box.halfLengthM - ox) / dx;
    near = Math.max(near, Math.min(a, b));
    far = Math.min(far, Math.max(a, b));
  } else if (Math.abs(ox) > box.halfLengthM) return Infinity;
  if (dy !== 0) {
    const a = (-box.halfWidthM - oy) / dy;
    const b = (box.halfWidthM - oy) / dy;
    near = Math.max(near, Math.min(a, b));
    far = Math.min(far, Math.max(a, b));
  } else if (Math.abs(oy) > box.halfWidthM) return Infinity;
  if (dz !== 0) {
    const a = (-box.halfHeightM - oz) / dz;
    const b = (box.halfHeightM - oz) / dz;
    near = Math.max(near, Math.min(a, b));
    far = Math.min(far, Math.max(a, b));
  } else if (Math.abs(oz) > box.halfHeightM) return Infinity;
  return near <= far ? near : Infinity;
}

/** Distance of a point (own axes, m) to the box; 0 inside. */
export function distanceToBox(box: Box, x: number, y: number, z: number): number {
  const ex = Math.max(0, Math.abs(x) - box.halfLengthM);
  const ey = Math.max(0, Math.abs(y) - box.halfWidthM);
  const ez = Math.max(0, Math.abs(z) - box.halfHeightM);
  return Math.sqrt(ex * ex + ey * ey + ez * ez);
}
