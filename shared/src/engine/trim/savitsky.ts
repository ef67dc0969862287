// Running trim of a planing hull: Savitsky 1964, Hydrodynamic Design of Planing Hulls, Marine Technology 1(1), 71–95.
// Heights are up from the keel and lengths forward of the transom, so an outboard's propeller has both below 0.
// Inside this file angles are degrees where the paper's formulas take degrees; the face is SI and radians.
import { signChange } from '../sign-change.ts';
import { degToRad, gravityMps2, radToDeg, type Water } from '../units.ts';

export interface PlaningHull {
  massKg: number;
  /** Centre of gravity ahead of the transom and above the keel, m. */
  lcgM: number;
  vcgM: number;
  /** Beam between the chines, m. */
  chineBeamM: number;
  deadriseRad: number;
}

/** The thrust line: how far it passes below the centre of gravity, m, and its inclination to the keel, bow-up positive. */
export interface Thrust {
  armM: number;
  inclinationRad: number;
}

export const savitskyFlags = ['speed-outside-range', 'trim-outside-range', 'wetted-length-outside-range', 'dry-chine'] as const;
export type SavitskyFlag = (typeof savitskyFlags)[number];

export interface PlaningState {
  trimRad: number;
  /** Mean wetted length over beam, λ. */
  wettedLengthRatio: number;
  /** Hydrodynamic drag, N. */
  dragN: number;
  wettedKeelM: number;
  wettedChineM: number;
  speedCoefficient: number;
  flags: readonly SavitskyFlag[];
}

/** f = (VCG − z) cos ε − (LCG − x) sin ε for thrust acting at (x, z); a motor trimmed out by d has ε = −d. */
export function thrustAt(hull: PlaningHull, forwardM: number, upM: number, inclinationRad: number): Thrust {
  const armM = (hull.vcgM - upM) * Math.cos(inclinationRad) - (hull.lcgM - forwardM) * Math.sin(inclinationRad);
  return { armM, inclinationRad };
}

/** Lift coefficient of a flat plate that carries the same at deadrise β°: inverts C_Lβ = C_L0 − 0.0065 β C_L0^0.60 (eq. 16). */
export function flatPlateLift(liftCoefficient: number, deadriseDeg: number): number {
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
export function wettedLengthRatio(liftOverTrim: number, cvSquared: number): number {
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

/** What does not change with the trim. */
interface Terms {
  beamM: number;
  betaDeg: number;
  tanBeta: number;
  cosBeta: number;
  weightN: number;
  cvSquared: number;
  flatPlateLift: number;
  lcgM: number;
  frictionArmM: number;
  thrustArmM: number;
  cosThrust: number;
  sinThrust: number;
  speedMps: number;
  halfDensity: number;
  viscosityM2s: number;
}

function termsOf(hull: PlaningHull, thrust: Thrust, speedMps: number, water: Water): Terms {
  const beamM = hull.chineBeamM;
  const weightN = hull.massKg * gravityMps2;
  const betaDeg = radToDeg(hull.deadriseRad);
  const tanBeta = Math.tan(hull.deadriseRad);
  const halfDensity = 0.5 * water.densityKgM3;
  return {
    beamM,
    betaDeg,
    tanBeta,
    cosBeta: Math.cos(hull.deadriseRad),
    weightN,
    cvSquared: (speedMps * speedMps) / (gravityMps2 * beamM),
    flatPlateLift: flatPlateLift(weightN / (halfDensity * speedMps * speedMps * beamM * beamM), betaDeg),
    lcgM: hull.lcgM,
    frictionArmM: hull.vcgM - (beamM / 4) * tanBeta,
    thrustArmM: thrust.armM,
    cosThrust: Math.cos(thrust.inclinationRad),
    sinThrust: Math.sin(thrust.inclinationRad),
    speedMps,
    halfDensity,
    viscosityM2s: water.viscosityM2s,
  };
}

/** Everything that follows from a mean wetted length; the moment is bow-down positive and 0 at equilibrium. */
interface Balance {
  trimRad: number;
  momentNm: number;
  dragN: number;
  keelM: number;
  chineM: number;
}

/**
 * Fills in the balance at a mean wetted length λ. Lift fixes the trim that belongs to it (eq. 15 solved for τ), so no inner search is
 * needed. The moment is NaN where the formulas give none.
 */
function balanceAt(k: Terms, lambda: number, balance: Balance): number {
  const b = k.beamM;
  const lengthM = lambda * b;
  const root = Math.sqrt(lambda);
  const dynamicPart = 0.012 * root;
  const trimPower = k.flatPlateLift / (dynamicPart + (0.0055 * root * lambda * lambda) / k.cvSquared);
  const trimRad = degToRad(trimPower ** (1 / 1.1));
  const sin = Math.sin(trimRad);
  const cos = Math.cos(trimRad);
  // Centre of pressure ahead of the transom.
  const pressureM = lengthM * (0.75 - 1 / ((5.21 * k.cvSquared) / (lambda * lambda) + 2.39));
  // The spray root runs from the keel aft to the chine; a chine it never reaches stays dry, and the wetted area is a triangle.
  const keelLessChine = ((b / Math.PI) * k.tanBeta * cos) / sin;
  const chineM = lengthM - keelLessChine / 2;
  const dryChine = chineM < 0;
  const keelM = dryChine ? 2 * lengthM : lengthM + keelLessChine / 2;
  const wettedM2 = dryChine ? (keelM * keelM * Math.PI * (sin / cos)) / (2 * k.tanBeta * k.cosBeta) : (lengthM * b) / k.cosBeta;
  // Mean speed over the bottom, a little below the boat's.
  const dynamicLift = dynamicPart * trimPower;
  const slowed = 1 - (dynamicLift - 0.0065 * k.betaDeg * dynamicLift ** 0.6) / (lambda * cos);
  const bottomSpeed = k.speedMps * Math.sqrt(slowed);
  const logReynolds = Math.log10((bottomSpeed * lengthM) / k.viscosityM2s) - 2;
  // ITTC-1957 correlation line with a roughness allowance of 0.0004.
  const frictionN = k.halfDensity * bottomSpeed * bottomSpeed * wettedM2 * (0.075 / (logReynolds * logReynolds) + 0.0004);
  // Forces along and square to the keel, then moments about the centre of gravity.
  const thrustN = (k.weightN * sin + frictionN) / k.cosThrust;
  const normalN = k.weightN * cos - thrustN * k.sinThrust;
  balance.trimRad = trimRad;
  balance.momentNm = normalN * (k.lcgM - pressureM) + frictionN * k.frictionArmM - thrustN * k.thrustArmM;
  // What the water takes, whatever the thrust line: D = W tan τ + D_f / cos τ.
  balance.dragN = k.weightN * (sin / cos) + frictionN / cos;
  balance.keelM = keelM;
  balance.chineM = dryChine ? 0 : chineM;
  return balance.momentNm;
}

const leastTrimDeg = 0.5;
const greatestTrimDeg = 20;
const scanSteps = 12;

/**
 * The trim at which moments balance: the first change of the moment from bow-up to bow-down as trim grows from 0.5° to 20°.
 * Valid for 0.60 ≤ Cv ≤ 13, 2° ≤ τ ≤ 15°, λ ≤ 4; outside it answers with a flag. Null where no balance exists.
 */
export function planingTrim(hull: PlaningHull, thrust: Thrust, speedMps: number, water: Water): PlaningState | null {
  if (!(speedMps > 0)) return null;
  const terms = termsOf(hull, thrust, speedMps, water);
  const balance: Balance = { trimRad: 0, momentNm: 0, dragN: 0, keelM: 0, chineM: 0 };
  const longest = wettedLengthRatio(terms.flatPlateLift / leastTrimDeg ** 1.1, terms.cvSquared);
  const shortest = wettedLengthRatio(terms.flatPlateLift / greatestTrimDeg ** 1.1, terms.cvSquared);
  // Trim grows as the wetted length shrinks: from the longest down, in equal ratios, to the first change of sign.
  const ratio = (shortest / longest) ** (1 / scanSteps);
  let long = longest;
  let atLong = balanceAt(terms, long, balance);
  let short = long;
  let atShort = Number.NaN;
  for (let i = 0; i < scanSteps; i++) {
    short = long * ratio;
    atShort = balanceAt(terms, short, balance);
    if (atLong < 0 && atShort >= 0) break;
    long = short;
    atLong = atShort;
  }
  if (!(atLong < 0 && atShort >= 0)) return null;
  const lambda = signChange((x) => balanceAt(terms, x, balance), long, atLong, short, atShort);
  balanceAt(terms, lambda, balance);
  return stateOf(terms, lambda, balance);
}

function stateOf(terms: Terms, lambda: number, balance: Balance): PlaningState {
  const speedCoefficient = Math.sqrt(terms.cvSquared);
  const trimDeg = radToDeg(balance.trimRad);
  const flags: SavitskyFlag[] = [];
  if (speedCoefficient < 0.6 || speedCoefficient > 13) flags.push('speed-outside-range');
  if (trimDeg < 2 || trimDeg > 15) flags.push('trim-outside-range');
  if (lambda > 4) flags.push('wetted-length-outside-range');
  if (balance.chineM === 0) flags.push('dry-chine');
  return {
    trimRad: balance.trimRad,
    wettedLengthRatio: lambda,
    dragN: balance.dragN,
    wettedKeelM: balance.keelM,
    wettedChineM: balance.chineM,
    speedCoefficient,
    flags,
  };
}

/** Trim tabs at the transom: chord m, span as a share of the chine beam, deflection radians (down positive). */
export interface Tabs {
  chordM: number;
  spanRatio: number;
  deflectionRad: number;
}

/**
 * The hull as it planes with tabs down: their lift taken off the weight and its moment off the centre of gravity.
 * ΔF = 0.046 L_f δ_f σ_f b ½ρV² at 0.6 b + L_f (1 − σ_f) ahead of the transom (Savitsky & Brown 1976, Marine Technology 13(4), 381–400).
 * Valid for 0 ≤ δ_f ≤ 15°; deflection beyond that is taken as 15°.
 */
export function withTabs(hull: PlaningHull, tabs: Tabs, speedMps: number, water: Water): PlaningHull {
  const deflectionDeg = Math.min(15, Math.max(0, radToDeg(tabs.deflectionRad)));
  const dynamic = 0.5 * water.densityKgM3 * speedMps * speedMps;
  const liftN = 0.046 * tabs.chordM * deflectionDeg * tabs.spanRatio * hull.chineBeamM * dynamic;
  const liftKg = Math.min(liftN / gravityMps2, 0.9 * hull.massKg);
  const actsM = 0.6 * hull.chineBeamM + tabs.chordM * (1 - tabs.spanRatio);
  const massKg = hull.massKg - liftKg;
  return { ...hull, massKg, lcgM: (hull.massKg * hull.lcgM - liftKg * actsM) / massKg };
}
