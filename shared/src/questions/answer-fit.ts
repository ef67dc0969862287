// The whole check: parts and settings in, one answer out. Runs the same in the page and on the server.
import { type CautionCode, cautionCodes, coded } from '../engine/codes.ts';
import { degToRad, knToMps, mmToM } from '../engine/units.ts';
import { engineVersion } from '../engine/version.ts';
import type { FitAnswer, FitQuestion } from '../schemas/fit.ts';
import { clearanceFor, type Running, sceneOf, trimFor, trimPointsOf, windowFor } from './evaluate.ts';
import { fillTiltScale } from './fill-sensor.ts';
import { geometryFaults } from './geometry-faults.ts';
import type { AnswerContext, ResolvedParts } from './parts.ts';
import { type FitNumbers, middleNumbers, type Prepared, prepare } from './prepare.ts';
import { reachOf } from './reach.ts';
import { clearanceAnswer, digestOf, rounded, sidesOf, type TiltScale, tiltAnswer, trimAnswer } from './reply.ts';
import { isNear, judge } from './verdict.ts';

/** Scatter of an owner's own measurement where none is stated, degrees (common practice, no source). */
const usualOwnSigmaDeg = 0.5;

/** Answers a parsed question whose parts have been looked up. Pure: the same in gives the same out. */
export function answerFit(question: FitQuestion, parts: ResolvedParts, context: AnswerContext): FitAnswer {
  const { placement, running } = question;
  const p = prepare(parts, placement, question.lowerUnits, question.obstacles ?? [], running.loadedMassKg);
  const n = middleNumbers(p);
  const scale = tiltScaleOf(p, n);
  const own = ownTrim(question, p);
  const now: Running = { speedKn: running.speedKn, water: running.water, own };
  const trim = trimAnswer(trimFor(p, n, now, trimPointsOf(p, null)));
  if (p.engines.length === 0 && trim.basis !== 'yours') noteUsualThrust(p);
  const tilt = tiltAnswer(trim.valueDeg, question.target.attitudeDeg, setTilt(question, scale, n), scale);
  const scene = sceneOf(p, n);
  const wanted = sidesOf(question.wanted);
  const at = (numbers: FitNumbers, stateScene = scene) => {
    const sides = clearanceFor(p, numbers, stateScene, tilt.setDeg);
    const clear = sides !== null && wanted.every((side) => sides[side].verdict === 'clear');
    return { sides, window: sides && windowFor(p, numbers, stateScene, tilt.setDeg, wanted, clear) };
  };
  const { sides, window } = at(n);
  const clearance = clearanceAnswer(sides, window);
  const states = (question.alsoAt ?? []).map(({ label, speedKn, motorTrimDeg }) => {
    const numbers = motorTrimDeg === undefined ? n : withMotorTrim(p, n, motorTrimDeg);
    const state: Running = { speedKn, water: running.water, own: own && speedKn === running.speedKn ? own : null };
    const stateTrim = trimAnswer(trimFor(p, numbers, state, trimPointsOf(p, ownPoint(question, own, n))));
    const there = at(numbers, motorTrimDeg === undefined ? scene : sceneOf(p, numbers));
    return { label, trim: stateTrim, attitudeDeg: tilt.setDeg + stateTrim.valueDeg, clearance: clearanceAnswer(there.sides, there.window) };
  });
  const judgement = judge({
    faults: geometryFaults(p, scene, degToRad(tilt.setDeg), mmToM(n.transducer.sideApertureMm)),
    sides,
    wanted,
    trim,
    tilt,
    reach: reachOf(p, n, sides, wanted, tilt.setDeg, clearance.nearestClearTiltDeg, scale),
  });
  const cautions: CautionCode[] = ['estimate-only'];
  if (p.parts.mount?.kind !== 'bow-motor' && p.parts.mount?.kind !== 'pole') cautions.push('holes-can-sink');
  if (p.engines.length > 0) cautions.push('engine-off');
  if (sides && wanted.some((side) => isNear(sides[side]))) cautions.push('near-a-part');
  if (trim.basis === 'class') cautions.push('trim-is-class-value');
  const said = rounded({
    ...judgement,
    compatibility: [],
    trim,
    tilt,
    clearance,
    flow: [],
    states,
    dominantInput: null,
    nextMeasurement: null,
    assumptions: p.assumptions,
    cautions: cautions.map((code) => coded(cautionCodes, code)),
  });
  const ref = question.ref === undefined ? {} : { ref: question.ref };
  return { ...ref, ...said, answerDigest: digestOf(said), engineVersion, edition: context.edition };
}

/** The scale of a mount on the transom; null without one. */
function tiltScaleOf(p: Prepared, n: FitNumbers): TiltScale | null {
  if (p.forwardMm !== null || !p.parts.mount) return null;
  return { transomAngleDeg: n.hull.transomAngleDeg, ...fillTiltScale(p.parts.mount, p.assumptions) };
}

function setTilt({ placement }: FitQuestion, scale: TiltScale | null, n: FitNumbers): number | null {
  if (placement.tiltDeg !== undefined) return placement.tiltDeg;
  if (placement.bracketSettingDeg === undefined) return null;
  return placement.bracketSettingDeg + (scale?.transomAngleDeg ?? n.hull.transomAngleDeg) + (scale?.zeroDeg ?? 0);
}

function ownTrim({ running }: FitQuestion, p: Prepared): Running['own'] {
  if (running.measuredTrimDeg === undefined) return null;
  if (running.measuredSigmaDeg === undefined) {
    const why = 'Usual scatter of a careful set of runs.';
    p.assumptions.push({ field: 'running.measuredSigmaDeg', value: usualOwnSigmaDeg, sigma: null, why });
  }
  return { trimDeg: running.measuredTrimDeg, sigmaDeg: running.measuredSigmaDeg ?? usualOwnSigmaDeg };
}

function noteUsualThrust(p: Prepared): void {
  const why = 'No motor was named: thrust is taken along the keel line, a propeller’s depth below it.';
  p.assumptions.push({ field: 'lowerUnits', value: 'none', sigma: null, why });
}

/** The owner's measurement as a point of the curve for other speeds. */
function ownPoint(question: FitQuestion, own: Running['own'], n: FitNumbers) {
  if (!own) return null;
  return {
    speedMps: knToMps(question.running.speedKn),
    trimRad: degToRad(own.trimDeg),
    sigmaRad: degToRad(own.sigmaDeg),
    runs: 1,
    massKg: n.hull.loadedMassKg,
    motorTrimRad: n.engines[0] ? degToRad(n.engines[0].motorTrimDeg) : null,
  };
}

/** Main motors at another trim; where there are none, every engine. */
function withMotorTrim(p: Prepared, n: FitNumbers, motorTrimDeg: number): FitNumbers {
  const isMain = (i: number) => ['outboard', 'sterndrive'].includes(p.parts.lowerUnits[i]?.drive ?? '');
  const none = !n.engines.some((_, i) => isMain(i));
  return { ...n, engines: n.engines.map((engine, i) => (none || isMain(i) ? { ...engine, motorTrimDeg } : engine)) };
}
