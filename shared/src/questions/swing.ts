// How near an engine comes to the sensor as it is steered and tilted through all it can reach.
import { toBoat } from '../engine/frames.ts';
import { legPose, lowerUnitSolids, motorTrimReach } from '../engine/lower-unit.ts';
import { sensorPose } from '../engine/sensor.ts';
import { boundingRadiusM, distanceToSolid } from '../engine/solids/solid.ts';
import { degToRad, mmToM, mToMm } from '../engine/units.ts';
import type { Vec3 } from '../engine/vec3.ts';
import * as input from '../engine-input.ts';
import { enginesOf } from './evaluate.ts';
import type { FitNumbers, Prepared } from './prepare.ts';

const steerSteps = 7;
const tiltSteps = 8;

/**
 * Least gap between the housing (its corners and middles) and any part of an engine at any steer and tilt it reaches, mm.
 * Gaps wider than `wideMm` need not be told apart and come back as they are found, never narrower than they are.
 */
export function swingGapMm(p: Prepared, n: FitNumbers, setDeg: number, wideMm: number): number {
  const hull = input.hullShape(n.hull, p.placing.localBottomMm);
  const housing = housingPoints(p, n, setDeg);
  const wideM = mmToM(wideMm);
  const mean = (axis: 0 | 1 | 2) => housing.reduce((sum, point) => sum + point[axis], 0) / housing.length;
  const middle: Vec3 = [mean(0), mean(1), mean(2)];
  const housingRadius = Math.max(...housing.map((point) => Math.hypot(point[0] - middle[0], point[1] - middle[1], point[2] - middle[2])));
  let least = Number.POSITIVE_INFINITY;
  enginesOf(p, n).forEach(({ unit, setting }, index) => {
    const reach = motorTrimReach(hull, unit);
    for (let i = 0; i < steerSteps; i++) {
      const steerRad = unit.steerMaxRad * ((2 * i) / (steerSteps - 1) - 1);
      for (let j = 0; j < tiltSteps; j++) {
        const motorTrimRad = reach.min + ((reach.maxTilted - reach.min) * j) / (tiltSteps - 1);
        const solids = lowerUnitSolids(unit, legPose(hull, unit, { ...setting, steerRad, motorTrimRad }), index);
        for (const solid of solids) {
          const [x, y, z] = solid.pose.originM;
          const apart = Math.hypot(middle[0] - x, middle[1] - y, middle[2] - z) - boundingRadiusM(solid.shape) - housingRadius;
          if (apart > wideM) least = Math.min(least, apart);
          else for (const point of housing) least = Math.min(least, distanceToSolid(solid, point));
        }
      }
    }
  });
  return mToMm(least);
}

/** Corners and edge middles of the housing, boat frame, m. Its lower face carries the sensor frame's origin. */
function housingPoints(p: Prepared, n: FitNumbers, setDeg: number): Vec3[] {
  const hull = input.hullShape(n.hull, p.placing.localBottomMm);
  const setting = input.sensorSetting({
    offsetMm: n.offsetMm,
    dropMm: n.dropMm,
    standoffMm: n.standoffMm + p.placing.boardMm,
    forwardMm: n.forwardMm,
    housingLengthMm: n.transducer.housingLengthMm,
    tiltDeg: setDeg,
    rollDeg: n.rollDeg,
    yawDeg: n.yawDeg,
  });
  const pose = sensorPose(hull, { ...setting, tiltRad: degToRad(setDeg) });
  const half = mmToM(n.transducer.housingLengthMm) / 2;
  const side = mmToM(p.parts.transducer.housingWidthMm ?? usualWidthMm) / 2;
  const high = mmToM(p.parts.transducer.housingHeightMm ?? usualHeightMm);
  return [-half, 0, half].flatMap((x) => [-side, side].flatMap((y) => [-high, 0].map((z) => toBoat(pose, [x, y, z]))));
}

const usualWidthMm = 52;
const usualHeightMm = 39;
