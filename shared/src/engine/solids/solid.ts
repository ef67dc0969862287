// The solids a beam can meet, each standing somewhere in the boat frame.
import type { Pose } from '../frames.ts';
import type { Vec3 } from '../vec3.ts';
import { type Box, distanceToBox, enterBox } from './box.ts';
import { type Capsule, distanceToCapsule, enterCapsule } from './capsule.ts';
import { distanceToEllipticStrut, type EllipticStrut, enterEllipticStrut } from './elliptic-strut.ts';
import { depthInPrism, enterPrism, type Prism } from './prism.ts';
import { distanceToPropDisc, enterPropDisc, type PropDisc } from './prop-disc.ts';

export type Shape = Box | Capsule | EllipticStrut | PropDisc | Prism;

export const solidParts = ['torpedo', 'strut', 'leg', 'plate', 'skeg', 'propeller', 'obstacle', 'hull'] as const;
export type SolidPart = (typeof solidParts)[number];

/** Whose part it is: `unit` counts engines from 0 and is null for the hull and for obstacles. */
export interface Owner {
  unit: number | null;
  part: SolidPart;
  label?: string;
}

export interface Solid {
  shape: Shape;
  pose: Pose;
  /** Share of the sound it takes: 1, or the blade area ratio of a propeller. */
  opacity: number;
  owner: Owner;
}

/** How far along a ray (boat frame, unit direction) the solid is met, m; 0 from inside, Infinity where it is missed or behind. */
export function enterSolid({ shape, pose }: Solid, origin: Vec3, direction: Vec3): number {
  const [a, b, c, d, e, f, g, h, i] = pose.rotation;
  const x = origin[0] - pose.originM[0];
  const y = origin[1] - pose.originM[1];
  const z = origin[2] - pose.originM[2];
  const [u, v, w] = direction;
  const ox = a * x + d * y + g * z;
  const oy = b * x + e * y + h * z;
  const oz = c * x + f * y + i * z;
  const dx = a * u + d * v + g * w;
  const dy = b * u + e * v + h * w;
  const dz = c * u + f * v + i * w;
  return enterShape(shape, ox, oy, oz, dx, dy, dz);
}

/** The same with origin and direction in the shape's own axes. */
export function enterShape(shape: Shape, ox: number, oy: number, oz: number, dx: number, dy: number, dz: number): number {
  switch (shape.kind) {
    case 'box':
      return enterBox(shape, ox, oy, oz, dx, dy, dz);
    case 'capsule':
      return enterCapsule(shape, ox, oy, oz, dx, dy, dz);
    case 'elliptic-strut':
      return enterEllipticStrut(shape, ox, oy, oz, dx, dy, dz);
    case 'prop-disc':
      return enterPropDisc(shape, ox, oy, oz, dx, dy, dz);
    case 'prism':
      return enterPrism(shape, ox, oy, oz, dx, dy, dz);
    default:
      return shape satisfies never;
  }
}

/** Distance of a point (boat frame, m) to the solid; 0 inside. Of a prism only the sign is kept: 0 inside, Infinity outside. */
export function distanceToSolid({ shape, pose }: Solid, point: Vec3): number {
  const [a, b, c, d, e, f, g, h, i] = pose.rotation;
  const px = point[0] - pose.originM[0];
  const py = point[1] - pose.originM[1];
  const pz = point[2] - pose.originM[2];
  const x = a * px + d * py + g * pz;
  const y = b * px + e * py + h * pz;
  const z = c * px + f * py + i * pz;
  switch (shape.kind) {
    case 'box':
      return distanceToBox(shape, x, y, z);
    case 'capsule':
      return distanceToCapsule(shape, x, y, z);
    case 'elliptic-strut':
      return distanceToEllipticStrut(shape, x, y, z);
    case 'prop-disc':
      return distanceToPropDisc(shape, x, y, z);
    case 'prism':
      return depthInPrism(shape, x, y, z) >= 0 ? 0 : Infinity;
    default:
      return shape satisfies never;
  }
}

/** Radius of a sphere about the solid's own origin that holds it, m; Infinity for an open prism. */
export function boundingRadiusM(shape: Shape): number {
  switch (shape.kind) {
    case 'box':
      return Math.hypot(shape.halfLengthM, shape.halfWidthM, shape.halfHeightM);
    case 'capsule':
      return shape.halfAxisM + shape.radiusM;
    case 'elliptic-strut':
      return Math.hypot(Math.max(shape.halfChordM, shape.halfThicknessM), shape.halfHeightM);
    case 'prop-disc':
      return Math.hypot(shape.radiusM, shape.halfDepthM);
    case 'prism':
      return Infinity;
    default:
      return shape satisfies never;
  }
}
