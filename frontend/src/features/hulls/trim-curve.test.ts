import type { HullSheet } from '@tiltwright/shared/schemas/hull.ts';
import type { TrimPoint } from '@tiltwright/shared/schemas/trim-point.ts';
import { describe, expect, it } from 'vitest';
import { topSpeedKn, trimCurve } from './trim-curve.ts';

const hull: HullSheet = {
  id: 'hul_test',
  generic: false,
  revision: 1,
  edition: 1,
  status: 'published',
  supersededBy: null,
  maker: 'Test',
  model: 'Vee',
  form: 'modified-v',
  lengthM: 5.2,
  beamM: 2.1,
  chineBeamM: 1.7,
  deadriseDeg: 17,
  loadedMassKg: 1000,
  lcgM: 1.9,
  values: {},
};

const point = (speedKn: number, trimDeg: number): TrimPoint => ({
  id: `tri_${speedKn}`,
  hull: hull.id,
  speedKn,
  trimDeg,
  sigmaDeg: 0.3,
  runs: 4,
  loadedMassKg: 1000,
  motorTrimDeg: 0,
  basis: 'measured',
  source: null,
  sourceDate: null,
  edition: 1,
});

describe('the curve on a hull’s sheet', () => {
  it('is worked out everywhere where nobody has measured', () => {
    const curve = trimCurve(hull, [], 30);
    expect(curve[0]?.speedKn).toBe(0);
    expect(curve.at(-1)?.speedKn).toBe(30);
    expect(curve.every((place) => place.estimated && place.sigmaDeg > 0 && Number.isFinite(place.valueDeg))).toBe(true);
  });

  it('passes through what was measured and is surer there than far away', () => {
    const estimate = trimCurve(hull, [], 30).find((place) => place.speedKn === 18)!;
    const measuredDeg = estimate.valueDeg + 1;
    const curve = trimCurve(hull, [point(18, measuredDeg)], 30);
    const at = curve.find((place) => place.speedKn === 18)!;
    // Answers are rounded; a tenth of a degree is finer than anyone measures.
    expect(Math.abs(at.valueDeg - measuredDeg)).toBeLessThan(0.1);
    expect(at.estimated).toBe(false);
    expect(at.sigmaDeg).toBeLessThan(curve.at(-1)!.sigmaDeg);
  });

  it('reaches a little past the last measurement', () => {
    expect(topSpeedKn([point(18, 4), point(26, 3)])).toBeCloseTo(29.9, 9);
    expect(topSpeedKn([])).toBe(30);
  });
});
