import { describe, expect, it } from 'vitest';
import { paperScale, scaleBarMm } from './paper-scale.ts';

const bounds = { leftM: -1, rightM: 1, topM: -0.5, bottomM: 0.5 };
const none = { leftPx: 0, rightPx: 0, topPx: 0, bottomPx: 0 };

describe('paper scale', () => {
  it('draws 2 m on 756 px (200 mm of paper) at 1 : 10', () => {
    const scale = paperScale(bounds, none, 756);
    expect(scale.ratio).toBe(10);
    expect(scale.heightPx).toBe(378);
  });

  it('takes the next whole ratio rather than overflow the width or the height', () => {
    expect(paperScale(bounds, none, 755).ratio).toBe(11);
    expect(paperScale(bounds, none, 2000, 189).ratio).toBe(20);
  });

  it('puts the middle of the bounds in the middle of the free width', () => {
    const scale = paperScale(bounds, { ...none, leftPx: 40, rightPx: 20, topPx: 8 }, 500);
    expect(scale.at([0, -0.5])[0]).toBeCloseTo(40 + 440 / 2, 6);
    expect(scale.at([0, -0.5])[1]).toBeCloseTo(8, 6);
  });

  it('goes back to the metre it came from', () => {
    const scale = paperScale(bounds, { ...none, leftPx: 12, topPx: 30 }, 360);
    const [u, v] = scale.back(scale.at([0.38, -0.05]));
    expect(u).toBeCloseTo(0.38, 9);
    expect(v).toBeCloseTo(-0.05, 9);
  });

  it('chooses the longest bar that has room', () => {
    expect(scaleBarMm(378, 120)).toBe(200);
    expect(scaleBarMm(150, 120)).toBe(500);
  });
});
