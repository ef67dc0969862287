// Random boats, engines and sensors for checks of the engine, the same for the same seed.

import type { HullShape } from '@tiltwright/shared/engine/hull.ts';
import type { EngineSetting, LowerUnitShape } from '@tiltwright/shared/engine/lower-unit.ts';
import { sceneSolids } from '@tiltwright/shared/engine/scene.ts';
import { type SideElement, sensorPose } from '@tiltwright/shared/engine/sensor.ts';
import { degToRad } from '@tiltwright/shared/engine/units.ts';

/** Uniform numbers from 0 to 1 from a whole-number seed (mulberry32). */
export function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

export type Between = (low: number, high: number) => number;
export const betweenOf =
  (random: () => number): Between =>
  (low, high) =>
    low + (high - low) * random();

export function randomHull(between: Between): HullShape {
  return {
    deadriseRad: degToRad(between(0, 24)),
    transomAngleRad: degToRad(between(9, 17)),
    transomHeightM: between(0.37, 0.66),
    chineBeamM: between(1.1, 2.3),
    keelPadHalfM: between(0, 1) < 0.5 ? 0 : between(0.02, 0.12),
    notchM: between(0, 1) < 0.7 ? 0 : between(0.05, 0.3),
    localBottomM: null,
  };
}

export function randomLowerUnit(between: Between): LowerUnitShape {
  const size = between(0.8, 2);
  return {
    drive: 'outboard',
    shaftLengthM: between(0.37, 0.77),
    plateBelowKeelM: 0,
    propDiameterM: size * between(0.17, 0.21),
    propAxialM: size * between(0.04, 0.06),
    propAftM: size * between(0.12, 0.18),
    bladeAreaRatio: between(0.3, 0.8),
    torpedoDiameterM: size * between(0.055, 0.065),
    torpedoLengthM: size * between(0.25, 0.33),
    torpedoNoseForwardM: size * between(0.1, 0.14),
    plateAboveShaftM: size * between(0.1, 0.13),
    plateLengthM: size * between(0.2, 0.28),
    plateWidthM: size * between(0.11, 0.15),
    plateThicknessM: 0.008,
    plateForwardM: size * between(0.05, 0.1),
    strutChordM: size * between(0.07, 0.11),
    strutThicknessM: size * between(0.028, 0.035),
    legChordM: size * between(0.08, 0.12),
    legThicknessM: size * between(0.04, 0.055),
    skegDepthM: size * between(0.11, 0.14),
    skegChordM: size * between(0.07, 0.12),
    skegThicknessM: 0.012,
    skegAftM: size * between(-0.02, 0.02),
    swivelAftM: between(0.06, 0.15),
    driveshaftAftM: between(0.1, 0.2),
    tiltAxisAftM: between(0.02, 0.06),
    tiltAxisAboveM: between(-0.03, 0.06),
    trimRefTransomRad: degToRad(12),
    trimMinRad: degToRad(-5),
    trimMaxRad: degToRad(16),
    tiltMaxRad: degToRad(70),
    steerMaxRad: degToRad(30),
  };
}

export function randomSetting(between: Between, offsetM: number): EngineSetting {
  return {
    offsetM,
    setbackM: between(0, 1) < 0.5 ? 0 : between(0.05, 0.3),
    raiseM: between(0, 0.12),
    motorTrimRad: degToRad(between(-6, 25)),
    steerRad: between(0, 1) < 0.5 ? 0 : degToRad(between(-30, 30)),
  };
}

export function randomElement(between: Between): SideElement {
  return {
    apertureM: between(0.09, 0.24),
    depressionRad: degToRad(between(10, 40)),
    verticalWidthRad: degToRad(between(30, 86)),
    alongTrackWidthRad: degToRad(between(0.4, 6)),
    levelDb: -3,
    levelWay: 'one',
  };
}

/** A boat with one to three engines, a sensor on its transom, and every solid in the boat frame. */
export function randomScene(between: Between) {
  const hull = randomHull(between);
  const count = Math.floor(between(1, 4));
  const engines = Array.from({ length: count }, (_, i) => ({
    unit: randomLowerUnit(between),
    setting: randomSetting(between, count === 1 ? 0 : (i - (count - 1) / 2) * between(0.5, 0.8)),
  }));
  const solids = sceneSolids(hull, engines, [], true);
  const fixing = { kind: 'transom', standoffM: between(0, 0.1), housingLengthM: between(0.16, 0.3) } as const;
  const setting = {
    fixing,
    offsetM: between(-0.7, 0.7),
    dropM: between(-0.02, 0.06),
    tiltRad: degToRad(between(-20, 20)),
    rollRad: degToRad(between(-4, 4)),
    yawRad: degToRad(between(-4, 4)),
  };
  return { hull, engines, solids, sensor: sensorPose(hull, setting), element: randomElement(between) };
}
