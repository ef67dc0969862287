import { describe, expect, it } from 'vitest';
import { interval90, normalQuantile, normalScores, sampleQuantile, shareOfVariance, varianceOf } from './uncertainty.ts';

describe('normal quantile', () => {
  // Tables of the normal distribution.
  it.each([
    [0.5, 0],
    [0.95, 1.6448536],
    [0.975, 1.959964],
    [0.995, 2.5758293],
    [0.05, -1.6448536],
    [1e-6, -4.7534243],
  ])('of %f is %f', (p, z) => expect(normalQuantile(p)).toBeCloseTo(z, 5));
});

describe('normal scores', () => {
  const scores = normalScores(40, 128);

  it('are the same every time', () => expect(normalScores(40, 128)).toEqual(scores));

  it('have one draw in every slice of every dimension', () => {
    const sorted = Array.from(scores[0] as Float64Array).sort((a, b) => a - b);
    for (const one of scores) expect(Array.from(one).sort((a, b) => a - b)).toEqual(sorted);
    expect(varianceOf(sorted)).toBeGreaterThan(0.95);
    expect(varianceOf(sorted)).toBeLessThan(1.01);
  });

  it('hardly go along with each other', () => {
    let worst = 0;
    for (let i = 0; i < 40; i++) {
      for (let j = 0; j < i; j++) worst = Math.max(worst, shareOfVariance(scores[i] as Float64Array, scores[j] as Float64Array));
    }
    // 780 pairs of 128 independent draws: the greatest squared correlation lies near 0.08.
    expect(worst).toBeLessThan(0.16);
  });
});

describe('quantiles of a sample', () => {
  it('lie between the values', () => {
    expect(sampleQuantile([4, 1, 3, 2], 0.5)).toBe(2.5);
    expect(sampleQuantile([4, 1, 3, 2], 0)).toBe(1);
    expect(sampleQuantile([4, 1, 3, 2], 1)).toBe(4);
  });
  it('bound the middle 90 %', () => {
    const [low, high] = interval90(Array.from({ length: 101 }, (_, i) => i));
    expect(low).toBeCloseTo(5, 12);
    expect(high).toBeCloseTo(95, 12);
  });
});

describe('share of variance', () => {
  it('is 1 for a line and 0 for a constant', () => {
    expect(shareOfVariance([1, 2, 3], [5, 3, 1])).toBeCloseTo(1, 12);
    expect(shareOfVariance([1, 2, 3], [7, 7, 7])).toBe(0);
  });
});
