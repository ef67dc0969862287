/** Round numbers from `low` to `high`, steps of 1, 2 or 5 times a power of ten, at most `most` of them. */
export function axisTicks(low: number, high: number, most: number): number[] {
  if (!(high > low) || most < 2) return [low];
  const raw = (high - low) / (most - 1);
  const power = 10 ** Math.floor(Math.log10(raw));
  const step = ([1, 2, 5, 10].find((factor) => factor * power >= raw * (1 - 1e-9)) ?? 10) * power;
  const first = Math.ceil(low / step - 1e-9);
  const last = Math.floor(high / step + 1e-9);
  return Array.from({ length: last - first + 1 }, (_, i) => (first + i) * step);
}
