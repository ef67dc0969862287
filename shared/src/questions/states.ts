// The states a question is asked at: as set, and at other speeds and motor trims.
import type { Side } from '../engine/beams/fan.ts';
import type { TiltWindow } from '../engine/beams/occlusion.ts';
import type { TrimPoint } from '../engine/trim/running-trim.ts';
import { degToRad, knToMps } from '../engine/units.ts';
import type { FitAnswer, FitQuestion } from '../schemas/fit.ts';
import { type BothSides, clearanceFor, type Running, type Scene, sceneOf, trimPointsOf, widenedTrim, windowFor } from './evaluate.ts';
import type { FitNumbers, Prepared } from './prepare.ts';
import { clearanceAnswer, trimAnswer } from './reply.ts';
import { oddsOf, type Sample, type SideOdds, sampleClearance } from './sampling.ts';

/** Clearance in one state, with what its draws say. */
export interface StateClearance {
  sides: BothSides | null;
  window: TiltWindow | null;
  odds: Record<Side, SideOdds> | null;
  samples: Record<Side, Sample> | null;
}

export const bothSides: readonly Side[] = ['port', 'starboard'];

export function clearanceAt(
  p: Prepared,
  n: FitNumbers,
  scene: Scene,
  setDeg: number,
  wanted: readonly Side[],
  sampled: boolean,
): StateClearance {
  const sides = clearanceFor(p, n, scene, setDeg);
  if (!sides) return { sides, window: null, odds: null, samples: null };
  const clear = wanted.every((side) => sides[side].verdict === 'clear');
  const window = windowFor(p, n, scene, setDeg, wanted, clear);
  if (!sampled) return { sides, window, odds: null, samples: null };
  const samples = sampleClearance(p, n, setDeg, bothSides);
  return { sides, window, odds: { port: oddsOf(samples.port), starboard: oddsOf(samples.starboard) }, samples };
}

/** Scatter of an owner's own measurement where none is stated, degrees (common practice, no source). */
const usualOwnSigmaDeg = 0.5;

/** The owner's own measurement at the question's speed; notes the scatter that had to be assumed. */
export function ownTrim(running: Pick<FitQuestion['running'], 'measuredTrimDeg' | 'measuredSigmaDeg'>, p: Prepared): Running['own'] {
  if (running.measuredTrimDeg === undefined) return null;
  if (running.measuredSigmaDeg === undefined) {
    const why = 'Usual scatter of a careful set of runs.';
    p.assumptions.push({ field: 'running.measuredSigmaDeg', value: usualOwnSigmaDeg, sigma: null, why });
  }
  return { trimDeg: running.measuredTrimDeg, sigmaDeg: running.measuredSigmaDeg ?? usualOwnSigmaDeg };
}

/** Answers for `alsoAt`, with the tilt left as it is set. */
export function otherStates(
  question: FitQuestion,
  p: Prepared,
  n: FitNumbers,
  setDeg: number,
  wanted: readonly Side[],
  here: StateClearance,
  sampled: boolean,
): FitAnswer['states'] {
  const own = ownPoint(question, n);
  return (question.alsoAt ?? []).map(({ label, speedKn, motorTrimDeg }) => {
    const numbers = motorTrimDeg === undefined ? n : withMotorTrim(p, n, motorTrimDeg);
    const there = motorTrimDeg === undefined ? here : clearanceAt(p, numbers, sceneOf(p, numbers), setDeg, wanted, sampled);
    const state: Running = { speedKn, water: question.running.water, own: null };
    const trim = trimAnswer(widenedTrim(p, numbers, state, trimPointsOf(p, own)));
    return { label, trim, attitudeDeg: setDeg + trim.valueDeg, clearance: clearanceAnswer(there.sides, there.window, there.odds) };
  });
}

/** The owner's measurement as a point of the curve for other speeds. */
function ownPoint({ running }: FitQuestion, n: FitNumbers): TrimPoint | null {
  if (running.measuredTrimDeg === undefined) return null;
  return {
    speedMps: knToMps(running.speedKn),
    trimRad: degToRad(running.measuredTrimDeg),
    sigmaRad: degToRad(running.measuredSigmaDeg ?? usualOwnSigmaDeg),
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
