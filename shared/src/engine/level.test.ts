import { describe, expect, it } from 'vitest';
import { angleOfShim, euroCoins, runningAngle, shimForAngle, stacksFor, usCoins, wedgeRise } from './level.ts';
import { degToRad, radToDeg } from './units.ts';

describe('a level on shims', () => {
  it('reads 2° with a shim of 20.9 mm under 600 mm', () => expect(radToDeg(angleOfShim(0.0209397, 0.6))).toBeCloseTo(2, 4));
  it('finds the shim back', () => expect(shimForAngle(angleOfShim(0.013, 0.5), 0.5)).toBeCloseTo(0.013, 12));
  it('refuses a shim longer than the level', () => expect(() => angleOfShim(0.7, 0.6)).toThrow(RangeError));
  it('rises 5.24 mm per 100 mm on a wedge of 3°', () => expect(100 * wedgeRise(degToRad(-3))).toBeCloseTo(5.2408, 4));
});

describe('runs under way', () => {
  const run = (shimMm: number) => ({ shimM: shimMm / 1000, contactLengthM: 0.6 });

  it('take the median and what the level reads on the trailer', () => {
    const { value, flags } = runningAngle([run(40), run(42), run(60)], degToRad(0.5), true);
    expect(value).toBeCloseTo(Math.asin(0.07) - degToRad(0.5), 12);
    expect(flags).toEqual([]);
  });
  it('are uncertain by half a millimetre a metre and their scatter', () => {
    expect(runningAngle([run(42), run(42), run(42)], 0, true).sigma).toBeCloseTo(0.0005, 12);
    const spread = runningAngle([run(36), run(42), run(48)], 0, true).sigma;
    expect(spread).toBeGreaterThan(0.005);
    expect(spread).toBeLessThan(0.007);
  });
  it('say when they are too few or in one direction', () => {
    expect(runningAngle([run(42)], 0, false).flags).toEqual(['fewer-than-three-runs', 'one-direction-only']);
  });
  it('are refused when there are none', () => expect(() => runningAngle([], 0, true)).toThrow(RangeError));
});

describe('stacks', () => {
  it('build 21 mm of plywood alone', () => {
    const [best] = stacksFor(21, usCoins);
    expect(best).toEqual({
      pieces: [
        { id: 'plywood-12', count: 1 },
        { id: 'plywood-6', count: 1 },
        { id: 'plywood-3', count: 1 },
      ],
      heightMm: 21,
      errorMm: 0,
    });
  });
  it.each([
    ['us', usCoins],
    ['euro', euroCoins],
  ])('come within half a millimetre of any height with %s coins', (_, coins) => {
    for (let heightMm = 3; heightMm <= 60; heightMm += 0.7) {
      const [best] = stacksFor(heightMm, coins);
      expect(Math.abs(best?.errorMm ?? 99)).toBeLessThanOrEqual(0.5);
    }
  });
});
