import type { HullSheet } from '@tiltwright/shared/schemas/hull.ts';
import { describe, expect, it } from 'vitest';
import { hullFigure } from './hull-figure.ts';

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
  transomAngleDeg: 13,
  transomHeightMm: 508,
  strakes: ['420:150', '650:0'],
  values: {},
};

describe('a hull as it is drawn', () => {
  it('takes the stated sizes, in metres and radians', () => {
    const figure = hullFigure(hull)!;
    expect(figure.shape.transomHeightM).toBeCloseTo(0.508, 9);
    expect(figure.shape.deadriseRad).toBeCloseTo((17 * Math.PI) / 180, 9);
    expect(figure.beamM).toBe(2.1);
    expect(figure.strakes).toEqual([
      { offsetM: 0.42, endsM: 0.15 },
      { offsetM: 0.65, endsM: 0 },
    ]);
    expect(figure.assumed).toEqual([]);
  });

  it('names what it had to assume', () => {
    expect(hullFigure({ ...hull, transomAngleDeg: undefined, deadriseDeg: undefined })!.assumed).toEqual([
      'deadriseDeg',
      'transomAngleDeg',
    ]);
  });

  it('is not drawn where the bottom is no single vee', () => {
    expect(hullFigure({ ...hull, form: 'pontoon' })).toBeNull();
    expect(hullFigure({ ...hull, steps: 1 })).toBeNull();
  });
});
