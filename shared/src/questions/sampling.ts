// The same questions put to the engine many times, every uncertain input drawn anew.
import type { Side } from '../engine/beams/fan.ts';
import { fanOf } from '../engine/beams/fan.ts';
import { seenAll } from '../engine/beams/seen-solid.ts';
import { slabShare } from '../engine/beams/slab.ts';
import { clearFrom, shadedFrom } from '../engine/thresholds.ts';
import type { TrimPoint } from '../engine/trim/running-trim.ts';
import { interval90, normalScores, shareOfVariance, varianceOf } from '../engine/uncertainty.ts';
import { degToRad, radToDeg } from '../engine/units.ts';
import * as input from '../engine-input.ts';
import { type Running, sceneOf, trimFor } from './evaluate.ts';
import { runningTrimInput } from './how-to-measure.ts';
import type { FitNumbers, Prepared } from './prepare.ts';
import { drawnNumbers, setTiltSigmaDeg, type UncertainInput, uncertainInputs } from './uncertain-inputs.ts';

/** How many draws a sampled answer takes. */
export const draws = 128;

/** Draws of an answer beside the draws of the inputs it came from. */
export interface Sample {
  values: Float64Array;
  /** Standard normal draws by input name. */
  inputs: ReadonlyMap<string, Float64Array>;
}

/** Draws of the running trim, degrees: its inputs and the error of the method itself, which is the input `running.measuredTrimDeg`. */
export function sampleTrim(
  p: Prepared,
  n: FitNumbers,
  running: Running,
  points: readonly TrimPoint[],
  known: Readonly<Record<string, number>> = {},
): Sample {
  const bearing = uncertainInputs(p).filter(({ bears }) => bears.trim);
  const scores = normalScores(bearing.length + 1, draws);
  const narrowed = bearing.map((one) => ({ ...one, sigma: Math.min(one.sigma, known[one.name] ?? Number.POSITIVE_INFINITY) }));
  const middle = trimFor(p, n, running, points);
  const ownScores = scores[bearing.length] as Float64Array;
  const trimKnown = known[runningTrimInput];
  const values = new Float64Array(draws);
  for (let draw = 0; draw < draws; draw++) {
    const score = ownScores[draw] as number;
    if (trimKnown !== undefined) values[draw] = radToDeg(middle.value) + trimKnown * score;
    else if (running.own) values[draw] = radToDeg(middle.value + middle.sigma * score);
    else values[draw] = radToDeg(trimFor(p, drawnNumbers(n, narrowed, scores, draw), running, points).value + middle.sigma * score);
  }
  const inputs = running.own ? [] : bearing.map(({ name }, k) => [name, scores[k] as Float64Array] as const);
  return { values, inputs: new Map([...inputs, [runningTrimInput, ownScores]]) };
}

/** Draws of the clear share of each side at a tilt. */
export function sampleClearance(p: Prepared, n: FitNumbers, tiltDeg: number, sides: readonly Side[]): Record<Side, Sample> {
  const bearing: UncertainInput[] = uncertainInputs(p).filter(({ bears }) => bears.clearance);
  const scores = normalScores(bearing.length + 1, draws);
  const tiltScores = scores[bearing.length] as Float64Array;
  const inputs = new Map([
    ...bearing.map(({ name }, k) => [name, scores[k] as Float64Array] as const),
    ['placement.tiltDeg', tiltScores] as const,
  ]);
  const port = { values: new Float64Array(draws), inputs };
  const starboard = { values: new Float64Array(draws), inputs };
  const samples = { port, starboard };
  for (let draw = 0; draw < draws; draw++) {
    const drawn = drawnNumbers(n, bearing, scores, draw);
    const { solids, poseAt } = sceneOf(p, drawn);
    const element = input.sideElement(p.parts.transducer, drawn.transducer);
    const fan = fanOf(element);
    const seen = seenAll(poseAt(degToRad(tiltDeg + setTiltSigmaDeg * (tiltScores[draw] as number))), solids);
    for (const side of sides) samples[side].values[draw] = slabShare(seen, element, fan, side);
  }
  return samples;
}

/** What a side's draws say. */
export interface SideOdds {
  probabilityClear: number;
  probabilityBlocked: number;
  interval90: [number, number];
}

export function oddsOf({ values }: Sample): SideOdds {
  const share = (within: (value: number) => boolean) => values.reduce((count, value) => count + (within(value) ? 1 : 0), 0) / values.length;
  return {
    probabilityClear: share((value) => value >= clearFrom),
    probabilityBlocked: share((value) => value < shadedFrom),
    interval90: interval90(values),
  };
}

/** The input whose draws go along most with the answer's; null where the answer does not move. */
export function dominantOf({ values, inputs }: Sample): { name: string; shareOfVariance: number } | null {
  if (!(varianceOf(values) > 1e-12)) return null;
  let best: { name: string; shareOfVariance: number } | null = null;
  for (const [name, scores] of inputs) {
    const share = shareOfVariance(scores, values);
    if (share > (best?.shareOfVariance ?? 0)) best = { name, shareOfVariance: share };
  }
  return best;
}
