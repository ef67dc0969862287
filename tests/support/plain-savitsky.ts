// The planing balance the plain way: trim by trim in small steps and by halving, with an inner search for the wetted length.
// What the engine's quick search must agree with.
import type { PlaningHull, Thrust } from '@tiltwright/shared/engine/trim/savitsky.ts';
import { degToRad, gravityMps2, radToDeg, type Water } from '@tiltwright/shared/engine/units.ts';

/** Lift coefficient of a flat plate that carries the same at deadrise β°: inverts C_Lβ = C_L0 − 0.0065 β C_L0^0.60 (eq. 16). */
function flatPlateLift(liftCoefficient: number, deadriseDeg: number): number {
  const k = 0.0065 * deadriseDeg;
  // Above the turning point (0.0039 β)^2.5 the curve rises and bends upward, so Newton from above comes down without overshoot.
  let c = liftCoefficient + k * Math.max(1, liftCoefficient) ** 0.6 + (2 * k) ** 2.5;
  for (let i = 0; i < 60; i++) {
    const power = c ** -0.4;
    const step = (c - k * power * c - liftCoefficient) / (1 - 0.6 * k * power);
    c -= step;
    if (Math.abs(step) < 1e-15 * c) break;
  }
  return c;
}

/** Solves 0.0120 λ^½ + 0.0055 λ^2.5/Cv² = C_L0/τ^1.1 (eq. 15) for λ; the left side only rises. */
function wettedLengthRatio(liftOverTrim: number, cvSquared: number): number {
  // With r = λ^½ this is a r + b r⁵ = lift: convex, so Newton from above is safe.
  const a = 0.012;
  const b = 0.0055 / cvSquared;
  let r = Math.min(liftOverTrim / a, (liftOverTrim / b) ** 0.2);
  for (let i = 0; i < 60; i++) {
    const r4 = r * r * r * r;
    const step = (a * r + b * r4 * r - liftOverTrim) / (a + 5 * b * r4);
    r -= step;
    if (Math.abs(step) < 1e-15 * r) break;
  }
  return r * r;
}

/** Everything that follows from a trim; `momentNm` is bow-down positive and 0 at equilibrium. Null where the formulas give none. */
function planingBalance(hull: PlaningHull, thrust: Thrust, speedMps: number, water: Water, trimRad: number) {
  const b = hull.chineBeamM;
  const weight = hull.massKg * gravityMps2;
  const beta = radToDeg(hull.deadriseRad);
  const dynamic = 0.5 * water.densityKgM3 * speedMps * speedMps;
  const cvSquared = (speedMps * speedMps) / (gravityMps2 * b);
  const trimPower = radToDeg(trimRad) ** 1.1;
  const lift = flatPlateLift(weight / (dynamic * b * b), beta);
  const lambda = wettedLengthRatio(lift / trimPower, cvSquared);
  const sin = Math.sin(trimRad);
  const cos = Math.cos(trimRad);
  // Centre of pressure ahead of the transom.
  const pressureM = lambda * b * (0.75 - 1 / ((5.21 * cvSquared) / (lambda * lambda) + 2.39));
  // The spray root runs from the keel aft to the chine; a chine it never reaches stays dry.
  const tanBeta = Math.tan(hull.deadriseRad);
  const keelLessChine = ((b / Math.PI) * tanBeta) / (sin / cos);
  const chineM = lambda * b - keelLessChine / 2;
  const dryChine = chineM < 0;
  const keelM = dryChine ? 2 * lambda * b : lambda * b + keelLessChine / 2;
  const cosBeta = Math.cos(hull.deadriseRad);
  const wettedM2 = dryChine ? (keelM * keelM * Math.PI * (sin / cos)) / (2 * tanBeta * cosBeta) : (lambda * b * b) / cosBeta;
  // Mean speed over the bottom, a little below the boat's.
  const dynamicLift = 0.012 * Math.sqrt(lambda) * trimPower;
  const slowed = 1 - (dynamicLift - 0.0065 * beta * dynamicLift ** 0.6) / (lambda * cos);
  if (!(slowed > 0)) return null;
  const bottomSpeed = speedMps * Math.sqrt(slowed);
  const reynolds = (bottomSpeed * lambda * b) / water.viscosityM2s;
  // ITTC-1957 correlation line with a roughness allowance of 0.0004.
  const friction = 0.075 / (Math.log10(reynolds) - 2) ** 2 + 0.0004;
  const frictionN = 0.5 * water.densityKgM3 * bottomSpeed * bottomSpeed * wettedM2 * friction;
  // Forces along and square to the keel, then moments about the centre of gravity.
  const thrustN = (weight * sin + frictionN) / Math.cos(thrust.inclinationRad);
  const normalN = weight * cos - thrustN * Math.sin(thrust.inclinationRad);
  const frictionArmM = hull.vcgM - (b / 4) * tanBeta;
  const momentNm = normalN * (hull.lcgM - pressureM) + frictionN * frictionArmM - thrustN * thrust.armM;
  // What the water takes, whatever the thrust line: D = W tan τ + D_f / cos τ.
  const dragN = weight * (sin / cos) + frictionN / cos;
  return { momentNm, lambda, dragN, keelM, chineM: dryChine ? 0 : chineM, dryChine, cvSquared };
}

const searchFromRad = degToRad(0.5);
const searchToRad = degToRad(20);
const searchSteps = 78;

/**
 * The trim at which moments balance: the first change of the moment from bow-up to bow-down as trim grows between 0.5° and 20°.
 * Valid for 0.60 ≤ Cv ≤ 13, 2° ≤ τ ≤ 15°, λ ≤ 4; outside it answers with a flag. Null where no balance exists.
 */
export function plainPlaningTrim(hull: PlaningHull, thrust: Thrust, speedMps: number, water: Water): number | null {
  if (!(speedMps > 0)) return null;
  const momentAt = (trimRad: number) => planingBalance(hull, thrust, speedMps, water, trimRad)?.momentNm ?? Number.NaN;
  let low = Number.NaN;
  let high = Number.NaN;
  let before = momentAt(searchFromRad);
  for (let i = 1; i <= searchSteps; i++) {
    const trimRad = searchFromRad + ((searchToRad - searchFromRad) * i) / searchSteps;
    const moment = momentAt(trimRad);
    if (before < 0 && moment >= 0) {
      high = trimRad;
      low = searchFromRad + ((searchToRad - searchFromRad) * (i - 1)) / searchSteps;
      break;
    }
    before = moment;
  }
  if (Number.isNaN(high)) return null;
  for (let i = 0; i < 60 && high - low > 1e-12; i++) {
    const middle = (low + high) / 2;
    if (momentAt(middle) < 0) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
