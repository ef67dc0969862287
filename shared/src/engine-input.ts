// The only place where trade units become SI: filled parts and a question's numbers in, engine shapes out.
import type { HullShape } from './engine/hull.ts';
import type { EngineSetting, LowerUnitShape } from './engine/lower-unit.ts';
import type { Engine, ObstacleBox } from './engine/scene.ts';
import type { SensorSetting, SideElement } from './engine/sensor.ts';
import type { TrimHull } from './engine/trim/estimated-trim.ts';
import type { TrimPoint } from './engine/trim/running-trim.ts';
import { degToRad, knToMps, mmToM } from './engine/units.ts';
import type { FilledHull } from './questions/fill-hull.ts';
import type { FilledLowerUnit } from './questions/fill-lower-unit.ts';
import type { FilledTransducer } from './questions/fill-sensor.ts';
import type { HullPart, LowerUnitPart, TransducerPart } from './questions/parts.ts';
import type { InlineTrimPoint } from './schemas/trim-point.ts';

/** Bare numbers by field name, in trade units: the values of filled quantities, or one draw of them. */
export type Numbers<T> = { readonly [Name in keyof T]: number };

/** The values of filled quantities. */
export function valuesOf<T extends Record<string, { value: number }>>(filled: T): Numbers<T> {
  return Object.fromEntries(Object.entries(filled).map(([name, { value }]) => [name, value])) as Numbers<T>;
}

/** Height of the bottom below the keel line where it is no plain vee; undefined where the question does not say. */
export function hullShape(n: Numbers<FilledHull>, localBottomMm?: number): HullShape {
  return {
    deadriseRad: degToRad(n.deadriseDeg),
    transomAngleRad: degToRad(n.transomAngleDeg),
    transomHeightM: mmToM(n.transomHeightMm),
    chineBeamM: n.chineBeamM,
    keelPadHalfM: mmToM(n.keelPadMm) / 2,
    notchM: mmToM(n.notchMm),
    localBottomM: localBottomMm === undefined ? null : mmToM(localBottomMm),
  };
}

/** Forms whose bottom is no single vee; they take a class trim and a stated local bottom. */
export const formsWithoutVee = ['pontoon', 'catamaran'] as const;

/** Whether the bottom at the transom follows from deadrise and keel pad alone. */
export function hasPlainBottom(hull: HullPart): boolean {
  if ((formsWithoutVee as readonly string[]).includes(hull.form) || (hull.steps ?? 0) > 0) return false;
  return hull.form !== 'other' || hull.deadriseDeg !== undefined;
}

export function trimHull(hull: HullPart, n: Numbers<FilledHull>): TrimHull {
  return {
    planing: hasPlainBottom(hull),
    massKg: n.loadedMassKg,
    lcgM: n.lcgM,
    vcgM: n.vcgM,
    chineBeamM: n.chineBeamM,
    deadriseRad: degToRad(n.deadriseDeg),
    staticTrimRad: degToRad(n.staticTrimDeg),
  };
}

export function lowerUnitShape(unit: LowerUnitPart, n: Numbers<FilledLowerUnit>): LowerUnitShape {
  return {
    drive: unit.drive,
    shaftLengthM: mmToM(n.shaftLengthMm),
    plateBelowKeelM: mmToM(n.plateBelowKeelMm),
    propDiameterM: mmToM(n.propDiameterMm),
    propAxialM: mmToM(n.propAxialMm),
    propAftM: mmToM(n.propAftMm),
    bladeAreaRatio: Math.min(1, Math.max(0, n.bladeAreaRatio)),
    torpedoDiameterM: mmToM(n.torpedoDiameterMm),
    torpedoLengthM: mmToM(n.torpedoLengthMm),
    torpedoNoseForwardM: mmToM(n.torpedoNoseForwardMm),
    plateAboveShaftM: mmToM(n.plateAboveShaftMm),
    plateLengthM: mmToM(n.plateLengthMm),
    plateWidthM: mmToM(n.plateWidthMm),
    plateThicknessM: mmToM(n.plateThicknessMm),
    plateForwardM: mmToM(n.plateForwardMm),
    strutChordM: mmToM(n.strutChordMm),
    strutThicknessM: mmToM(n.strutThicknessMm),
    legChordM: mmToM(n.legChordMm),
    legThicknessM: mmToM(n.legThicknessMm),
    skegDepthM: mmToM(n.skegDepthMm),
    skegChordM: mmToM(n.skegChordMm),
    skegThicknessM: mmToM(n.skegThicknessMm),
    skegAftM: mmToM(n.skegAftMm),
    swivelAftM: mmToM(n.swivelAftMm),
    driveshaftAftM: mmToM(n.driveshaftAftMm),
    tiltAxisAftM: mmToM(n.tiltAxisAftMm),
    tiltAxisAboveM: mmToM(n.tiltAxisAboveMm),
    trimRefTransomRad: degToRad(n.trimRefTransomDeg),
    trimMinRad: degToRad(n.trimMinDeg),
    trimMaxRad: degToRad(n.trimMaxDeg),
    tiltMaxRad: degToRad(n.tiltMaxDeg),
    steerMaxRad: degToRad(n.steerMaxDeg),
  };
}

/** How one engine of a question is set, in trade units. */
export interface EngineNumbers {
  offsetMm: number;
  setbackMm: number;
  raiseMm: number;
  motorTrimDeg: number;
  steerDeg: number;
}

export function engineSetting(n: EngineNumbers): EngineSetting {
  return {
    offsetM: mmToM(n.offsetMm),
    setbackM: mmToM(n.setbackMm),
    raiseM: mmToM(n.raiseMm),
    motorTrimRad: degToRad(n.motorTrimDeg),
    steerRad: degToRad(n.steerDeg),
  };
}

export function engineOf(unit: LowerUnitPart, sizes: Numbers<FilledLowerUnit>, setting: EngineNumbers): Engine {
  return { unit: lowerUnitShape(unit, sizes), setting: engineSetting(setting) };
}

export function sideElement(transducer: TransducerPart, n: Numbers<FilledTransducer>): SideElement {
  return {
    apertureM: mmToM(n.sideApertureMm),
    depressionRad: degToRad(n.sideDepressionDeg),
    verticalWidthRad: degToRad(n.sideVerticalBeamDeg),
    alongTrackWidthRad: degToRad(n.sideAlongBeamDeg),
    levelDb: transducer.beamLevelDb ?? -3,
    levelWay: transducer.beamLevelWay ?? 'one',
  };
}

/** Where a sensor stands, in trade units; `forwardMm` null on a transom. */
export interface SensorNumbers {
  offsetMm: number;
  dropMm: number;
  /** Transom face to leading edge, board included. */
  standoffMm: number;
  forwardMm: number | null;
  housingLengthMm: number;
  tiltDeg: number;
  rollDeg: number;
  yawDeg: number;
}

export function sensorSetting(n: SensorNumbers): SensorSetting {
  return {
    fixing:
      n.forwardMm === null
        ? { kind: 'transom', standoffM: mmToM(n.standoffMm), housingLengthM: mmToM(n.housingLengthMm) }
        : { kind: 'forward', forwardM: mmToM(n.forwardMm) },
    offsetM: mmToM(n.offsetMm),
    dropM: mmToM(n.dropMm),
    tiltRad: degToRad(n.tiltDeg),
    rollRad: degToRad(n.rollDeg),
    yawRad: degToRad(n.yawDeg),
  };
}

export function trimPoint(point: InlineTrimPoint): TrimPoint {
  return {
    speedMps: knToMps(point.speedKn),
    trimRad: degToRad(point.trimDeg),
    sigmaRad: point.sigmaDeg === undefined ? null : degToRad(point.sigmaDeg),
    runs: point.runs ?? 1,
    massKg: point.loadedMassKg ?? null,
    motorTrimRad: point.motorTrimDeg === undefined ? null : degToRad(point.motorTrimDeg),
  };
}

/** A box of the question, by its middle, mm. */
export interface ObstacleNumbers {
  label: string;
  xMm: number;
  yMm: number;
  zMm: number;
  lengthMm: number;
  widthMm: number;
  heightMm: number;
}

export function obstacleBox(o: ObstacleNumbers): ObstacleBox {
  return {
    label: o.label,
    middleM: [mmToM(o.xMm), mmToM(o.yMm), mmToM(o.zMm)],
    sizeM: [mmToM(o.lengthMm), mmToM(o.widthMm), mmToM(o.heightMm)],
  };
}
