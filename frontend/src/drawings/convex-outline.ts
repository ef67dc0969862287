import type { Point2 } from './views.ts';

/**
 * Smallest convex polygon around the points, counter-clockwise seen with v up.
 * Every solid of a lower unit is convex, so this is its outline in any parallel projection.
 * Fewer than three distinct points come back as they are. Monotone chain: Andrew 1979, Inf. Proc. Letters 9(5), 216-219.
 */
export function convexOutline(points: readonly Point2[]): Point2[] {
  const sorted = [...points].sort((a, b) => a[0] - b[0] || a[1] - b[1]);
  const distinct = sorted.filter((p, i) => i === 0 || p[0] !== sorted[i - 1]![0] || p[1] !== sorted[i - 1]![1]);
  if (distinct.length < 3) return distinct;
  const lower = halfOutline(distinct);
  const upper = halfOutline([...distinct].reverse());
  return [...lower.slice(0, -1), ...upper.slice(0, -1)];
}

function halfOutline(points: readonly Point2[]): Point2[] {
  const chain: Point2[] = [];
  for (const p of points) {
    while (chain.length >= 2 && turn(chain[chain.length - 2]!, chain[chain.length - 1]!, p) <= 0) chain.pop();
    chain.push(p);
  }
  return chain;
}

function turn(o: Point2, a: Point2, b: Point2): number {
  return (a[0] - o[0]) * (b[1] - o[1]) - (a[1] - o[1]) * (b[0] - o[0]);
}
