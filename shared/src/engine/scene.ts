// Everything a beam can meet around one sensor: the hull, the engines, and boxes the owner named.

import type { HullShape } from './hull.ts';
import { type EngineSetting, type LowerUnitShape, legPose, lowerUnitSolids } from './lower-unit.ts';
import { noRotation } from './rotation.ts';
import type { Solid } from './solids/solid.ts';
import type { Vec3 } from './vec3.ts';

export interface Engine {
  unit: LowerUnitShape;
  setting: EngineSetting;
}

/** A box in the boat frame by its middle; metres. */
export interface ObstacleBox {
  label: string;
  middleM: Vec3;
  sizeM: Vec3;
}

/** All forward of the transom plane (less the notch), above the bottom, between the chines. */
export function hullSolid(hull: HullShape): Solid {
  const halfBeamM = hull.chineBeamM / 2;
  const ca = Math.cos(hull.transomAngleRad);
  const sa = Math.sin(hull.transomAngleRad);
  const planes = [-ca, 0, sa, -hull.notchM * ca, 0, 1, 0, halfBeamM, 0, -1, 0, halfBeamM];
  if (hull.localBottomM !== null) planes.push(0, 0, 1, hull.localBottomM);
  else {
    const cb = Math.cos(hull.deadriseRad);
    const sb = Math.sin(hull.deadriseRad);
    planes.push(0, 0, 1, 0, 0, sb, cb, hull.keelPadHalfM * sb, 0, -sb, cb, hull.keelPadHalfM * sb);
  }
  return {
    shape: { kind: 'prism', planes: Float64Array.from(planes) },
    pose: { originM: [0, 0, 0], rotation: noRotation },
    opacity: 1,
    owner: { unit: null, part: 'hull' },
  };
}

export function obstacleSolid({ label, middleM, sizeM }: ObstacleBox): Solid {
  return {
    shape: { kind: 'box', halfLengthM: sizeM[0] / 2, halfWidthM: sizeM[1] / 2, halfHeightM: sizeM[2] / 2 },
    pose: { originM: middleM, rotation: noRotation },
    opacity: 1,
    owner: { unit: null, part: 'obstacle', label },
  };
}

/** Solids of a boat in the boat frame. A sensor inside the hull looks through its bottom, so `hullHides` is false for it. */
export function sceneSolids(hull: HullShape, engines: readonly Engine[], obstacles: readonly ObstacleBox[], hullHides: boolean): Solid[] {
  const solids = engines.flatMap(({ unit, setting }, index) => lowerUnitSolids(unit, legPose(hull, unit, setting), index));
  for (const obstacle of obstacles) solids.push(obstacleSolid(obstacle));
  if (hullHides) solids.push(hullSolid(hull));
  return solids;
}
