import { describe, expect, it } from 'vitest';
import { parseQuantity } from './parse-quantity.ts';
import type { UnitChoice } from './unit-choice.ts';

const metric: UnitChoice = { length: 'mm', speed: 'kn', mass: 'kg' };
const inches: UnitChoice = { length: 'in', speed: 'mph', mass: 'lb' };

function value(text: string, quantity: Parameters<typeof parseQuantity>[1], units = metric): number | null {
  const parsed = parseQuantity(text, quantity, units);
  if (!parsed.ok) throw new Error(parsed.message);
  return parsed.value;
}

describe('what a person types', () => {
  it.each([
    ['380', 'lengthMm', 380],
    ['15 in', 'lengthMm', 381],
    ['50.8cm', 'lengthMm', 508],
    ['20 1/2 in', 'lengthMm', 520.7],
    ['16\' 8"', 'lengthM', 5.08],
    ['5.08\u00a0m', 'lengthM', 5.08],
    ['−4', 'angleDeg', -4],
    ['4.1°', 'angleDeg', 4.1],
    ['18.52 km/h', 'speedKn', 10],
    ['1000 lb', 'massKg', 453.59237],
  ] as const)('%s is read', (text, quantity, expected) => {
    expect(value(text, quantity)).toBeCloseTo(expected, 6);
  });

  it('takes a bare number in the chosen unit: 15 in, 16.5 ft, 10 mph', () => {
    expect(value('15', 'lengthMm', inches)).toBeCloseTo(381, 9);
    expect(value('16.5', 'lengthM', inches)).toBeCloseTo(5.0292, 9);
    // 10 statute miles are 16.09344 km, 8.68976 nautical miles.
    expect(value('10', 'speedKn', inches)).toBeCloseTo(8.68976, 5);
  });

  it('reads back what the screen itself writes', () => {
    expect(value('16\u00a0ft 8\u00a0in', 'lengthM', inches)).toBeCloseTo(5.08, 9);
    expect(value('−4.1°', 'angleDeg')).toBe(-4.1);
  });

  it('takes a dash, "?" and nothing for "not known"', () => {
    for (const text of ['', ' ', '–', '?']) expect(value(text, 'massKg')).toBeNull();
  });

  it('refuses in words what could mean two things, and what measures something else', () => {
    expect(parseQuantity('1,234', 'lengthMm', metric)).toMatchObject({ ok: false, message: expect.stringContaining('could mean') });
    expect(parseQuantity('20 kg', 'lengthMm', metric)).toMatchObject({ ok: false, message: expect.stringContaining('measure') });
    expect(parseQuantity('about 20', 'lengthMm', metric)).toMatchObject({ ok: false });
  });
});
