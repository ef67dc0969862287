// How strongly a side element hears across its fan: the pattern of an evenly driven line.

/** sin(πx)/(πx), 1 at 0. */
export function sinc(x: number): number {
  const px = Math.PI * x;
  return Math.abs(px) < 1e-8 ? 1 : Math.sin(px) / px;
}

/** One-way intensity of a line of length L at u = L sin θ / λ, relative to its axis (Urick, Principles of Underwater Sound, ch. 3). */
export function lineIntensity(u: number): number {
  const s = sinc(u);
  return s * s;
}

/**
 * u = L sin θ / λ at which the pattern has fallen to a level: 0.442946 one-way −3 dB, 0.318917 two-way −3 dB.
 * Level in dB, below 0; −3 means half, as the trade means it. Valid to −20 dB, inside the main lobe.
 * @throws RangeError outside −60 … 0 dB
 */
export function lineHalfWidth(levelDb: number, way: 'one' | 'two'): number {
  if (!(levelDb < 0 && levelDb >= -60)) throw new RangeError(`level must lie between -60 and 0 dB, got ${levelDb}`);
  const stated = levelDb === -3 ? 0.5 : 10 ** (levelDb / 10);
  const oneWay = way === 'one' ? stated : Math.sqrt(stated);
  let low = 0;
  let high = 1;
  for (let i = 0; i < 60; i++) {
    const middle = (low + high) / 2;
    if (lineIntensity(middle) > oneWay) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/**
 * Two-way weight of a direction in the fan, 1 on its axis: sinc⁴(κ sin(ε − d)) with κ = u_level / sin(Φ/2).
 * Angles in radians.
 */
export function twoWayWeight(depressionRad: number, axisRad: number, kappa: number): number {
  const oneWay = lineIntensity(kappa * Math.sin(depressionRad - axisRad));
  return oneWay * oneWay;
}
