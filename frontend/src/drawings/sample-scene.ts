// A short aluminium boat with one 30 hp motor, for tests: sizes inside the ranges of that class.

import type { HullShape } from '@tiltwright/shared/engine/hull.ts';
import { type LowerUnitShape, legPose, lowerUnitSolids } from '@tiltwright/shared/engine/lower-unit.ts';
import { sensorPose } from '@tiltwright/shared/engine/sensor.ts';
import { degToRad } from '@tiltwright/shared/engine/units.ts';
import type { BoatScene } from './boat-scene.ts';

const hull: HullShape = {
  deadriseRad: degToRad(8),
  transomAngleRad: degToRad(14),
  transomHeightM: 0.381,
  chineBeamM: 1.38,
  keelPadHalfM: 0,
  notchM: 0,
  localBottomM: null,
};

const unit: LowerUnitShape = {
  drive: 'outboard',
  shaftLengthM: 0.381,
  plateBelowKeelM: 0,
  propDiameterM: 0.26,
  propAxialM: 0.062,
  propAftM: 0.187,
  bladeAreaRatio: 0.55,
  torpedoDiameterM: 0.082,
  torpedoLengthM: 0.39,
  torpedoNoseForwardM: 0.164,
  plateAboveShaftM: 0.155,
  plateLengthM: 0.35,
  plateWidthM: 0.19,
  plateThicknessM: 0.008,
  plateForwardM: 0.1225,
  strutChordM: 0.13,
  strutThicknessM: 0.044,
  legChordM: 0.15,
  legThicknessM: 0.07,
  skegDepthM: 0.182,
  skegChordM: 0.14,
  skegThicknessM: 0.012,
  skegAftM: 0.014,
  swivelAftM: 0.1,
  driveshaftAftM: 0.15,
  tiltAxisAftM: 0.04,
  tiltAxisAboveM: 0.015,
  trimRefTransomRad: degToRad(12),
  trimMinRad: degToRad(-4),
  trimMaxRad: degToRad(16),
  tiltMaxRad: degToRad(70),
  steerMaxRad: degToRad(30),
};

/** The boat with its sensor 380 mm to starboard, 5 mm below the bottom, tilt as given, the motor trimmed as given. */
export function sampleScene({ motorTrimDeg = 0, tiltDeg = 0, offsetM = 0.38 } = {}): BoatScene {
  const setting = { offsetM: 0, setbackM: 0, raiseM: 0, motorTrimRad: degToRad(motorTrimDeg), steerRad: 0 };
  const standoffM = 0.03;
  const pose = sensorPose(hull, {
    fixing: { kind: 'transom', standoffM, housingLengthM: 0.22 },
    offsetM,
    dropM: 0.005,
    tiltRad: degToRad(tiltDeg),
    rollRad: 0,
    yawRad: 0,
  });
  return {
    hull,
    beamM: 1.68,
    solids: lowerUnitSolids(unit, legPose(hull, unit, setting), 0),
    sensor: {
      pose,
      housingM: { length: 0.22, width: 0.05, height: 0.035 },
      element: {
        apertureM: 0.165,
        depressionRad: degToRad(22),
        verticalWidthRad: degToRad(52),
        alongTrackWidthRad: degToRad(1.2),
        levelDb: -3,
        levelWay: 'one',
      },
      offsetM,
      dropM: 0.005,
      standoffM,
      tiltRad: degToRad(tiltDeg),
    },
    sectors: { port: [], starboard: [] },
  };
}
