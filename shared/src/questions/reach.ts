// What other settings within reach would do for a wanted side: motor trims under power, tilts of the bracket.
import { fanOf, type Side } from '../engine/beams/fan.ts';
import { seenAll } from '../engine/beams/seen-solid.ts';
import { slabShare } from '../engine/beams/slab.ts';
import { motorTrimReach } from '../engine/lower-unit.ts';
import { clearFrom, shadedFrom } from '../engine/thresholds.ts';
import { degToRad, radToDeg } from '../engine/units.ts';
import * as input from '../engine-input.ts';
import { type BothSides, enginesOf, sceneOf } from './evaluate.ts';
import type { FitNumbers, Prepared } from './prepare.ts';
import type { TiltScale } from './reply.ts';

export interface Reach {
  /** No wanted side is blocked at some motor trim under power and some tilt within reach. */
  unblocked: boolean;
  /** The wanted sides clear at the set tilt with the motor trimmed farther up, under power. */
  clearByMotorTrim: boolean;
  /** The wanted sides clear at another tilt within reach. */
  clearByTilt: boolean;
  /** The setting that leaves the wanted sides most open; null where nothing was looked for. */
  best: { numbers: FitNumbers; tiltDeg: number } | null;
}

const trimSteps = 6;
const tiltSteps = 8;

/** Only worked out where a wanted side is not clear as set; where they all are, there is nothing to reach for. */
export function reachOf(
  p: Prepared,
  n: FitNumbers,
  sides: BothSides | null,
  wanted: readonly Side[],
  setDeg: number,
  nearestClearDeg: number | null,
  scale: TiltScale | null,
): Reach {
  if (!sides || wanted.every((side) => sides[side].verdict === 'clear'))
    return { unblocked: true, clearByMotorTrim: false, clearByTilt: false, best: null };
  const tilts = tiltRange(scale);
  const [least, greatest] = tilts;
  const clearByTilt = nearestClearDeg !== null && nearestClearDeg >= least && nearestClearDeg <= greatest;
  const trims = trimSettings(p, n);
  const element = input.sideElement(p.parts.transducer, n.transducer);
  const fan = fanOf(element);
  const opennessWith = (numbers: FitNumbers) => {
    const { solids, poseAt } = sceneOf(p, numbers);
    return (tiltDeg: number, enough: number) => {
      const seen = seenAll(poseAt(degToRad(tiltDeg)), solids);
      return Math.min(...wanted.map((side) => slabShare(seen, element, fan, side, enough)));
    };
  };
  // Motor trims from the highest down: the higher, the farther aft the lower unit.
  const shares = trims.length > 0 ? Array.from({ length: trimSteps + 1 }, (_, i) => 1 - i / trimSteps) : [0];
  const raised = shares.filter((share) => goesUp(n, trims, share));
  const clearByMotorTrim = raised.some((share) => opennessWith(atTrim(n, trims, share))(setDeg, clearFrom) >= clearFrom);
  if (clearByTilt || clearByMotorTrim || wanted.every((side) => sides[side].verdict !== 'blocked')) {
    return { unblocked: true, clearByMotorTrim, clearByTilt, best: null };
  }
  let most = Math.min(...wanted.map((side) => sides[side].clearShare));
  let best = { numbers: n, tiltDeg: setDeg };
  for (const share of shares) {
    const numbers = atTrim(n, trims, share);
    const openness = opennessWith(numbers);
    for (let i = tiltSteps; i >= 0; i--) {
      const tiltDeg = least + ((greatest - least) * i) / tiltSteps;
      const open = openness(tiltDeg, most);
      if (open <= most) continue;
      most = open;
      best = { numbers, tiltDeg };
      if (most >= shadedFrom) return { unblocked: true, clearByMotorTrim, clearByTilt, best: null };
    }
  }
  return { unblocked: false, clearByMotorTrim, clearByTilt, best };
}

/** Tilts against the keel line that the bracket can be set to; ±20° where none is named. */
function tiltRange(scale: TiltScale | null): [number, number] {
  if (!scale) return [-20, 20];
  const zero = scale.transomAngleDeg + scale.zeroDeg;
  return [zero + scale.minDeg, zero + scale.maxDeg];
}

interface TrimSetting {
  index: number;
  minDeg: number;
  maxDeg: number;
}

function trimSettings(p: Prepared, n: FitNumbers): TrimSetting[] {
  const hull = input.hullShape(n.hull);
  return enginesOf(p, n).map(({ unit }, index) => {
    const { min, maxUnderPower } = motorTrimReach(hull, unit);
    return { index, minDeg: radToDeg(min), maxDeg: radToDeg(maxUnderPower) };
  });
}

/** Every engine at the same share of its own reach; one already tilted above it stays where it is. */
function atTrim(n: FitNumbers, trims: readonly TrimSetting[], share: number): FitNumbers {
  const engines = n.engines.map((engine, i) => {
    const { minDeg, maxDeg } = trims[i] as TrimSetting;
    return engine.motorTrimDeg > maxDeg ? engine : { ...engine, motorTrimDeg: minDeg + (maxDeg - minDeg) * share };
  });
  return { ...n, engines };
}

function goesUp(n: FitNumbers, trims: readonly TrimSetting[], share: number): boolean {
  return atTrim(n, trims, share).engines.some((engine, i) => engine.motorTrimDeg > (n.engines[i] as { motorTrimDeg: number }).motorTrimDeg);
}
