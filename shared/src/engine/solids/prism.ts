// A convex body as the space behind a handful of planes; it may be open, as the hull is forward and upward.

/** Points p with n · p ≤ offset for every plane; four numbers a plane: nx, ny, nz, offset, metres. */
export interface Prism {
  kind: 'prism';
  planes: Float64Array;
}

/**
 * How far along a ray the prism is met, m; 0 from inside, Infinity where it is missed or lies behind.
 * Clipping of a line by half-spaces (Cyrus & Beck 1978). Origin and direction in the prism's own axes.
 */
export function enterPrism({ planes }: Prism, ox: number, oy: number, oz: number, dx: number, dy: number, dz: number): number {
  let near = 0;
  let far = Infinity;
  for (let i = 0; i < planes.length; i += 4) {
    const nx = planes[i] as number;
    const ny = planes[i + 1] as number;
    const nz = planes[i + 2] as number;
    const rate = nx * dx + ny * dy + nz * dz;
    const room = (planes[i + 3] as number) - (nx * ox + ny * oy + nz * oz);
    if (rate === 0) {
      if (room < 0) return Infinity;
    } else if (rate > 0) {
      far = Math.min(far, room / rate);
    } else {
      near = Math.max(near, room / rate);
    }
    if (near > far) return Infinity;
  }
  return near;
}

/** How deep a point is inside: the least distance to a plane, below 0 outside. Planes with unit normals; metres. */
export function depthInPrism({ planes }: Prism, x: number, y: number, z: number): number {
  let depth = Infinity;
  for (let i = 0; i < planes.length; i += 4) {
    const along = (planes[i] as number) * x + (planes[i + 1] as number) * y + (planes[i + 2] as number) * z;
    depth = Math.min(depth, (planes[i + 3] as number) - along);
  }
  return depth;
}
