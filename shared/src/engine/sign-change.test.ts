import { describe, expect, it } from 'vitest';
import { signChange } from './sign-change.ts';

describe('sign change', () => {
  it.each([
    ['cube root of 2', (x: number) => x ** 3 - 2, 0, 3, 2 ** (1 / 3)],
    ['fixed point of the cosine', (x: number) => Math.cos(x) - x, 0, 2, 0.7390851332151607],
    ['a line', (x: number) => 4 - 2 * x, -10, 7, 2],
    ['a flat ninth power', (x: number) => (x - 1) ** 9, 0, 3.3, 1],
  ])('finds %s', (_, f, from, to, root) => {
    expect(Math.abs(signChange(f, from, f(from), to, f(to)) - root)).toBeLessThan(1e-12);
  });

  it('takes few steps on a smooth function', () => {
    let calls = 0;
    const f = (x: number) => {
      calls++;
      return Math.exp(x) - 5;
    };
    signChange(f, 0, -4, 4, Math.exp(4) - 5);
    expect(calls).toBeLessThan(16);
  });
});
