import { describe, expect, it } from 'vitest';
import { toBoat } from './frames.ts';
import { bottomZM, type HullShape, transomTopM, transomXM } from './hull.ts';
import { type EngineSetting, type LowerUnitShape, legPose, lowerUnitSolids, motorTrimReach, propCentreM } from './lower-unit.ts';
import { sensorPose } from './sensor.ts';
import { degToRad, radToDeg } from './units.ts';

const hull: HullShape = {
  deadriseRad: degToRad(10),
  transomAngleRad: degToRad(14),
  transomHeightM: 0.508,
  chineBeamM: 1.8,
  keelPadHalfM: 0.05,
  notchM: 0,
  localBottomM: null,
};
const unit: LowerUnitShape = {
  drive: 'outboard',
  shaftLengthM: 0.508,
  plateBelowKeelM: 0,
  propDiameterM: 0.35,
  propAxialM: 0.08,
  propAftM: 0.26,
  bladeAreaRatio: 0.55,
  torpedoDiameterM: 0.11,
  torpedoLengthM: 0.54,
  torpedoNoseForwardM: 0.23,
  plateAboveShaftM: 0.2,
  plateLengthM: 0.45,
  plateWidthM: 0.23,
  plateThicknessM: 0.008,
  plateForwardM: 0.15,
  strutChordM: 0.18,
  strutThicknessM: 0.06,
  legChordM: 0.2,
  legThicknessM: 0.1,
  skegDepthM: 0.23,
  skegChordM: 0.19,
  skegThicknessM: 0.012,
  skegAftM: 0.02,
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
const straight: EngineSetting = { offsetM: 0, setbackM: 0, raiseM: 0, motorTrimRad: 0, steerRad: 0 };
const topX = -0.508 * Math.tan(degToRad(14));

describe('the hull', () => {
  it('rises outboard of its keel pad', () => {
    expect(bottomZM(hull, 0.05)).toBeCloseTo(0, 12);
    expect(bottomZM(hull, -0.45)).toBeCloseTo(-0.4 * Math.tan(degToRad(10)), 12);
  });
  it('has its transom top aft of the keel line by height × tan of the angle', () => {
    expect(transomTopM(hull, 0.3)).toEqual([expect.closeTo(topX, 12), 0.3, -0.508]);
    expect(transomXM(hull, -0.508)).toBeCloseTo(topX, 12);
  });
});

describe('an outboard', () => {
  it('at trim 0 stands upright, its plate a shaft length below the clamp', () => {
    const pose = legPose(hull, unit, straight);
    expect(pose.originM).toEqual([expect.closeTo(topX - 0.15, 12), 0, expect.closeTo(0.2, 12)]);
    expect(propCentreM(unit, pose)[0]).toBeCloseTo(topX - 0.15 - 0.26, 12);
  });

  it('moves aft with setback and up and aft with the raise along the transom', () => {
    const { originM } = legPose(hull, unit, { ...straight, setbackM: 0.1, raiseM: 0.05 });
    expect(originM[0]).toBeCloseTo(topX - 0.15 - 0.1 - 0.05 * Math.sin(degToRad(14)), 12);
    expect(originM[2]).toBeCloseTo(0.2 - 0.05 * Math.cos(degToRad(14)), 12);
  });

  it('steered to starboard points the nose to starboard and puts the propeller to port', () => {
    const pose = legPose(hull, unit, { ...straight, steerRad: degToRad(20) });
    expect(toBoat(pose, [0.23, 0, 0])[1]).toBeGreaterThan(0);
    expect(propCentreM(unit, pose)[1]).toBeLessThan(0);
  });

  it('trimmed out swings its foot aft and up', () => {
    const before = legPose(hull, unit, straight).originM;
    const after = legPose(hull, unit, { ...straight, motorTrimRad: degToRad(12) }).originM;
    expect(after[0]).toBeLessThan(before[0]);
    expect(after[2]).toBeLessThan(before[2]);
  });

  it('keeps its distance from the tilt axis', () => {
    const axis = [topX - 0.04, 0, -0.508 - 0.015] as const;
    const reach = ({ originM }: { originM: readonly number[] }) =>
      Math.hypot((originM[0] as number) - axis[0], (originM[2] as number) - axis[2]);
    expect(reach(legPose(hull, unit, { ...straight, motorTrimRad: 1 }))).toBeCloseTo(reach(legPose(hull, unit, straight)), 12);
  });

  it('reaches less on a steeper transom than it is stated for', () => {
    const { min, maxUnderPower } = motorTrimReach(hull, unit);
    expect([radToDeg(min), radToDeg(maxUnderPower)]).toEqual([expect.closeTo(-6, 9), expect.closeTo(14, 9)]);
  });

  it('is made of six parts, five without a skeg', () => {
    const parts = (shape: LowerUnitShape) => lowerUnitSolids(shape, legPose(hull, shape, straight), 0).map(({ owner }) => owner.part);
    expect(parts(unit)).toEqual(['torpedo', 'strut', 'leg', 'plate', 'skeg', 'propeller']);
    expect(parts({ ...unit, skegDepthM: 0 })).not.toContain('skeg');
  });
});

describe('a sterndrive', () => {
  it('hangs its plate below the keel line, whatever the transom', () => {
    const drive = { ...unit, drive: 'sterndrive' as const, plateBelowKeelM: 0.03 };
    expect(legPose(hull, drive, straight).originM[2]).toBeCloseTo(0.03 + 0.2, 12);
  });
});

describe('a sensor on the transom', () => {
  const setting = {
    fixing: { kind: 'transom', standoffM: 0.03, housingLengthM: 0.2 },
    offsetM: 0.45,
    dropM: 0.006,
    tiltRad: 0,
    rollRad: 0,
    yawRad: 0,
  } as const;
  const bottom = -0.4 * Math.tan(degToRad(10));

  it('has its face centre half a housing aft of the leading edge', () => {
    const { originM } = sensorPose(hull, setting);
    expect(originM).toEqual([expect.closeTo(bottom * Math.tan(degToRad(14)) - 0.03 - 0.1, 12), 0.45, expect.closeTo(bottom + 0.006, 12)]);
  });

  it('drops its tail when tilted nose-up, the leading edge held', () => {
    const { originM } = sensorPose(hull, { ...setting, tiltRad: degToRad(5) });
    expect(originM[2]).toBeCloseTo(bottom + 0.006 + 0.1 * Math.sin(degToRad(5)), 12);
  });
});
