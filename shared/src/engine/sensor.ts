// The transducer: where the middle of its active face stands and how it is turned.
import type { Pose } from './frames.ts';
import { bottomZM, type HullShape, transomXM } from './hull.ts';
import { attitudeRotation, rotate } from './rotation.ts';
import { add, type Vec3 } from './vec3.ts';

/** A side element: one fan to port, one to starboard. Metres and radians. */
export interface SideElement {
  /** Length of the radiating face along the sensor's x axis. */
  apertureM: number;
  /** How far the middle of the fan points below the sensor's own level. */
  depressionRad: number;
  verticalWidthRad: number;
  alongTrackWidthRad: number;
  /** Level at which the vertical width is stated, dB below the axis (negative), and whether that counts one way or two. */
  levelDb: number;
  levelWay: 'one' | 'two';
}

/** Where the housing is fixed. On a transom the leading edge stands off its face; elsewhere the face centre is given. */
export type Fixing = { kind: 'transom'; standoffM: number; housingLengthM: number } | { kind: 'forward'; forwardM: number };

/** Offset positive to starboard; drop of the lower leading edge below the local bottom; angles against the boat frame. */
export interface SensorSetting {
  fixing: Fixing;
  offsetM: number;
  dropM: number;
  tiltRad: number;
  rollRad: number;
  yawRad: number;
}

/** Lower leading edge of a transom unit, boat frame, m: it is held when the tilt changes. */
export function leadingEdgeM(hull: HullShape, standoffM: number, offsetM: number, dropM: number): Vec3 {
  const bottom = bottomZM(hull, offsetM);
  return [transomXM(hull, bottom) - standoffM, offsetM, bottom + dropM];
}

/** Sensor frame in the boat frame: origin at the centre of the active face. */
export function sensorPose(hull: HullShape, setting: SensorSetting): Pose {
  const rotation = attitudeRotation(setting.yawRad, setting.tiltRad, setting.rollRad);
  const { fixing, offsetM, dropM } = setting;
  if (fixing.kind === 'forward') return { originM: [fixing.forwardM, offsetM, bottomZM(hull, offsetM) + dropM], rotation };
  const edge = leadingEdgeM(hull, fixing.standoffM, offsetM, dropM);
  return { originM: add(edge, rotate(rotation, [-fixing.housingLengthM / 2, 0, 0])), rotation };
}
