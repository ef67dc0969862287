// The point of a solid nearest to a given one; both in the solid's own axes, metres. A point inside is its own nearest point.
import { ellipseFoot } from './elliptic-strut.ts';
import type { Prism } from './prism.ts';
import type { Shape } from './solid.ts';

const clamp = (value: number, half: number): number => Math.min(half, Math.max(-half, value));

/** Replaces the point in `p` (x, y, z) by the nearest one of the shape. */
export function moveOnto(shape: Exclude<Shape, Prism>, p: Float64Array): void {
  const x = p[0] as number;
  const y = p[1] as number;
  const z = p[2] as number;
  switch (shape.kind) {
    case 'box':
      p[0] = clamp(x, shape.halfLengthM);
      p[1] = clamp(y, shape.halfWidthM);
      p[2] = clamp(z, shape.halfHeightM);
      break;
    case 'capsule': {
      const axis = clamp(x, shape.halfAxisM);
      const away = Math.sqrt((x - axis) * (x - axis) + y * y + z * z);
      const share = away > shape.radiusM ? shape.radiusM / away : 1;
      p[0] = axis + share * (x - axis);
      p[1] = share * y;
      p[2] = share * z;
      break;
    }
    case 'elliptic-strut': {
      const a2 = shape.halfChordM * shape.halfChordM;
      const b2 = shape.halfThicknessM * shape.halfThicknessM;
      const t = ellipseFoot(shape.halfChordM, shape.halfThicknessM, x, y);
      p[0] = (a2 * x) / (t + a2);
      p[1] = (b2 * y) / (t + b2);
      p[2] = clamp(z, shape.halfHeightM);
      break;
    }
    case 'prop-disc': {
      const away = Math.sqrt(y * y + z * z);
      const share = away > shape.radiusM ? shape.radiusM / away : 1;
      p[0] = clamp(x, shape.halfDepthM);
      p[1] = share * y;
      p[2] = share * z;
      break;
    }
    default:
      shape satisfies never;
  }
}
