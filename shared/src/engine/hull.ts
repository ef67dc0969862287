// The hull near the transom: a vee with an optional flat at the keel, ending in a leaning plane.

import { upTheTransom } from './frames.ts';
import { degToRad } from './units.ts';
import type { Vec3 } from './vec3.ts';

/** Boat frame, SI. */
export interface HullShape {
  deadriseRad: number;
  transomAngleRad: number;
  /** Keel to the clamp, square to the keel line. */
  transomHeightM: number;
  chineBeamM: number;
  /** Half the width of the flat at the keel; 0 for a plain vee. */
  keelPadHalfM: number;
  /** How far the bottom ends ahead of the transom; 0 for none. */
  notchM: number;
  /** Height of the bottom below the keel line where it is no vee (pontoon, catamaran, steps); null where nobody stated one. */
  localBottomM: number | null;
}

/** The bottom at an offset from the centreline, +z down, so 0 at the keel and negative outboard. Metres. */
export function bottomZM(hull: HullShape, offsetM: number): number {
  if (hull.localBottomM !== null) return hull.localBottomM;
  return -Math.max(0, Math.abs(offsetM) - hull.keelPadHalfM) * Math.tan(hull.deadriseRad);
}

/** Where the transom plane stands at a height, x = z tan α. Metres. */
export function transomXM(hull: HullShape, zM: number): number {
  return zM * Math.tan(hull.transomAngleRad);
}

/** Top of the transom at an offset: the height is measured square to the keel line, so the top stands aft of the origin. */
export function transomTopM(hull: HullShape, offsetM: number): Vec3 {
  return [transomXM(hull, -hull.transomHeightM), offsetM, -hull.transomHeightM];
}

/** The clamp point of an engine: raised along the transom, then set straight aft. Metres. */
export function clampPointM(hull: HullShape, offsetM: number, raiseM: number, setbackM: number): Vec3 {
  const top = transomTopM(hull, offsetM);
  const up = upTheTransom(hull.transomAngleRad);
  return [top[0] + raiseM * up[0] - setbackM, offsetM, top[2] + raiseM * up[2]];
}

/** A height measured along the leaning face, as height square to the keel line: H = face · cos α. Metres and degrees in, metres out. */
export function heightFromFaceM(alongFaceM: number, transomAngleDeg: number): number {
  return alongFaceM * Math.cos(degToRad(transomAngleDeg));
}
