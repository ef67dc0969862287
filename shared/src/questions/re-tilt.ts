// Whether setting the needed tilt would gain anything an owner could see.
import { fanOf, type Side } from '../engine/beams/fan.ts';
import { lineHalfWidth } from '../engine/beams/pattern.ts';
import { seenAll } from '../engine/beams/seen-solid.ts';
import { slabShare } from '../engine/beams/slab.ts';
import { sigmasIn90 } from '../engine/estimate.ts';
import { pitchGainDb, usualLambertDb } from '../engine/record.ts';
import { sideVerdict } from '../engine/thresholds.ts';
import { degToRad } from '../engine/units.ts';
import * as input from '../engine-input.ts';
import type { TiltAnswer, TrimAnswer } from '../schemas/answer.ts';
import type { BothSides, Scene } from './evaluate.ts';
import type { FitNumbers, Prepared } from './prepare.ts';

/** A change of illumination smaller than this is not seen, dB. */
const seenDb = 1.5;
/** Slant ranges at which the illumination is compared, in heights above the bottom. */
const heights = [1.5, 3, 6, 10];
/** Below this two tilts are the same to anyone who sets them, degrees. */
const sameTiltDeg = 0.05;

/** True where the gain exceeds the tilt's own 90 % interval, betters a wanted side's verdict, or lights the bottom by more than 1.5 dB. */
export function reTiltGains(
  p: Prepared,
  n: FitNumbers,
  scene: Scene,
  sides: BothSides | null,
  wanted: readonly Side[],
  trim: TrimAnswer,
  tilt: TiltAnswer,
): boolean {
  const offDeg = Math.abs(tilt.setDeg - tilt.neededDeg);
  if (offDeg < sameTiltDeg) return false;
  if (offDeg > sigmasIn90 * trim.sigmaDeg) return true;
  if (!sides) return false;
  const element = input.sideElement(p.parts.transducer, n.transducer);
  const fan = fanOf(element);
  const seen = seenAll(scene.poseAt(degToRad(tilt.neededDeg)), scene.solids);
  const rank = { blocked: 0, shaded: 1, clear: 2 };
  const betters = wanted.some((side) => rank[sideVerdict(slabShare(seen, element, fan, side))] > rank[sides[side].verdict]);
  return betters || lightsMore(element, degToRad(tilt.attitudeDeg), degToRad(tilt.neededDeg + trim.valueDeg));
}

function lightsMore(element: ReturnType<typeof input.sideElement>, nowRad: number, thenRad: number): boolean {
  const kappa = lineHalfWidth(element.levelDb, element.levelWay) / Math.sin(element.verticalWidthRad / 2);
  const fan = { axisRad: element.depressionRad, kappa, pitchRad: nowRad, alongRad: element.alongTrackWidthRad };
  const bottom = { lambertDb: usualLambertDb, absorptionDbPerKm: 0, resolutionM: 0.02 };
  return heights.some((slant) => pitchGainDb(slant, 1, fan, thenRad, bottom) > seenDb);
}
