// The engine's own solids as flat outlines, so that what is drawn is what the beam meets.
import { toBoat } from '@tiltwright/shared/engine/frames.ts';
import type { Shape, Solid } from '@tiltwright/shared/engine/solids/solid.ts';
import type { Vec3 } from '@tiltwright/shared/engine/vec3.ts';
import { convexOutline } from './convex-outline.ts';
import { type Point2, project, type View } from './views.ts';

/** Points around a circle or ellipse: 48 keep the outline within 0.2 % of the radius, under a pixel at any scale used here. */
const around = Array.from({ length: 48 }, (_, i) => (2 * Math.PI * i) / 48);
/** Rings on a hemisphere, from its rim to just short of its pole. */
const rings = Array.from({ length: 8 }, (_, i) => (Math.PI / 2) * (i / 8));

/** Outline of a solid on paper; `move` takes its boat-frame points elsewhere first, e.g. into the water frame. */
export function solidOutline(solid: Solid, view: View, move: (pointM: Vec3) => Vec3 = (pointM) => pointM): Point2[] {
  return convexOutline(surfacePointsM(solid).map((pointM) => project(view, move(pointM))));
}

/** Enough points of a solid's surface, boat frame, that their convex outline is the solid's; none for the open hull, which is drawn as a section. */
export function surfacePointsM({ shape, pose }: Pick<Solid, 'shape' | 'pose'>): Vec3[] {
  return ownPointsM(shape).map((pointM) => toBoat(pose, pointM));
}

function ownPointsM(shape: Shape): Vec3[] {
  switch (shape.kind) {
    case 'box':
      return signs.map(([x, y, z]) => [x * shape.halfLengthM, y * shape.halfWidthM, z * shape.halfHeightM]);
    case 'capsule':
      return [-1, 1].flatMap((end) => capPointsM(end, shape.halfAxisM, shape.radiusM));
    case 'elliptic-strut':
      return [-1, 1].flatMap((end) =>
        around.map((turn): Vec3 => [shape.halfChordM * Math.cos(turn), shape.halfThicknessM * Math.sin(turn), end * shape.halfHeightM]),
      );
    case 'prop-disc':
      return [-1, 1].flatMap((end) =>
        around.map((turn): Vec3 => [end * shape.halfDepthM, shape.radiusM * Math.cos(turn), shape.radiusM * Math.sin(turn)]),
      );
    case 'prism':
      return [];
    default:
      return shape satisfies never;
  }
}

function capPointsM(end: number, halfAxisM: number, radiusM: number): Vec3[] {
  const pole: Vec3 = [end * (halfAxisM + radiusM), 0, 0];
  const shell = rings.flatMap((rise) =>
    around.map((turn): Vec3 => {
      const ringM = radiusM * Math.cos(rise);
      return [end * (halfAxisM + radiusM * Math.sin(rise)), ringM * Math.cos(turn), ringM * Math.sin(turn)];
    }),
  );
  return [pole, ...shell];
}

const signs: Vec3[] = [-1, 1].flatMap((x) => [-1, 1].flatMap((y) => [-1, 1].map((z): Vec3 => [x, y, z])));
