import { toBoat } from '@tiltwright/shared/engine/frames.ts';
import { attitudeRotation, noRotation } from '@tiltwright/shared/engine/rotation.ts';
import { distanceToSolid, type Shape, type Solid } from '@tiltwright/shared/engine/solids/solid.ts';
import { describe, expect, it } from 'vitest';
import { solidOutline, surfacePointsM } from './solid-outline.ts';
import type { Point2 } from './views.ts';

const solid = (shape: Shape, rotation = noRotation): Solid => ({
  shape,
  pose: { originM: [-0.2, 0.1, 0.3], rotation },
  opacity: 1,
  owner: { unit: 0, part: 'torpedo' },
});
const capsule: Shape = { kind: 'capsule', halfAxisM: 0.15, radiusM: 0.04 };
const shapes: Shape[] = [
  capsule,
  { kind: 'box', halfLengthM: 0.2, halfWidthM: 0.1, halfHeightM: 0.004 },
  { kind: 'elliptic-strut', halfChordM: 0.06, halfThicknessM: 0.02, halfHeightM: 0.08 },
  { kind: 'prop-disc', radiusM: 0.13, halfDepthM: 0.03 },
];
const span = (points: readonly Point2[], axis: 0 | 1) => Math.max(...points.map((p) => p[axis])) - Math.min(...points.map((p) => p[axis]));

describe('outline of a solid', () => {
  it.each(shapes)('of a $kind is made of points on the engine’s own surface', (shape) => {
    const turned = solid(shape, attitudeRotation(0.4, -0.3, 0.2));
    for (const point of surfacePointsM(turned)) {
      expect(distanceToSolid(turned, point)).toBeLessThan(1e-9);
      // A hair further from the middle is outside: the point is on the skin, not within.
      const [ox, oy, oz] = turned.pose.originM;
      const out = 1.001;
      const further = [ox + (point[0] - ox) * out, oy + (point[1] - oy) * out, oz + (point[2] - oz) * out] as const;
      expect(distanceToSolid(turned, further)).toBeGreaterThan(0);
    }
  });

  it('of a torpedo is a circle from astern and its whole length from the side', () => {
    const astern = solidOutline(solid(capsule), 'astern');
    expect(span(astern, 0)).toBeCloseTo(0.08, 4);
    expect(span(astern, 1)).toBeCloseTo(0.08, 4);
    const side = solidOutline(solid(capsule), 'side');
    expect(span(side, 0)).toBeCloseTo(0.38, 6);
  });

  it('of a propeller is its full swing from astern and a thin upright box from the side', () => {
    const disc = solid({ kind: 'prop-disc', radiusM: 0.13, halfDepthM: 0.03 });
    expect(span(solidOutline(disc, 'astern'), 0)).toBeCloseTo(0.26, 6);
    expect(span(solidOutline(disc, 'side'), 0)).toBeCloseTo(0.06, 6);
    expect(span(solidOutline(disc, 'side'), 1)).toBeCloseTo(0.26, 6);
  });

  it('stands where the solid stands: starboard to the right, down the paper, bow to the left from the side', () => {
    const middle = toBoat(solid(capsule).pose, [0, 0, 0]);
    expect(middle).toEqual([-0.2, 0.1, 0.3]);
    const astern = solidOutline(solid(capsule), 'astern');
    expect(Math.min(...astern.map((p) => p[0]))).toBeCloseTo(0.06, 4);
    expect(Math.max(...astern.map((p) => p[1]))).toBeCloseTo(0.34, 4);
    const side = solidOutline(solid(capsule), 'side');
    expect(Math.min(...side.map((p) => p[0]))).toBeCloseTo(0.01, 6);
  });
});
