// What must hold for any boat. `DEEP=1` runs a thousand cases of each, an ordinary run fewer.
import { fanOf } from '@tiltwright/shared/engine/beams/fan.ts';
import { clearShare } from '@tiltwright/shared/engine/beams/sectors.ts';
import { castSlab } from '@tiltwright/shared/engine/beams/slab.ts';
import { cellOffsetM } from '@tiltwright/shared/engine/beams/slab-runs.ts';
import { toBoat } from '@tiltwright/shared/engine/frames.ts';
import { legPose, lowerUnitSolids } from '@tiltwright/shared/engine/lower-unit.ts';
import { attitudeRotation, inverse, rotate } from '@tiltwright/shared/engine/rotation.ts';
import { sceneSolids } from '@tiltwright/shared/engine/scene.ts';
import { type SensorSetting, sensorPose } from '@tiltwright/shared/engine/sensor.ts';
import { distanceToSolid, enterSolid, type Shape, type Solid } from '@tiltwright/shared/engine/solids/solid.ts';
import { reachM } from '@tiltwright/shared/engine/thresholds.ts';
import { degToRad } from '@tiltwright/shared/engine/units.ts';
import { add, scale, type Vec3 } from '@tiltwright/shared/engine/vec3.ts';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  type Between,
  betweenOf,
  randomElement,
  randomHull,
  randomLowerUnit,
  randomSetting,
  seededRandom,
} from '../support/random-scene.ts';

const runs = process.env.DEEP ? 1000 : 60;
const minutes = 60_000;

/** Checks a statement for random numbers drawn from a seed that fast-check chooses, shrinks and reports. */
const forAny = (statement: (between: Between) => void) =>
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 2 ** 31 }), (seed) => statement(betweenOf(seededRandom(seed)))),
    { numRuns: runs, seed: 20261201 },
  );

function randomSensor(between: Between): SensorSetting {
  return {
    fixing: { kind: 'transom', standoffM: between(0, 0.1), housingLengthM: between(0.16, 0.3) },
    offsetM: between(-0.7, 0.7),
    dropM: between(0, 0.05),
    tiltRad: degToRad(between(-15, 15)),
    rollRad: degToRad(between(-3, 3)),
    yawRad: degToRad(between(-3, 3)),
  };
}

describe(`for any boat (${runs} cases each)`, () => {
  it('a rotation is undone by its inverse', () => {
    forAny((between) => {
      const turn = attitudeRotation(between(-3, 3), between(-3, 3), between(-3, 3));
      const point: Vec3 = [between(-5, 5), between(-5, 5), between(-5, 5)];
      rotate(inverse(turn), rotate(turn, point)).forEach((value, i) => {
        expect(Math.abs(value - (point[i] as number))).toBeLessThan(1e-12);
      });
    });
  });

  it('a mirrored boat swaps port and starboard exactly', { timeout: minutes }, () => {
    forAny((between) => {
      const hull = randomHull(between);
      const unit = randomLowerUnit(between);
      const setting = randomSetting(between, between(-0.4, 0.4));
      const sensor = randomSensor(between);
      const element = randomElement(between);
      const fan = fanOf(element);
      const here = sceneSolids(hull, [{ unit, setting }], [], true);
      const mirrored = sceneSolids(
        hull,
        [{ unit, setting: { ...setting, offsetM: -setting.offsetM, steerRad: -setting.steerRad } }],
        [],
        true,
      );
      const other = { ...sensor, offsetM: -sensor.offsetM, rollRad: -sensor.rollRad, yawRad: -sensor.yawRad };
      const port = castSlab(here, sensorPose(hull, sensor), element, fan, 'port').blocked;
      const starboard = castSlab(mirrored, sensorPose(hull, other), element, fan, 'starboard').blocked;
      expect(Array.from(starboard)).toEqual(Array.from(port));
    });
  });

  it('the clear share never grows when a solid grows', { timeout: minutes }, () => {
    forAny((between) => {
      const hull = randomHull(between);
      const unit = randomLowerUnit(between);
      const sensor = sensorPose(hull, randomSensor(between));
      const element = randomElement(between);
      const fan = fanOf(element);
      const solids = lowerUnitSolids(unit, legPose(hull, unit, randomSetting(between, 0)), 0);
      const chosen = Math.floor(between(0, solids.length));
      const grown = solids.map((solid, i) => (i === chosen ? { ...solid, shape: larger(solid.shape, between(1.01, 1.6)) } : solid));
      for (const side of ['port', 'starboard'] as const) {
        const before = clearShare(fan, castSlab(solids, sensor, element, fan, side).blocked);
        const after = clearShare(fan, castSlab(grown, sensor, element, fan, side).blocked);
        expect(after).toBeLessThanOrEqual(before + 1e-12);
      }
    });
  });

  it('more motor trim never hides more, once the whole torpedo is aft of the slab at trim 0', { timeout: minutes }, () => {
    let cases = 0;
    forAny((between) => {
      const hull = { ...randomHull(between), transomAngleRad: degToRad(13) };
      // The plate reaches no farther forward than the torpedo, as on real motors.
      const unit = { ...randomLowerUnit(between), torpedoNoseForwardM: 0.08, plateForwardM: 0.05, propAftM: 0.25 };
      const setting = { ...randomSetting(between, 0), setbackM: between(0.15, 0.3), motorTrimRad: 0, steerRad: 0 };
      const sensor = sensorPose(hull, { ...randomSensor(between), offsetM: between(0.3, 0.6), tiltRad: 0, rollRad: 0, yawRad: 0 });
      const element = { ...randomElement(between), alongTrackWidthRad: degToRad(0.6) };
      const fan = fanOf(element);
      const nose = toBoat(legPose(hull, unit, setting), [unit.torpedoNoseForwardM, 0, 0])[0];
      const aftEnd = toBoat(sensor, [cellOffsetM(0, element.apertureM), 0, 0])[0];
      if (nose > aftEnd) return;
      cases++;
      let before = Number.POSITIVE_INFINITY;
      for (let trimDeg = 0; trimDeg <= 24; trimDeg += 3) {
        const solids = lowerUnitSolids(unit, legPose(hull, unit, { ...setting, motorTrimRad: degToRad(trimDeg) }), 0);
        const hidden = 1 - clearShare(fan, castSlab(solids, sensor, element, fan, 'port').blocked);
        expect(hidden).toBeLessThanOrEqual(before + 1e-9);
        before = hidden;
      }
    });
    expect(cases).toBeGreaterThan(runs / 10);
  });

  it('scaling every length, the reach too, leaves the shares alone', { timeout: minutes }, () => {
    forAny((between) => {
      const hull = randomHull(between);
      const unit = randomLowerUnit(between);
      const sensor = sensorPose(hull, randomSensor(between));
      const element = randomElement(between);
      const fan = fanOf(element);
      const solids = lowerUnitSolids(unit, legPose(hull, unit, randomSetting(between, 0)), 0);
      const factor = between(0.2, 5);
      const scaled = solids.map((solid) => ({
        ...solid,
        shape: larger(solid.shape, factor),
        pose: { ...solid.pose, originM: scale(solid.pose.originM, factor) },
      }));
      const scaledSensor = { ...sensor, originM: scale(sensor.originM, factor) };
      const scaledElement = { ...element, apertureM: element.apertureM * factor };
      const before = clearShare(fan, castSlab(solids, sensor, element, fan, 'port').blocked);
      const after = clearShare(fan, castSlab(scaled, scaledSensor, scaledElement, fan, 'port', reachM * factor).blocked);
      // A ray that grazes an edge may fall on its other side: one ray of 51 in one direction.
      expect(Math.abs(after - before)).toBeLessThan(1e-3);
    });
  });

  it('each solid is met where stepping along the ray first finds it', { timeout: minutes }, () => {
    forAny((between) => {
      const hull = randomHull(between);
      const unit = randomLowerUnit(between);
      const solids = lowerUnitSolids(unit, legPose(hull, unit, randomSetting(between, 0)), 0);
      const solid = solids[Math.floor(between(0, solids.length))] as Solid;
      const origin = add(solid.pose.originM, [between(-1, 1), between(-1, 1), between(-1, 1)]);
      const toward = add(solid.pose.originM, [between(-0.1, 0.1), between(-0.1, 0.1), between(-0.1, 0.1)]);
      const away: Vec3 = [toward[0] - origin[0], toward[1] - origin[1], toward[2] - origin[2]];
      const direction = scale(away, 1 / Math.hypot(...away));
      const step = 0.0005;
      let stepped = Number.POSITIVE_INFINITY;
      for (let t = 0; t <= 3 && stepped === Number.POSITIVE_INFINITY; t += step) {
        if (distanceToSolid(solid, add(origin, scale(direction, t))) === 0) stepped = t;
      }
      const entered = enterSolid(solid, origin, direction);
      if (stepped === Number.POSITIVE_INFINITY) {
        // Missed by every step: then at most a corner thinner than a step is in the way.
        if (entered < 3) expect(distanceToSolid(solid, add(origin, scale(direction, entered + step)))).toBeGreaterThan(0);
      } else {
        expect(entered).toBeLessThanOrEqual(stepped + 1e-9);
        expect(entered).toBeGreaterThan(stepped - step - 1e-9);
      }
    });
  });
});

function larger(shape: Shape, factor: number): Shape {
  switch (shape.kind) {
    case 'box':
      return {
        kind: 'box',
        halfLengthM: shape.halfLengthM * factor,
        halfWidthM: shape.halfWidthM * factor,
        halfHeightM: shape.halfHeightM * factor,
      };
    case 'capsule':
      return { kind: 'capsule', halfAxisM: shape.halfAxisM * factor, radiusM: shape.radiusM * factor };
    case 'elliptic-strut':
      return {
        kind: 'elliptic-strut',
        halfChordM: shape.halfChordM * factor,
        halfThicknessM: shape.halfThicknessM * factor,
        halfHeightM: shape.halfHeightM * factor,
      };
    case 'prop-disc':
      return { kind: 'prop-disc', radiusM: shape.radiusM * factor, halfDepthM: shape.halfDepthM * factor };
    case 'prism':
      throw new Error('an open prism has no size');
    default:
      return shape satisfies never;
  }
}
