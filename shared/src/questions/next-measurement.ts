// What an answer hangs on, and which measurement would make it surer.
import type { Side } from '../engine/beams/fan.ts';
import type { TrimPoint } from '../engine/trim/running-trim.ts';
import { interval90, varianceOf } from '../engine/uncertainty.ts';
import type { FitAnswer } from '../schemas/fit.ts';
import type { Running } from './evaluate.ts';
import { howToMeasure, runningTrimInput } from './how-to-measure.ts';
import type { FitNumbers, Prepared } from './prepare.ts';
import { dominantOf, oddsOf, type Sample, sampleTrim } from './sampling.ts';

/** How well an owner can measure an angle or a length, one standard deviation. */
const measuredDeg = 0.5;
const measuredMm = 3;

/** Standard deviation left once an input is measured, in its own unit; null where a tape and a level do not measure it. */
function onceMeasured(name: string): number | null {
  if (name.endsWith('Deg')) return measuredDeg;
  if (name.endsWith('Mm')) return measuredMm;
  return name.endsWith('M') ? measuredMm / 1000 : null;
}

type Hinges = Pick<FitAnswer, 'dominantInput' | 'nextMeasurement'>;

/**
 * Where a wanted side may or may not be clear, its clear share is what matters, else the needed tilt. The next measurement is the input
 * that leaves the narrowest interval of the needed tilt, or where the beam matters, the one the clear share hangs on most.
 */
export function hingesOf(
  p: Prepared,
  n: FitNumbers,
  running: Running,
  points: readonly TrimPoint[],
  targetDeg: number,
  trim: Sample,
  beams: Record<Side, Sample> | null,
  wanted: readonly Side[],
): Hinges {
  const doubtful = beams ? wanted.map((side) => beams[side]).filter(isDoubtful) : [];
  const shakiest = doubtful.sort((a, b) => varianceOf(b.values) - varianceOf(a.values))[0];
  const dominantInput = dominantOf(shakiest ?? trim);
  const after = (name: string, sigma: number) => {
    const [low, high] = interval90(sampleTrim(p, n, running, points, { [name]: sigma }).values);
    return [targetDeg - high, targetDeg - low] as [number, number];
  };
  const proposal = (name: string, interval90DegAfter: [number, number]) => ({ name, how: howToMeasure(name), interval90DegAfter });
  if (shakiest) {
    const sigma = dominantInput && onceMeasured(dominantInput.name);
    return {
      dominantInput,
      nextMeasurement: dominantInput && sigma ? proposal(dominantInput.name, after(dominantInput.name, sigma)) : null,
    };
  }
  if (running.own) return { dominantInput, nextMeasurement: null };
  const width = ([low, high]: readonly [number, number]) => high - low;
  const [low, high] = interval90(trim.values);
  let best = { name: runningTrimInput, interval: after(runningTrimInput, measuredDeg) };
  const contender = dominantInput?.name;
  const sigma = contender && contender !== runningTrimInput ? onceMeasured(contender) : null;
  if (contender && sigma) {
    const interval = after(contender, sigma);
    if (width(interval) < width(best.interval)) best = { name: contender, interval };
  }
  const gains = width(best.interval) < high - low;
  return { dominantInput, nextMeasurement: gains ? proposal(best.name, best.interval) : null };
}

/** Neither surely clear nor surely not. */
function isDoubtful(sample: Sample): boolean {
  const { probabilityClear } = oddsOf(sample);
  return probabilityClear > 0.05 && probabilityClear < 0.95;
}
