import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { convexOutline } from './convex-outline.ts';
import type { Point2 } from './views.ts';

describe('convex outline', () => {
  it('keeps the corners of a square and drops what lies inside or on its edges', () => {
    const outline = convexOutline([
      [0, 0],
      [2, 0],
      [1, 1],
      [2, 2],
      [0, 2],
      [1, 0],
      [0, 0],
    ]);
    expect(outline).toEqual([
      [0, 0],
      [2, 0],
      [2, 2],
      [0, 2],
    ]);
  });

  it('returns a line’s two ends and a single point unchanged', () => {
    expect(
      convexOutline([
        [0, 0],
        [1, 1],
      ]),
    ).toEqual([
      [0, 0],
      [1, 1],
    ]);
    expect(
      convexOutline([
        [3, 4],
        [3, 4],
      ]),
    ).toEqual([[3, 4]]);
  });

  it('leaves no point outside, whatever the points', () => {
    const coordinate = fc.integer({ min: -50, max: 50 });
    fc.assert(
      fc.property(fc.array(fc.tuple(coordinate, coordinate), { minLength: 3, maxLength: 40 }), (points) => {
        const outline = convexOutline(points);
        fc.pre(outline.length >= 3);
        for (const p of points) {
          outline.forEach((a, i) => {
            const b = outline[(i + 1) % outline.length] as Point2;
            expect((b[0] - a[0]) * (p[1] - a[1]) - (b[1] - a[1]) * (p[0] - a[0])).toBeGreaterThanOrEqual(0);
          });
        }
      }),
    );
  });
});
