import { describe, expect, it } from 'vitest';
import { degToRad, knToMps, radToDeg, waters } from '../units.ts';
import { estimatedTrim, smoothstep, type TrimHull, volumeFroude } from './estimated-trim.ts';
import { runningTrim, type TrimPoint, type TrimQuestion } from './running-trim.ts';
import { planingTrim, thrustAt, withTabs } from './savitsky.ts';

const hull: TrimHull = {
  planing: true,
  massKg: 420,
  lcgM: 1.6,
  vcgM: 0.37,
  chineBeamM: 1.38,
  deadriseRad: degToRad(12),
  staticTrimRad: degToRad(0.5),
};
const line = { forwardM: -0.4, upM: -0.17, motorTrimRad: 0 };
const water = waters.fresh;
const at = (speedKn: number, points: readonly TrimPoint[] = [], changes: Partial<TrimQuestion> = {}) =>
  runningTrim({ hull, line, speedMps: knToMps(speedKn), water, own: null, points, ...changes });
const estimateDeg = (speedKn: number) => radToDeg(estimatedTrim(hull, line, knToMps(speedKn), water).value);
const point = (speedKn: number, trimDeg: number): TrimPoint => ({
  speedMps: knToMps(speedKn),
  trimRad: degToRad(trimDeg),
  sigmaRad: degToRad(0.4),
  runs: 3,
  massKg: 420,
  motorTrimRad: 0,
});

describe('estimated running trim', () => {
  it('floats at its static trim below a volume Froude number of 0.8', () => {
    const slow = estimatedTrim(hull, line, knToMps(3), water);
    expect(volumeFroude(knToMps(3), 420, water)).toBeLessThan(0.8);
    expect([slow.value, slow.sigma, slow.basis]).toEqual([degToRad(0.5), degToRad(1), 'estimated']);
  });

  it('planes as Savitsky says above 1.8, and lies between the two on the way', () => {
    const fast = estimatedTrim(hull, line, knToMps(15), water);
    expect(volumeFroude(knToMps(15), 420, water)).toBeGreaterThan(1.8);
    expect(fast.value).toBe(planingTrim(hull, thrustAt(hull, -0.4, -0.17, -0), knToMps(15), water)?.trimRad);
    const between = knToMps(1.3 * (3.6 / 1.852) * Math.sqrt(9.80665 * Math.cbrt(420 / 999)));
    expect(volumeFroude(between, 420, water)).toBeCloseTo(1.3, 9);
    const planing = planingTrim(hull, thrustAt(hull, -0.4, -0.17, 0), between, water);
    expect(estimatedTrim(hull, line, between, water).value).toBeCloseTo((degToRad(0.5) + (planing?.trimRad ?? 0)) / 2, 9);
  });

  it('lifts the bow with the motor trimmed out', () => {
    const out = estimatedTrim(hull, { ...line, motorTrimRad: degToRad(8) }, knToMps(18), water);
    expect(radToDeg(out.value)).toBeGreaterThan(estimateDeg(18));
  });

  it('is less sure when the motor trim under way is not known', () => {
    const unknown = estimatedTrim(hull, { ...line, motorTrimRad: null }, knToMps(18), water);
    expect(radToDeg(unknown.sigma)).toBeCloseTo(Math.SQRT2, 9);
    expect(unknown.flags).toContain('motor-trim-unknown');
  });

  it.each([
    [3, 1],
    [9, 7],
    [20, 4],
  ])('takes the class value where no theory applies: at %i kn %i°', (speedKn, trimDeg) => {
    const classValue = estimatedTrim({ ...hull, planing: false }, line, knToMps(speedKn), water);
    expect([radToDeg(classValue.value), radToDeg(classValue.sigma), classValue.basis]).toEqual([
      expect.closeTo(trimDeg, 9),
      expect.closeTo(2, 9),
      'class',
    ]);
  });

  it('steps smoothly', () => expect([smoothstep(-1), smoothstep(0.5), smoothstep(2)]).toEqual([0, 0.5, 1]));
});

describe('running trim', () => {
  it('believes the owner first', () => {
    const own = { trimRad: degToRad(5), sigmaRad: degToRad(0.4) };
    const trim = at(15, [point(15, 3)], { own });
    expect([radToDeg(trim.value), radToDeg(trim.sigma), trim.basis]).toEqual([expect.closeTo(5, 9), expect.closeTo(0.5, 9), 'yours']);
  });

  it('goes through measured points', () => {
    const points = [point(12, estimateDeg(12) + 0.8), point(18, estimateDeg(18) - 0.6)];
    const there = at(12, points);
    expect(radToDeg(there.value)).toBeCloseTo(estimateDeg(12) + 0.8, 9);
    expect([there.basis, radToDeg(there.sigma)]).toEqual(['measured', expect.closeTo(0.5, 6)]);
    const between = radToDeg(at(15, points).value) - estimateDeg(15);
    expect(between).toBeLessThan(0.8);
    expect(between).toBeGreaterThan(-0.6);
    expect(at(15, points).basis).toBe('blended');
  });

  it('lets a measurement fade by e every half unit of volume Froude number past the range', () => {
    const points = [point(15, estimateDeg(15) + 1)];
    const froude = (speedKn: number) => volumeFroude(knToMps(speedKn), 420, water);
    const trim = at(18, points);
    expect(radToDeg(trim.value) - estimateDeg(18)).toBeCloseTo(Math.exp(-(froude(18) - froude(15)) / 0.5), 9);
    expect(trim.flags).toContain('outside-measured-range');
  });

  it('carries a measurement made at another load over by its residual there', () => {
    const heavy = { ...point(15, 0), massKg: 520 };
    const residual = 0.9;
    const estimate = radToDeg(estimatedTrim({ ...hull, massKg: 520 }, line, knToMps(15), water).value);
    const trim = at(15, [{ ...heavy, trimRad: degToRad(estimate + residual) }]);
    const apart = volumeFroude(knToMps(15), 420, water) - volumeFroude(knToMps(15), 520, water);
    expect(radToDeg(trim.value) - estimateDeg(15)).toBeCloseTo(residual * Math.exp(-apart / 0.5), 9);
  });

  it('does not bend a far-off measurement onto the estimate, but uses it where it was made', () => {
    const points = [point(15, estimateDeg(15) + 4)];
    const there = at(15, points);
    expect(radToDeg(there.value)).toBeCloseTo(estimateDeg(15) + 4, 9);
    expect(there.flags).toContain('measurement-disagrees');
    expect(radToDeg(at(19, points).value)).toBeCloseTo(estimateDeg(19), 9);
  });

  it('uses a measured curve alone where only a class value stands beneath', () => {
    const flat = { ...hull, planing: false };
    const trim = at(12, [point(9, 2.6), point(15, 2.6)], { hull: flat });
    expect([radToDeg(trim.value), trim.basis]).toEqual([expect.closeTo(2.6, 9), 'measured']);
  });
});

describe('trim tabs (Savitsky & Brown 1976)', () => {
  it('lower the bow', () => {
    const tabs = { chordM: 0.23, spanRatio: 0.4, deflectionRad: degToRad(5) };
    const speedMps = knToMps(18);
    const thrust = thrustAt(hull, -0.4, -0.17, 0);
    const bare = planingTrim(hull, thrust, speedMps, water)?.trimRad ?? Number.NaN;
    expect(planingTrim(withTabs(hull, tabs, speedMps, water), thrust, speedMps, water)?.trimRad).toBeLessThan(bare);
    expect(withTabs(hull, { ...tabs, deflectionRad: 0 }, speedMps, water)).toEqual({ ...hull, lcgM: expect.closeTo(1.6, 12) });
  });

  it('lift 0.046 a degree', () => {
    const tabs = { chordM: 0.2, spanRatio: 0.5, deflectionRad: degToRad(10) };
    const liftKg = hull.massKg - withTabs(hull, tabs, 8, water).massKg;
    expect(liftKg * 9.80665).toBeCloseTo(0.046 * 0.2 * 10 * 0.5 * 1.38 * 0.5 * 999 * 64, 6);
  });
});
