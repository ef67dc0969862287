// One set of numbers put to the engine: running trim and clearance.

import { fanOf, type Side } from '../engine/beams/fan.ts';
import { type SideClearance, sideClearance, type TiltWindow, tiltWindow } from '../engine/beams/occlusion.ts';
import { addInQuadrature, type Estimate } from '../engine/estimate.ts';
import type { Pose } from '../engine/frames.ts';
import { legPose, propCentreM } from '../engine/lower-unit.ts';
import { type Engine, sceneSolids } from '../engine/scene.ts';
import { sensorPose } from '../engine/sensor.ts';
import type { Solid } from '../engine/solids/solid.ts';
import type { ThrustLine, TrimFlag } from '../engine/trim/estimated-trim.ts';
import { runningTrim, type TrimBasis, type TrimPoint } from '../engine/trim/running-trim.ts';
import { degToRad, knToMps, waters } from '../engine/units.ts';
import * as input from '../engine-input.ts';
import type { FitNumbers, Prepared } from './prepare.ts';

/** How the boat is run in one state of the question. */
export interface Running {
  speedKn: number;
  water: 'fresh' | 'sea';
  /** The owner's own measurement at this speed. */
  own: { trimDeg: number; sigmaDeg: number } | null;
}

/** A motor tilted farther than this does not drive the boat. */
const drivesBelowDeg = 30;
/** Where thrust acts when no motor is known: about a propeller's depth below the keel, m (common practice, no source). */
const usualThrust: ThrustLine = { forwardM: -0.3, upM: -0.17, motorTrimRad: null };

/** Engines as the running trim sees them: the mean of those that drive, main motors before kickers and electric ones. */
export function thrustLine(p: Prepared, n: FitNumbers): ThrustLine {
  const hull = input.hullShape(n.hull);
  const running = enginesOf(p, n).filter(({ setting }) => setting.motorTrimRad <= degToRad(drivesBelowDeg));
  const main = running.filter(({ unit }) => unit.drive === 'outboard' || unit.drive === 'sterndrive');
  const driving = main.length > 0 ? main : running;
  if (driving.length === 0) return usualThrust;
  const mean = (of: (engine: Engine) => number) => driving.reduce((sum, engine) => sum + of(engine), 0) / driving.length;
  const propOf = ({ unit, setting }: Engine) => propCentreM(unit, legPose(hull, unit, setting));
  return {
    forwardM: mean((engine) => propOf(engine)[0]),
    upM: mean((engine) => -propOf(engine)[2]),
    motorTrimRad: mean(({ setting }) => setting.motorTrimRad),
  };
}

export function enginesOf(p: Prepared, n: FitNumbers): Engine[] {
  return p.parts.lowerUnits.map((unit, i) =>
    input.engineOf(unit, n.lowerUnits[i] as FitNumbers['lowerUnits'][number], n.engines[i] as input.EngineNumbers),
  );
}

/** Measured points of the hull, and the owner's own at another speed, as the trim curve reads them. */
export function trimPointsOf(p: Prepared, ownElsewhere: TrimPoint | null): TrimPoint[] {
  const points = (p.parts.hull.trimPoints ?? []).map(input.trimPoint);
  return ownElsewhere ? [...points, ownElsewhere] : points;
}

export function trimFor(p: Prepared, n: FitNumbers, running: Running, points: readonly TrimPoint[]): Estimate<TrimBasis, TrimFlag> {
  const own = running.own && { trimRad: degToRad(running.own.trimDeg), sigmaRad: degToRad(running.own.sigmaDeg) };
  return runningTrim({
    hull: input.trimHull(p.parts.hull, n.hull),
    line: thrustLine(p, n),
    speedMps: knToMps(running.speedKn),
    water: waters[running.water],
    own,
    points,
  });
}

/** Inputs of a hull whose spread widens the trim. */
const wideningFields = ['loadedMassKg', 'lcgM', 'vcgM', 'chineBeamM', 'deadriseDeg', 'staticTrimDeg'] as const;

/** The same with the spread of the hull's own figures added, each moved by one standard deviation (first order). */
export function widenedTrim(p: Prepared, n: FitNumbers, running: Running, points: readonly TrimPoint[]): Estimate<TrimBasis, TrimFlag> {
  const middle = trimFor(p, n, running, points);
  if (running.own || middle.basis === 'class') return middle;
  const moves = wideningFields.map((field) => {
    const { value, sigma } = p.hull[field];
    if (!(sigma > 0)) return 0;
    const moved = trimFor(p, { ...n, hull: { ...n.hull, [field]: value + sigma } }, running, points);
    return moved.basis === 'class' ? 0 : moved.value - middle.value;
  });
  return { ...middle, sigma: addInQuadrature(middle.sigma, ...moves) };
}

/** Everything a beam can meet, and the sensor's pose at any tilt. */
export interface Scene {
  solids: Solid[];
  poseAt: (tiltRad: number) => Pose;
}

export function sceneOf(p: Prepared, n: FitNumbers): Scene {
  const hull = input.hullShape(n.hull, p.placing.localBottomMm);
  const solids = sceneSolids(hull, enginesOf(p, n), p.obstacles.map(input.obstacleBox), p.hullHides);
  const setting = input.sensorSetting({
    offsetMm: n.offsetMm,
    dropMm: n.dropMm,
    standoffMm: n.standoffMm + p.placing.boardMm,
    forwardMm: n.forwardMm,
    housingLengthMm: n.transducer.housingLengthMm,
    tiltDeg: 0,
    rollDeg: n.rollDeg,
    yawDeg: n.yawDeg,
  });
  return { solids, poseAt: (tiltRad) => sensorPose(hull, { ...setting, tiltRad }) };
}

/** Speed of sound at which wavelengths are reckoned, m/s: about that of lake water at 15 °C. Only margins depend on it. */
const soundSpeedMps = 1466;

export function wavelengthM(n: FitNumbers): number {
  return soundSpeedMps / (n.transducer.sideFrequencyKhz * 1000);
}

export interface BothSides {
  port: SideClearance;
  starboard: SideClearance;
}

/** Both sides at a tilt; null where the transducer has no side element. */
export function clearanceFor(p: Prepared, n: FitNumbers, scene: Scene, tiltDeg: number): BothSides | null {
  if (!p.parts.transducer.kinds.includes('side')) return null;
  const element = input.sideElement(p.parts.transducer, n.transducer);
  const sensor = scene.poseAt(degToRad(tiltDeg));
  const fan = fanOf(element);
  const of = (side: Side) => sideClearance(scene.solids, sensor, element, side, wavelengthM(n), fan);
  return { port: of('port'), starboard: of('starboard') };
}

export function windowFor(
  p: Prepared,
  n: FitNumbers,
  scene: Scene,
  tiltDeg: number,
  wanted: readonly Side[],
  isClear: boolean,
): TiltWindow {
  const element = input.sideElement(p.parts.transducer, n.transducer);
  return tiltWindow(scene.solids, scene.poseAt, element, wanted, degToRad(tiltDeg), isClear);
}
