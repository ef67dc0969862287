// @vitest-environment node
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

const css = readFileSync(new URL('./tokens.css', import.meta.url), 'utf8');

/** Relative luminance of an sRGB colour (WCAG 2.2, definition of "relative luminance"). */
function luminance(hex: string): number {
  const [r, g, b] = [1, 3, 5].map((at) => {
    const c = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
  }) as [number, number, number];
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

/** WCAG 2.2, definition of "contrast ratio". */
function contrast(a: string, b: string): number {
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x) as [number, number];
  return (light + 0.05) / (dark + 0.05);
}

function tokens(theme: 'light' | 'dark'): Map<string, string> {
  const found = new Map<string, string>();
  for (const [, name, light, dark] of css.matchAll(/--([a-z0-9-]+): light-dark\((#[0-9a-f]{6}), (#[0-9a-f]{6})\)/g)) {
    found.set(name!, theme === 'light' ? light! : dark!);
  }
  expect(found.size).toBeGreaterThan(10);
  return found;
}

describe('contrast', () => {
  it('is reckoned as WCAG does: black on white is 21 : 1, #777777 on white just misses 4.5 : 1', () => {
    expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 5);
    // 4.48 : 1 is the figure commonly quoted for this pair, from memory.
    expect(contrast('#777777', '#ffffff')).toBeCloseTo(4.48, 2);
  });

  for (const theme of ['light', 'dark'] as const) {
    const colour = tokens(theme);
    const grounds = ['paper', 'sheet'];
    const pairs = ['ink', 'ink-2', 'slate', 'rust', 'brass'].flatMap((text) => grounds.map((ground) => [text, ground] as const));
    pairs.push(['ink', 'slate-wash'], ['ink', 'rust-wash'], ['ink', 'brass-wash'], ['rust', 'rust-wash'], ['slate', 'slate-wash']);
    pairs.push(['brass', 'brass-wash'], ['sheet', 'ink'], ['sheet', 'slate'], ['sheet', 'ink-2']);
    it.each(pairs)(`${theme}: %s on %s keeps 4.5 : 1`, (text, ground) => {
      expect(contrast(colour.get(text)!, colour.get(ground)!)).toBeGreaterThanOrEqual(4.5);
    });
    it.each(grounds)(`${theme}: the focus ring on %s keeps 3 : 1`, (ground) => {
      expect(contrast(colour.get('focus')!, colour.get(ground)!)).toBeGreaterThanOrEqual(3);
    });
  }
});
