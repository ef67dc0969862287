// Does the beam clear? One side's answer, and the tilts at which both sides do.
import type { Pose } from '../frames.ts';
import type { SideElement } from '../sensor.ts';
import type { Solid } from '../solids/solid.ts';
import { clearFrom, type SideVerdict, sideVerdict } from '../thresholds.ts';
import { degToRad } from '../units.ts';
import { type Fan, fanOf, type Side } from './fan.ts';
import { diffractionMarginM, nearestPass } from './least-clearance.ts';
import { clearShare, type Sector, sectorsOf } from './sectors.ts';
import { type SeenSolid, seenAll, seenBy } from './seen-solid.ts';
import { castSlab, hidesAlone, slabShare } from './slab.ts';

export interface SideClearance {
  verdict: SideVerdict;
  clearShare: number;
  sectors: Sector[];
  /** 0 where something is hit, null where nothing is within reach. */
  leastClearanceM: number | null;
  diffractionMarginM: number | null;
}

/** One side of a side element. Solids and sensor in the boat frame; wavelength in the water, m. */
export function sideClearance(
  solids: readonly Solid[],
  sensor: Pose,
  element: SideElement,
  side: Side,
  wavelengthM: number,
  fan: Fan = fanOf(element),
): SideClearance {
  const profile = castSlab(solids, sensor, element, fan, side);
  const share = clearShare(fan, profile.blocked);
  const answer = { verdict: sideVerdict(share), clearShare: share, sectors: sectorsOf(fan, profile, solids) };
  if (profile.blocked.some((blocked) => blocked > 0)) return { ...answer, leastClearanceM: 0, diffractionMarginM: null };
  const pass = nearestPass(solids, sensor, element, fan, side);
  return {
    ...answer,
    leastClearanceM: pass?.clearanceM ?? null,
    diffractionMarginM: pass && diffractionMarginM(wavelengthM, pass.alongM),
  };
}

export interface TiltWindow {
  /** Lowest and highest tilt of the run around the set one at which the wanted sides are clear; null where the set one is not. */
  windowRad: readonly [number, number] | null;
  /** Where the set tilt is not clear: the nearest one that is, if any. */
  nearestClearRad: number | null;
}

const windowStepRad = degToRad(0.5);
const windowSteps = 40;

/**
 * Tilts from −20° to +20° by half a degree, with the leading edge held.
 * `poseAt` gives the sensor's pose at a tilt; `sides` are the sides that must be clear (share ≥ 0.99).
 */
export function tiltWindow(
  solids: readonly Solid[],
  poseAt: (tiltRad: number) => Pose,
  element: SideElement,
  sides: readonly Side[],
  setTiltRad: number,
  setIsClear: boolean,
): TiltWindow {
  const fan = fanOf(element);
  const known = new Map<number, boolean>();
  // What hid the beam at one tilt most likely hides it at the next: it is asked first, alone.
  let suspect: Suspect | null = null;
  const isClear = (step: number): boolean => {
    const before = known.get(step);
    if (before !== undefined) return before;
    const sensor = poseAt(step * windowStepRad);
    let clear = suspect === null || !hidesAlone(seenBy(sensor, suspect.solid), element, fan, suspect.side, clearFrom);
    if (clear) {
      const seen = seenAll(sensor, solids);
      clear = sides.every((side) => slabShare(seen, element, fan, side, clearFrom) >= clearFrom);
      if (!clear) suspect = suspectAmong(seen, sides, (one, side) => hidesAlone(one, element, fan, side, clearFrom));
    }
    known.set(step, clear);
    return clear;
  };
  const at = setTiltRad / windowStepRad;
  if (setIsClear) {
    let low = setTiltRad;
    let high = setTiltRad;
    for (let step = Math.floor(at + 1e-9); step >= -windowSteps && step <= windowSteps && isClear(step); step--) low = step * windowStepRad;
    for (let step = Math.ceil(at - 1e-9); step <= windowSteps && step >= -windowSteps && isClear(step); step++) high = step * windowStepRad;
    return { windowRad: [low, high], nearestClearRad: null };
  }
  const steps = Array.from({ length: 2 * windowSteps + 1 }, (_, i) => i - windowSteps).sort((a, b) => Math.abs(a - at) - Math.abs(b - at));
  const nearest = steps.find(isClear);
  return { windowRad: null, nearestClearRad: nearest === undefined ? null : nearest * windowStepRad };
}

interface Suspect {
  solid: Solid;
  side: Side;
}

/** A solid that hides a side by itself; null where only several together do. */
function suspectAmong(seen: readonly SeenSolid[], sides: readonly Side[], hides: (one: SeenSolid, side: Side) => boolean): Suspect | null {
  for (const side of sides) {
    const one = seen.find((candidate) => hides(candidate, side));
    if (one) return { solid: one.solid, side };
  }
  return null;
}
