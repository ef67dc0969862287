// What the drawings show: the engine's hull, solids and sensor, and what the answer says each side can see.
import type { Side } from '@tiltwright/shared/engine/beams/fan.ts';
import { fanOf } from '@tiltwright/shared/engine/beams/fan.ts';
import { type Pose, toBoat } from '@tiltwright/shared/engine/frames.ts';
import type { HullShape } from '@tiltwright/shared/engine/hull.ts';
import { bottomZM } from '@tiltwright/shared/engine/hull.ts';
import { rotate } from '@tiltwright/shared/engine/rotation.ts';
import type { SideElement } from '@tiltwright/shared/engine/sensor.ts';
import type { Solid } from '@tiltwright/shared/engine/solids/solid.ts';
import { radToDeg } from '@tiltwright/shared/engine/units.ts';
import type { Vec3 } from '@tiltwright/shared/engine/vec3.ts';
import { arcDepressions, type FanSector, fanDirection } from './fan-wedges.ts';
import { type Point2, project } from './views.ts';

export interface SceneSensor {
  /** Sensor frame in the boat frame; its origin is the middle of the active face. */
  pose: Pose;
  housingM: { length: number; width: number; height: number };
  element: SideElement;
  offsetM: number;
  dropM: number;
  /** Transom face to leading edge, board included; null where the sensor is not on the transom. */
  standoffM: number | null;
  tiltRad: number;
}

export interface BoatScene {
  hull: HullShape;
  /** Greatest width over all; only the topsides are drawn from it. */
  beamM: number;
  /** Engines and obstacles in the boat frame, without the hull. */
  solids: readonly Solid[];
  sensor: SceneSensor;
  /** Sectors by side; null for a side that is not wanted, and for both until an answer is there. */
  sectors: Readonly<Record<Side, readonly FanSector[] | null>>;
}

/** Both edges of a side's fan in the sensor frame, degrees below its level. */
export function fanEdgesDeg(element: SideElement): [number, number] {
  const { depressionsRad } = fanOf(element);
  return [radToDeg(depressionsRad[0] ?? 0), radToDeg(depressionsRad[depressionsRad.length - 1] ?? 0)];
}

/** A wedge of the fan from astern: the face centre, then its arc at `radiusM`, on paper. */
export function wedgeOutline(sensor: SceneSensor, side: Side, fromDeg: number, toDeg: number, radiusM: number): Point2[] {
  const arc = arcDepressions(fromDeg, toDeg).map((deg) => project('astern', fanPointM(sensor, side, deg, radiusM)));
  return [project('astern', sensor.pose.originM), ...arc];
}

/** Where a direction of the fan is after `distanceM`, boat frame. */
function fanPointM(sensor: SceneSensor, side: Side, depressionDeg: number, distanceM: number): Vec3 {
  const [x, y, z] = rotate(sensor.pose.rotation, fanDirection(side, depressionDeg));
  const [ox, oy, oz] = sensor.pose.originM;
  return [ox + x * distanceM, oy + y * distanceM, oz + z * distanceM];
}

/** The housing's eight corners: the active face is its underside. */
export function housingCornersM({ pose, housingM }: Pick<SceneSensor, 'pose' | 'housingM'>): Vec3[] {
  const corners: Vec3[] = [];
  for (const x of [-0.5, 0.5]) {
    for (const y of [-0.5, 0.5]) {
      for (const z of [-1, 0]) corners.push(toBoat(pose, [x * housingM.length, y * housingM.width, z * housingM.height]));
    }
  }
  return corners;
}

/** The bottom from chine to chine at the transom, on paper from astern. */
export function bottomLine(hull: HullShape): Point2[] {
  const half = hull.chineBeamM / 2;
  const pad = Math.min(hull.keelPadHalfM, half);
  const offsets = pad > 0 ? [-half, -pad, pad, half] : [-half, 0, half];
  return offsets.map((y) => [y, bottomZM(hull, y)]);
}
