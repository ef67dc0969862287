import { describe, expect, it } from 'vitest';
import { formatEstimate, formatNumber, formatQuantity, formatShare, formatTilt, formatYears, fromShown, toShown } from './format-units.ts';
import type { UnitChoice } from './unit-choice.ts';

const metric: UnitChoice = { length: 'mm', speed: 'kn', mass: 'kg' };
const inches: UnitChoice = { length: 'in', speed: 'mph', mass: 'lb' };

describe('numbers as a person reads them', () => {
  it('writes lengths in the chosen unit', () => {
    expect(formatQuantity(380, 'lengthMm', metric)).toBe('380\u00a0mm');
    expect(formatQuantity(508, 'lengthMm', inches)).toBe('20\u00a0in');
    expect(formatQuantity(12.7, 'lengthMm', inches)).toBe('0.5\u00a0in');
  });

  it('writes a boat of 16 ft 8 in (5.08 m) both ways', () => {
    expect(formatQuantity(5.08, 'lengthM', metric)).toBe('5.08\u00a0m');
    expect(formatQuantity(5.08, 'lengthM', inches)).toBe('16\u00a0ft 8\u00a0in');
    expect(formatQuantity(4.8768, 'lengthM', inches)).toBe('16\u00a0ft');
  });

  it('writes speeds: 10 kn are 18.52 km/h and 11.5 mph', () => {
    expect(formatQuantity(10, 'speedKn', { ...metric, speed: 'km/h' })).toBe('18.5\u00a0km/h');
    expect(formatQuantity(10, 'speedKn', inches)).toBe('11.5\u00a0mph');
    expect(formatQuantity(4, 'speedKn', metric)).toBe('4\u00a0kn');
  });

  it('gives back what it was given on the way there and back', () => {
    for (const quantity of ['lengthMm', 'lengthM', 'speedKn', 'massKg', 'angleDeg'] as const) {
      for (const units of [metric, inches]) expect(fromShown(toShown(7.3, quantity, units), quantity, units)).toBeCloseTo(7.3, 12);
    }
  });

  it('writes an uncertain angle with one decimal on both sides', () => {
    expect(formatEstimate(4.1, 1, 'angleDeg', metric)).toBe('4.1° ± 1.0');
    expect(formatEstimate(-4.06, 0.02, 'angleDeg', metric)).toBe('−4.1° ± under 0.1');
    expect(formatEstimate(8, null, 'angleDeg', metric)).toBe('8.0°');
    expect(formatEstimate(5.08, 0.0762, 'lengthM', inches)).toBe('16\u00a0ft 8\u00a0in ± 0.3\u00a0ft');
  });

  it('knows no minus zero', () => {
    expect(formatNumber(-0.04, 1)).toBe('0.0');
    expect(formatTilt(-0.04)).toBe('level with the keel, 0.0°');
  });

  it('says both words of the trade for a tilt', () => {
    expect(formatTilt(2)).toBe('nose-up 2.0° (heel-down 2.0°)');
    expect(formatTilt(-4.1)).toBe('nose-down 4.1° (heel-up 4.1°)');
  });

  it('keeps "all" and "nothing" for exactly that', () => {
    expect(formatShare(1)).toBe('100\u00a0%');
    expect(formatShare(0.998)).toBe('over 99\u00a0%');
    expect(formatShare(0.001)).toBe('under 1\u00a0%');
    expect(formatShare(0)).toBe('0\u00a0%');
  });

  it('writes model years', () => {
    expect(formatYears(2016, 2022)).toBe('2016 – 2022');
    expect(formatYears(2019, null)).toBe('since 2019');
    expect(formatYears(undefined, 2010)).toBe('until 2010');
    expect(formatYears(2018, 2018)).toBe('2018');
    expect(formatYears(null, undefined)).toBeNull();
  });
});
