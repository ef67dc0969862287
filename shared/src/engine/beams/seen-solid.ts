// A solid as one sensor sees it.
import type { Pose } from '../frames.ts';
import { compose, inverse, type Rotation3, rotate } from '../rotation.ts';
import type { Solid } from '../solids/solid.ts';
import { subtract, type Vec3 } from '../vec3.ts';

export interface SeenSolid {
  solid: Solid;
  /** From sensor axes to the solid's own, and back. */
  turn: Rotation3;
  back: Rotation3;
  /** The face centre in the solid's own axes, m. */
  face: Vec3;
  /** The solid's own origin in the sensor's axes, m. */
  middle: Vec3;
}

/** All solids of a scene as one sensor sees them; the same for both sides. */
export function seenAll(sensor: Pose, solids: readonly Solid[]): SeenSolid[] {
  return solids.map((solid) => seenBy(sensor, solid));
}

export function seenBy(sensor: Pose, solid: Solid): SeenSolid {
  const own = inverse(solid.pose.rotation);
  const turn = compose(own, sensor.rotation);
  const back = inverse(turn);
  const face = rotate(own, subtract(sensor.originM, solid.pose.originM));
  return { solid, turn, back, face, middle: rotate(back, [-face[0], -face[1], -face[2]]) };
}
