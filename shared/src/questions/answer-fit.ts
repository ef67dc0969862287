// The whole check: parts and settings in, one answer out. Runs the same in the page and on the server.
import { type CautionCode, cautionCodes, coded } from '../engine/codes.ts';
import { surelyBlockedFrom } from '../engine/thresholds.ts';
import { interval90 } from '../engine/uncertainty.ts';
import { degToRad, mmToM } from '../engine/units.ts';
import { engineVersion } from '../engine/version.ts';
import type { FitAnswer, FitQuestion } from '../schemas/fit.ts';
import { compatibilityOutcomes } from './compatibility.ts';
import { type Running, sceneOf, trimPointsOf, widenedTrim } from './evaluate.ts';
import { fillTiltScale } from './fill-sensor.ts';
import { flowOutcomes } from './flow-rules.ts';
import { geometryFaults } from './geometry-faults.ts';
import { hingesOf } from './next-measurement.ts';
import type { AnswerContext, ResolvedParts } from './parts.ts';
import { type FitNumbers, middleNumbers, type Prepared, prepare } from './prepare.ts';
import { reTiltGains } from './re-tilt.ts';
import { type Reach, reachOf } from './reach.ts';
import { clearanceAnswer, digestOf, rounded, sidesOf, type TiltScale, tiltAnswer, trimAnswer } from './reply.ts';
import { oddsOf, sampleClearance, sampleTrim } from './sampling.ts';
import { clearanceAt, otherStates, ownTrim } from './states.ts';
import { isNear, judge } from './verdict.ts';

/**
 * Answers a parsed question whose parts have been looked up. Pure: the same in gives the same out.
 * `uncertainty` left out means sampled; a batch says none for its lines.
 */
export function answerFit(question: FitQuestion, parts: ResolvedParts, context: AnswerContext): FitAnswer {
  const { placement, running, target } = question;
  const sampled = question.uncertainty !== 'none';
  const p = prepare(parts, placement, question.lowerUnits, question.obstacles ?? [], running.loadedMassKg);
  const n = middleNumbers(p);
  const scale = tiltScaleOf(p, n);
  const now: Running = { speedKn: running.speedKn, water: running.water, own: ownTrim(running, p) };
  const points = trimPointsOf(p, null);
  const trim = trimAnswer(widenedTrim(p, n, now, points));
  if (p.engines.length === 0 && trim.basis !== 'yours') noteUsualThrust(p);
  const trims = sampled ? sampleTrim(p, n, now, points) : null;
  const tiltInterval = trims && mirrored(interval90(trims.values), target.attitudeDeg);
  const tilt = tiltAnswer(trim.valueDeg, target.attitudeDeg, setTilt(question, scale, n), scale, tiltInterval);
  const wanted = sidesOf(question.wanted);
  const scene = sceneOf(p, n);
  const here = clearanceAt(p, n, scene, tilt.setDeg, wanted, sampled);
  const { sides, window, odds } = here;
  const clearance = clearanceAnswer(sides, window, odds);
  const reach = reachOf(p, n, sides, wanted, tilt.setDeg, clearance.nearestClearTiltDeg, scale);
  const states = otherStates(question, p, n, tilt.setDeg, wanted, here, sampled);
  const compatibility = compatibilityOutcomes(question, p, n, tilt);
  const flow = flowOutcomes(question, p, n, scene, tilt.setDeg, [tilt.attitudeDeg, ...states.map(({ attitudeDeg }) => attitudeDeg)]);
  const judgement = judge({
    faults: geometryFaults(p, scene, degToRad(tilt.setDeg), mmToM(n.transducer.sideApertureMm)),
    sides,
    odds,
    wanted,
    tilt,
    reTiltGains: reTiltGains(p, n, scene, sides, wanted, trim, tilt),
    reach: { ...reach, unblocked: reach.unblocked || (sampled && maybeUnblocked(p, reach, wanted)) },
    rules: {
      no: compatibility.some(({ outcome }) => outcome === 'no'),
      caution: [...compatibility, ...flow].some(({ rule, outcome }) => outcome === 'caution' && rule !== 'tilt-range'),
    },
  });
  const hinges = trims
    ? hingesOf(p, n, now, points, target.attitudeDeg, trims, here.samples, wanted)
    : { dominantInput: null, nextMeasurement: null };
  const cautions: CautionCode[] = ['estimate-only'];
  if (p.parts.mount?.kind !== 'bow-motor' && p.parts.mount?.kind !== 'pole') cautions.push('holes-can-sink');
  if (p.engines.length > 0) cautions.push('engine-off');
  cautions.push('fuse-near-battery');
  // Whoever is told to measure the running angle is told how to do it unharmed.
  if (trim.basis === 'class' || hinges.nextMeasurement?.name === 'running.measuredTrimDeg') cautions.push('measuring-under-way');
  if (sides && wanted.some((side) => isNear(sides[side]))) cautions.push('near-a-part');
  if (trim.basis === 'class') cautions.push('trim-is-class-value');
  const said = rounded({
    ...judgement,
    compatibility,
    trim,
    tilt,
    clearance,
    flow,
    states,
    ...hinges,
    assumptions: p.assumptions,
    cautions: cautions.map((code) => coded(cautionCodes, code)),
  });
  const ref = question.ref === undefined ? {} : { ref: question.ref };
  return { ...ref, ...said, answerDigest: digestOf(said), engineVersion, edition: context.edition };
}

/** An interval of the trim as an interval of the tilt that gives the target. */
const mirrored = ([low, high]: [number, number], targetDeg: number): [number, number] => [targetDeg - high, targetDeg - low];

/** Whether the draws leave it open that the most open setting within reach is not blocked. */
function maybeUnblocked(p: Prepared, { best }: Reach, wanted: ReturnType<typeof sidesOf>): boolean {
  if (!best) return false;
  const samples = sampleClearance(p, best.numbers, best.tiltDeg, wanted);
  return wanted.every((side) => oddsOf(samples[side]).probabilityBlocked < surelyBlockedFrom);
}

/** The scale of a mount on the transom; null without one. */
function tiltScaleOf(p: Prepared, n: FitNumbers): TiltScale | null {
  if (p.forwardMm !== null || !p.parts.mount) return null;
  return { transomAngleDeg: n.hull.transomAngleDeg, ...fillTiltScale(p.parts.mount, p.assumptions) };
}

function setTilt({ placement }: FitQuestion, scale: TiltScale | null, n: FitNumbers): number | null {
  if (placement.tiltDeg !== undefined) return placement.tiltDeg;
  if (placement.bracketSettingDeg === undefined) return null;
  // Off the transom there is no face to be square to: the setting is the tilt.
  if (placement.forwardMm !== undefined) return placement.bracketSettingDeg;
  return placement.bracketSettingDeg + (scale?.transomAngleDeg ?? n.hull.transomAngleDeg) + (scale?.zeroDeg ?? 0);
}

function noteUsualThrust(p: Prepared): void {
  const why = 'No motor was named: thrust is taken along the keel line, a propeller’s depth below it.';
  p.assumptions.push({ field: 'lowerUnits', value: 'none', sigma: null, why });
}
