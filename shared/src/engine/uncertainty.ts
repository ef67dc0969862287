// What uncertain inputs make of an answer: a fixed, well spread sample, and plain statistics of it.

/**
 * Standard normal quantile, 0 < p < 1 (Wichura 1988, algorithm AS 241, Applied Statistics 37(3), 477–484; about 7 digits: PPND7).
 */
export function normalQuantile(p: number): number {
  const q = p - 0.5;
  if (Math.abs(q) <= 0.425) {
    const r = 0.180625 - q * q;
    return (
      (q * (((59.10937472 * r + 159.29113202) * r + 50.434271938) * r + 3.3871327179)) /
      (((67.1875636 * r + 78.757757664) * r + 17.895169469) * r + 1)
    );
  }
  let r = Math.sqrt(-Math.log(q < 0 ? p : 1 - p));
  let tail: number;
  if (r <= 5) {
    r -= 1.6;
    tail = (((0.17023821103 * r + 1.3067284816) * r + 2.75681539) * r + 1.4234372777) / ((0.12021132975 * r + 0.7370016425) * r + 1);
  } else {
    r -= 5;
    tail = (((0.017337203997 * r + 0.42868294337) * r + 3.081226386) * r + 6.657905115) / ((0.012258202635 * r + 0.24197894225) * r + 1);
  }
  return q < 0 ? -tail : tail;
}

/** Whole-number hash that spreads its input over 32 bits (Steele, Lea & Flood 2014, as in mulberry32). */
function mixed(state: number): number {
  let t = state >>> 0;
  t = Math.imul(t ^ (t >>> 15), t | 1);
  t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
  return (t ^ (t >>> 14)) >>> 0;
}

/**
 * Standard normal scores for a Latin hypercube (McKay, Beckman & Conover 1979): every dimension has one draw in each of `draws`
 * equally likely slices, in an order that depends on the dimension's number alone. The same every time. One array a dimension.
 */
export function normalScores(dimensions: number, draws: number): Float64Array[] {
  const slices = Float64Array.from({ length: draws }, (_, i) => normalQuantile((i + 0.5) / draws));
  return Array.from({ length: dimensions }, (_, dimension) => {
    const order = slices.slice();
    for (let i = draws - 1; i > 0; i--) {
      const j = mixed(Math.imul(dimension + 1, 0x9e3779b1) + Math.imul(i, 0x85ebca6b)) % (i + 1);
      const kept = order[i] as number;
      order[i] = order[j] as number;
      order[j] = kept;
    }
    return order;
  });
}

/** Value below which a share of the sample lies; between two of them, linear (Hyndman & Fan 1996, type 7). Share 0 to 1. */
export function sampleQuantile(sample: ArrayLike<number>, share: number): number {
  const sorted = Float64Array.from(sample).sort();
  const at = share * (sorted.length - 1);
  const low = Math.floor(at);
  const below = sorted[low] as number;
  const above = sorted[Math.min(sorted.length - 1, low + 1)] as number;
  return below + (above - below) * (at - low);
}

/** The middle 90 % of a sample. */
export function interval90(sample: ArrayLike<number>): [number, number] {
  return [sampleQuantile(sample, 0.05), sampleQuantile(sample, 0.95)];
}

export function meanOf(sample: ArrayLike<number>): number {
  let sum = 0;
  for (let i = 0; i < sample.length; i++) sum += sample[i] as number;
  return sum / sample.length;
}

/** Mean squared deviation from the mean. */
export function varianceOf(sample: ArrayLike<number>): number {
  const mean = meanOf(sample);
  let sum = 0;
  for (let i = 0; i < sample.length; i++) sum += ((sample[i] as number) - mean) ** 2;
  return sum / sample.length;
}

/** Squared correlation of an input's draws with the answer's: the share of the answer's variance that goes along with it; 0 where either stands still. */
export function shareOfVariance(input: ArrayLike<number>, answer: ArrayLike<number>): number {
  const meanIn = meanOf(input);
  const meanOut = meanOf(answer);
  let together = 0;
  for (let i = 0; i < input.length; i++) together += ((input[i] as number) - meanIn) * ((answer[i] as number) - meanOut);
  const spread = varianceOf(input) * varianceOf(answer);
  return spread > 0 ? (together / input.length) ** 2 / spread : 0;
}
