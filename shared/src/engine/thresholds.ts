// Every limit at which an answer changes its word, in one place.

/** A side is clear from this share of its two-way weight upward, shaded from the second, blocked below (our judgement). */
export const clearFrom = 0.99;
export const shadedFrom = 0.85;

/** A side counts as surely clear from this probability upward, and as surely blocked from the second (our judgement). */
export const sureFrom = 0.9;
export const surelyBlockedFrom = 0.8;

/** A direction is hidden where more than this share of its slab is blocked, thinned between the two (our judgement). */
export const hiddenAbove = 0.5;
export const thinnedFrom = 0.1;

/** Runs of hidden or thinned directions narrower than this are not worth a word, degrees. */
export const leastSectorDeg = 1;

/** How far from the sensor a solid can matter, m. */
export const reachM = 5;

/** Range at which the diffraction margin is stated, m. */
export const marginRangeM = 20;

export type SideVerdict = 'clear' | 'shaded' | 'blocked';

export function sideVerdict(clearShare: number): SideVerdict {
  if (clearShare >= clearFrom) return 'clear';
  return clearShare >= shadedFrom ? 'shaded' : 'blocked';
}
