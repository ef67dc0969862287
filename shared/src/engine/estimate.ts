// A number that is not certain, with how uncertain it is and where it comes from.

/** A value with one standard deviation in the same unit, its basis, and what makes it doubtful. */
export interface Estimate<Basis extends string = string, Flag extends string = string> {
  value: number;
  sigma: number;
  basis: Basis;
  flags: readonly Flag[];
}

/** Root of the sum of squares: how independent errors add. Any number of non-negative sigmas, one unit. */
export function addInQuadrature(...sigmas: readonly number[]): number {
  let sum = 0;
  for (const sigma of sigmas) sum += sigma * sigma;
  return Math.sqrt(sum);
}

/** Half width of a normal 90 % interval in standard deviations: the 95 % quantile of the normal distribution. */
export const sigmasIn90 = 1.6448536269514722;
