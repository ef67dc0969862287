// An engine's lower unit: where it stands on the transom and the solids it is made of.
// Leg frame: origin where the driveshaft axis meets the prop-shaft line, +x forward along the shaft, +y to starboard, +z down.
import { type Pose, toBoat } from './frames.ts';
import { clampPointM, type HullShape, transomXM } from './hull.ts';
import { compose, pitchRotation, rotate, yawRotation } from './rotation.ts';
import type { Shape, Solid, SolidPart } from './solids/solid.ts';
import { add, subtract, type Vec3 } from './vec3.ts';

/** Sizes of an engine below the clamp; metres and radians. */
export interface LowerUnitShape {
  drive: 'outboard' | 'sterndrive' | 'kicker' | 'electric';
  shaftLengthM: number;
  /** Sterndrive: how far the plate stands below the keel line, in place of the shaft length. */
  plateBelowKeelM: number;
  propDiameterM: number;
  propAxialM: number;
  propAftM: number;
  bladeAreaRatio: number;
  torpedoDiameterM: number;
  torpedoLengthM: number;
  torpedoNoseForwardM: number;
  plateAboveShaftM: number;
  plateLengthM: number;
  plateWidthM: number;
  plateThicknessM: number;
  plateForwardM: number;
  strutChordM: number;
  strutThicknessM: number;
  legChordM: number;
  legThicknessM: number;
  skegDepthM: number;
  skegChordM: number;
  skegThicknessM: number;
  skegAftM: number;
  swivelAftM: number;
  driveshaftAftM: number;
  tiltAxisAftM: number;
  tiltAxisAboveM: number;
  trimRefTransomRad: number;
  trimMinRad: number;
  trimMaxRad: number;
  tiltMaxRad: number;
  steerMaxRad: number;
}

/** How an engine is set: offset positive to starboard; trim 0 with the prop shaft parallel to the keel line, up and aft positive. */
export interface EngineSetting {
  offsetM: number;
  setbackM: number;
  raiseM: number;
  motorTrimRad: number;
  /** Above 0 moves the nose of the lower unit to starboard. */
  steerRad: number;
}

/** Length of a sterndrive's leg above its plate, m (common practice, no source). */
const sterndriveLegM = 0.3;

/** Pose of the leg frame in the boat frame: steered about the swivel axis, then swung about the tilt axis. */
export function legPose(hull: HullShape, unit: LowerUnitShape, setting: EngineSetting): Pose {
  const clamp = clampPointM(hull, setting.offsetM, setting.raiseM, setting.setbackM);
  const sterndrive = unit.drive === 'sterndrive';
  const plateZ = sterndrive ? unit.plateBelowKeelM : clamp[2] + unit.shaftLengthM;
  const swivel: Vec3 = [clamp[0] - unit.swivelAftM, setting.offsetM, 0];
  const untilted: Vec3 = [clamp[0] - unit.driveshaftAftM, setting.offsetM, plateZ + unit.plateAboveShaftM];
  const axis = tiltAxisM(hull, unit, setting, clamp, plateZ);
  const steer = yawRotation(setting.steerRad);
  const swing = pitchRotation(-setting.motorTrimRad);
  const steered = add(swivel, rotate(steer, subtract(untilted, swivel)));
  return { originM: add(axis, rotate(swing, subtract(steered, axis))), rotation: compose(swing, steer) };
}

/** A sterndrive hangs on an axis at the transom, measured from the transom face and up from its plate. */
function tiltAxisM(hull: HullShape, unit: LowerUnitShape, setting: EngineSetting, clamp: Vec3, plateZ: number): Vec3 {
  if (unit.drive !== 'sterndrive') return [clamp[0] - unit.tiltAxisAftM, setting.offsetM, clamp[2] - unit.tiltAxisAboveM];
  const z = plateZ - unit.tiltAxisAboveM;
  return [transomXM(hull, z) - unit.tiltAxisAftM, setting.offsetM, z];
}

/** Centre of the propeller in the boat frame, m; thrust acts here along the prop shaft. */
export function propCentreM(unit: LowerUnitShape, pose: Pose): Vec3 {
  return toBoat(pose, [-unit.propAftM, 0, 0]);
}

/** Motor trims this engine can reach on this transom, radians: trim limits are stated for a reference transom angle. */
export function motorTrimReach(hull: HullShape, unit: LowerUnitShape): { min: number; maxUnderPower: number; maxTilted: number } {
  const shift = unit.trimRefTransomRad - hull.transomAngleRad;
  return { min: unit.trimMinRad + shift, maxUnderPower: unit.trimMaxRad + shift, maxTilted: unit.tiltMaxRad + shift };
}

/** The solids of one engine in the boat frame; parts without a size (no skeg, say) are left out. */
export function lowerUnitSolids(unit: LowerUnitShape, pose: Pose, unitIndex: number): Solid[] {
  const solids: Solid[] = [];
  const place = (part: SolidPart, shape: Shape, middle: Vec3, opacity = 1) => {
    solids.push({ shape, pose: { originM: toBoat(pose, middle), rotation: pose.rotation }, opacity, owner: { unit: unitIndex, part } });
  };
  const legM = unit.drive === 'sterndrive' ? sterndriveLegM : unit.shaftLengthM;
  const plateZ = -unit.plateAboveShaftM;
  const radiusM = unit.torpedoDiameterM / 2;
  const halfAxisM = Math.max(0, unit.torpedoLengthM / 2 - radiusM);
  place('torpedo', { kind: 'capsule', halfAxisM, radiusM }, [unit.torpedoNoseForwardM - unit.torpedoLengthM / 2, 0, 0]);
  place('strut', ellipticStrut(unit.strutChordM, unit.strutThicknessM, unit.plateAboveShaftM), [0, 0, plateZ / 2]);
  place('leg', ellipticStrut(unit.legChordM, unit.legThicknessM, legM), [0, 0, plateZ - legM / 2]);
  place('plate', box(unit.plateLengthM, unit.plateWidthM, unit.plateThicknessM), [unit.plateForwardM - unit.plateLengthM / 2, 0, plateZ]);
  if (unit.skegDepthM > 0) {
    place('skeg', box(unit.skegChordM, unit.skegThicknessM, unit.skegDepthM), [-unit.skegAftM, 0, unit.skegDepthM / 2]);
  }
  const disc: Shape = { kind: 'prop-disc', radiusM: unit.propDiameterM / 2, halfDepthM: unit.propAxialM / 2 };
  place('propeller', disc, [-unit.propAftM, 0, 0], unit.bladeAreaRatio);
  return solids;
}

function box(lengthM: number, widthM: number, heightM: number): Shape {
  return { kind: 'box', halfLengthM: lengthM / 2, halfWidthM: widthM / 2, halfHeightM: heightM / 2 };
}

function ellipticStrut(chordM: number, thicknessM: number, heightM: number): Shape {
  return { kind: 'elliptic-strut', halfChordM: chordM / 2, halfThicknessM: thicknessM / 2, halfHeightM: heightM / 2 };
}
