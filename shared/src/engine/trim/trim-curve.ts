// A smooth curve through measured points that never overshoots them.

/**
 * Monotone piecewise cubic through points with rising x (Fritsch & Carlson 1980, SIAM J. Numer. Anal. 17(2), 238–246).
 * Between two points the curve stays between their values; outside the range it holds the end values.
 * @throws RangeError without a point, or where x does not rise
 */
export function monotoneCubic(xs: readonly number[], ys: readonly number[]): (x: number) => number {
  const n = xs.length;
  if (n === 0 || ys.length !== n) throw new RangeError('a curve needs as many values as places, at least one');
  const slopes: number[] = [];
  for (let i = 0; i + 1 < n; i++) {
    const width = (xs[i + 1] as number) - (xs[i] as number);
    if (!(width > 0)) throw new RangeError('the places of a curve must rise');
    slopes.push(((ys[i + 1] as number) - (ys[i] as number)) / width);
  }
  const tangents = tangentsFor(slopes, n);
  return (x) => {
    if (x <= (xs[0] as number)) return ys[0] as number;
    if (x >= (xs[n - 1] as number)) return ys[n - 1] as number;
    let i = 0;
    while (x > (xs[i + 1] as number)) i++;
    const width = (xs[i + 1] as number) - (xs[i] as number);
    const t = (x - (xs[i] as number)) / width;
    const t2 = t * t;
    const t3 = t2 * t;
    return (
      (2 * t3 - 3 * t2 + 1) * (ys[i] as number) +
      (t3 - 2 * t2 + t) * width * (tangents[i] as number) +
      (3 * t2 - 2 * t3) * (ys[i + 1] as number) +
      (t3 - t2) * width * (tangents[i + 1] as number)
    );
  };
}

/** Averages of neighbouring slopes, 0 at a turn, pulled into the circle of radius 3 that keeps each piece monotone. */
function tangentsFor(slopes: readonly number[], points: number): number[] {
  if (points === 1) return [0];
  const tangents = Array.from({ length: points }, (_, i) => {
    const before = slopes[i - 1];
    const after = slopes[i];
    if (before === undefined) return after as number;
    if (after === undefined) return before;
    return before * after <= 0 ? 0 : (before + after) / 2;
  });
  slopes.forEach((slope, i) => {
    if (slope === 0) {
      tangents[i] = 0;
      tangents[i + 1] = 0;
      return;
    }
    const a = (tangents[i] as number) / slope;
    const b = (tangents[i + 1] as number) / slope;
    const size = Math.hypot(a, b);
    if (size > 3) {
      tangents[i] = (3 / size) * a * slope;
      tangents[i + 1] = (3 / size) * b * slope;
    }
  });
  return tangents;
}
