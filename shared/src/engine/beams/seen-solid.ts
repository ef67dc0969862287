// A solid as one sensor sees it.
import type { Pose } from '../frames.ts';
import { compose, inverse, type Rotation3, rotate } from '../rotation.ts';
import type { Solid } from '../solids/solid.ts';
import { subtract, type Vec3 } from '../vec3.ts';

export interface SeenSolid {
  solid: Solid;
  /** From sensor axes to the solid's own. */
  turn: Rotation3;
  /** The face centre in the solid's own axes, m. */
  face: Vec3;
}

export function seenBy(sensor: Pose, solid: Solid): SeenSolid {
  const back = inverse(solid.pose.rotation);
  return { solid, turn: compose(back, sensor.rotation), face: rotate(back, subtract(sensor.originM, solid.pose.originM)) };
}
