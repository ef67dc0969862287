import { describe, expect, it } from 'vitest';
import { axisTicks } from './axis-ticks.ts';

describe('marks on an axis', () => {
  it('stand at round numbers', () => {
    expect(axisTicks(0, 30, 7)).toEqual([0, 5, 10, 15, 20, 25, 30]);
    expect(axisTicks(-2, 6, 6)).toEqual([-2, 0, 2, 4, 6]);
    expect(axisTicks(0, 46.3, 5)).toEqual([0, 20, 40]);
  });

  it('are never more than asked for', () => {
    for (let high = 1; high < 120; high += 0.7) expect(axisTicks(0, high, 6).length).toBeLessThanOrEqual(6);
  });

  it('are one where there is nothing to divide', () => {
    expect(axisTicks(3, 3, 5)).toEqual([3]);
  });
});
