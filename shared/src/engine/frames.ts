// Boat frame: origin where the keel line meets the transom on the centreline; +x forward along the keel line, +y to starboard, +z down.
// Water frame: the boat frame pitched by the running trim, bow up positive.
// Sensor frame: origin at the centre of the active face; +x to the nose, +y to starboard, +z down.

import { type Rotation3, rotate } from './rotation.ts';
import { add, type Vec3 } from './vec3.ts';

/** A body's own frame in the boat frame: where its origin is and how its axes are turned. */
export interface Pose {
  originM: Vec3;
  /** From the body's own axes to the boat's. */
  rotation: Rotation3;
}

/** A point given in the body's own axes, in boat axes. Metres. */
export function toBoat(pose: Pose, ownM: Vec3): Vec3 {
  return add(pose.originM, rotate(pose.rotation, ownM));
}

/** A direction or point of the boat frame in the water frame; trim in radians, bow up positive. */
export function boatToWater([x, y, z]: Vec3, trimRad: number): Vec3 {
  const c = Math.cos(trimRad);
  const s = Math.sin(trimRad);
  return [c * x + s * z, y, c * z - s * x];
}

/** The way back from the water frame to the boat frame. */
export function waterToBoat([x, y, z]: Vec3, trimRad: number): Vec3 {
  return boatToWater([x, y, z], -trimRad);
}

/** Unit vector up the transom; the angle is how far its top leans aft of square to the keel line, radians. */
export function upTheTransom(transomAngleRad: number): Vec3 {
  return [-Math.sin(transomAngleRad), 0, -Math.cos(transomAngleRad)];
}

/** How far aft a plumb line that starts on the transom stands off its face after a drop, m (305 mm at 14° is 76 mm). */
export function plumbOffsetM(dropM: number, transomAngleRad: number): number {
  return dropM * Math.tan(transomAngleRad);
}
