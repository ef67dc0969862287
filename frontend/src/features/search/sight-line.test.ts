import { describe, expect, it } from 'vitest';
import { depressionDeg, hiddenByCircle, sectorPath } from './sight-line.ts';

describe('what a round part hides', () => {
  it('a circle of radius 1 at distance 2 straight abeam hides 30° to either side of level', () => {
    const { fromDeg, toDeg } = hiddenByCircle({ x: 2, y: 0 }, { x: 0, y: 0 }, 1);
    expect(fromDeg).toBeCloseTo(-30, 10);
    expect(toDeg).toBeCloseTo(30, 10);
  });

  it('a part as far below as it is to the side lies 45° down', () => {
    expect(depressionDeg({ x: 400, y: -100 }, { x: 0, y: 300 })).toBeCloseTo(45, 10);
  });

  it('opens a sector to the left from level to straight down', () => {
    expect(sectorPath({ x: 0, y: 0 }, 10, 0, 90, -1)).toBe('M0 0L-10.0 0.0A10 10 0 0 0 -0.0 10.0Z');
  });
});
