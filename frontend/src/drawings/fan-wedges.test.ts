import { describe, expect, it } from 'vitest';
import { arcDepressions, fanDirection, fanWedges } from './fan-wedges.ts';

const strut = { fromDeg: 4, toDeg: 31, kind: 'hidden', share: 0.5, by: 'strut' } as const;
const prop = { fromDeg: 31, toDeg: 36, kind: 'thinned', share: 0.1, by: 'propeller' } as const;

describe('fan wedges', () => {
  it('leaves a free fan whole', () => {
    expect(fanWedges(0, 48, [])).toEqual([{ fromDeg: 0, toDeg: 48, kind: 'clear', share: null, by: null }]);
  });

  it('fills what is between the sectors with clear, in order of depression', () => {
    expect(fanWedges(0, 48, [prop, strut]).map((w) => [w.fromDeg, w.toDeg, w.kind])).toEqual([
      [0, 4, 'clear'],
      [4, 31, 'hidden'],
      [31, 36, 'thinned'],
      [36, 48, 'clear'],
    ]);
  });

  it('cuts a sector to the fan and shows nothing of one outside it', () => {
    expect(fanWedges(10, 20, [strut]).map((w) => w.kind)).toEqual(['hidden']);
    expect(fanWedges(40, 48, [strut]).map((w) => w.kind)).toEqual(['clear']);
  });

  it('covers the fan once, without gap or overlap', () => {
    const wedges = fanWedges(0, 48, [strut, { ...prop, fromDeg: 28 }]);
    wedges.slice(1).forEach((wedge, i) => {
      expect(wedge.fromDeg).toBe(wedges[i]?.toDeg);
    });
    expect(wedges[0]?.fromDeg).toBe(0);
    expect(wedges.at(-1)?.toDeg).toBe(48);
  });
});

describe('fan direction', () => {
  it('looks to port along −y and to starboard along +y, deeper with depression', () => {
    expect(fanDirection('port', 0)).toEqual([0, -1, 0]);
    const [, y, z] = fanDirection('starboard', 30);
    expect(y).toBeCloseTo(Math.sqrt(3) / 2, 12);
    expect(z).toBeCloseTo(0.5, 12);
  });

  it('steps an arc no wider than asked and ends on its edges', () => {
    const arc = arcDepressions(4, 31);
    expect(arc[0]).toBe(4);
    expect(arc.at(-1)).toBe(31);
    expect(Math.max(...arc.slice(1).map((d, i) => d - arc[i]!))).toBeLessThanOrEqual(2);
  });
});
