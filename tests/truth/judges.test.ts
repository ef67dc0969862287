// Reference libraries as judges: rotations and ray hits by three, statistics by simple-statistics and mathjs, roots by mathjs.
import { attitudeRotation } from '@tiltwright/shared/engine/rotation.ts';
import { signChange } from '@tiltwright/shared/engine/sign-change.ts';
import { enterShape, type Shape } from '@tiltwright/shared/engine/solids/solid.ts';
import { monotoneCubic } from '@tiltwright/shared/engine/trim/trim-curve.ts';
import { meanOf, normalQuantile, sampleQuantile, shareOfVariance, varianceOf } from '@tiltwright/shared/engine/uncertainty.ts';
import { erf, polynomialRoot, quantileSeq } from 'mathjs';
import { mean, sampleCorrelation, variance } from 'simple-statistics';
import * as three from 'three';
import { describe, expect, it, vi } from 'vitest';
import { betweenOf, seededRandom } from '../support/random-scene.ts';

// A busy machine may take its time.
vi.setConfig({ testTimeout: 60_000 });

const seed = 8455;

describe(`rotations, judged by three, seed ${seed}`, () => {
  it('agree to 1e-9', () => {
    const between = betweenOf(seededRandom(seed));
    for (let i = 0; i < 500; i++) {
      const [yaw, pitch, roll] = [between(-3, 3), between(-3, 3), between(-3, 3)];
      const judge = new three.Matrix4().makeRotationFromEuler(new three.Euler(roll, pitch, yaw, 'ZYX'));
      const own = attitudeRotation(yaw, pitch, roll);
      for (let row = 0; row < 3; row++) {
        for (let column = 0; column < 3; column++) {
          expect(Math.abs((own[3 * row + column] as number) - (judge.elements[4 * column + row] as number))).toBeLessThan(1e-9);
        }
      }
    }
  });
});

/** Fine meshes of the same shapes; three's cylinders and capsules stand along y. */
const meshes: Record<string, { shape: (grow: number) => Shape; geometry: () => three.BufferGeometry }> = {
  box: {
    shape: (g) => ({ kind: 'box', halfLengthM: 0.2 + g, halfWidthM: 0.1 + g, halfHeightM: 0.05 + g }),
    geometry: () => new three.BoxGeometry(0.4, 0.2, 0.1),
  },
  capsule: {
    shape: (g) => ({ kind: 'capsule', halfAxisM: 0.15, radiusM: 0.06 + g }),
    geometry: () => new three.CapsuleGeometry(0.06, 0.3, 24, 96).rotateZ(Math.PI / 2),
  },
  'elliptic-strut': {
    shape: (g) => ({ kind: 'elliptic-strut', halfChordM: 0.09 + g, halfThicknessM: 0.03 + g, halfHeightM: 0.1 + g }),
    geometry: () => new three.CylinderGeometry(1, 1, 0.2, 720).rotateX(Math.PI / 2).scale(0.09, 0.03, 1),
  },
  'prop-disc': {
    shape: (g) => ({ kind: 'prop-disc', radiusM: 0.17 + g, halfDepthM: 0.04 + g }),
    geometry: () => new three.CylinderGeometry(0.17, 0.17, 0.08, 720).rotateZ(Math.PI / 2),
  },
};

describe(`ray hits, judged by three on fine meshes, seed ${seed}`, () => {
  const millimetre = 1e-3;
  for (const [name, { shape, geometry }] of Object.entries(meshes)) {
    it(`${name}: agree to 1 mm`, () => {
      const between = betweenOf(seededRandom(seed));
      const mesh = new three.Mesh(geometry(), new three.MeshBasicMaterial({ side: three.DoubleSide }));
      const caster = new three.Raycaster();
      let hits = 0;
      let misses = 0;
      for (let i = 0; i < 400; i++) {
        const origin = new three.Vector3(between(-1, 1), between(-1, 1), between(-1, 1)).normalize();
        const target = new three.Vector3(between(-0.25, 0.25), between(-0.2, 0.2), between(-0.2, 0.2));
        const direction = target.sub(origin).normalize();
        const entry = (grow: number) => enterShape(shape(grow), origin.x, origin.y, origin.z, direction.x, direction.y, direction.z);
        caster.set(origin, direction);
        const judged = caster.intersectObject(mesh)[0]?.distance ?? Number.POSITIVE_INFINITY;
        // The same solid a millimetre larger is met no later, a millimetre smaller no sooner.
        expect(judged).toBeGreaterThanOrEqual(entry(millimetre));
        expect(judged).toBeLessThanOrEqual(entry(-millimetre));
        expect(entry(0)).toBeGreaterThanOrEqual(entry(millimetre));
        expect(entry(0)).toBeLessThanOrEqual(entry(-millimetre));
        if (Number.isFinite(entry(-millimetre))) {
          hits++;
          const square = entry(-millimetre) - entry(millimetre);
          expect(Math.abs(judged - entry(0))).toBeLessThanOrEqual(Math.max(millimetre, square));
        }
        if (!Number.isFinite(entry(millimetre))) misses++;
      }
      expect(hits).toBeGreaterThan(40);
      expect(misses).toBeGreaterThan(40);
    });
  }
});

describe(`statistics and roots, seed ${seed}`, () => {
  const between = betweenOf(seededRandom(seed));
  const a = Array.from({ length: 128 }, () => between(-4, 9));
  const b = a.map((value) => 0.3 * value + between(-1, 1));

  it('mean, variance and correlation agree with simple-statistics', () => {
    expect(meanOf(a)).toBeCloseTo(mean(a), 12);
    expect(varianceOf(a)).toBeCloseTo(variance(a), 12);
    expect(shareOfVariance(a, b)).toBeCloseTo(sampleCorrelation(a, b) ** 2, 12);
  });

  it('quantiles agree with mathjs', () => {
    for (const share of [0.05, 0.25, 0.5, 0.731, 0.95]) expect(sampleQuantile(a, share)).toBeCloseTo(Number(quantileSeq(a, share)), 12);
  });

  it('normal quantiles are undone by the error function of mathjs', () => {
    for (let p = 0.0005; p < 1; p += 0.0173) expect((1 + erf(normalQuantile(p) / Math.SQRT2)) / 2).toBeCloseTo(p, 6);
  });

  it('roots agree with those of mathjs', () => {
    for (let i = 0; i < 50; i++) {
      const [c0, c1] = [between(-5, -0.1), between(0.1, 4)];
      const real = polynomialRoot(c0, c1, 0, 1).map(Number).filter(Number.isFinite);
      const f = (x: number) => c0 + c1 * x + x ** 3;
      const own = signChange(f, 0, f(0), 10, f(10));
      expect(Math.min(...real.map((root) => Math.abs(root - own)))).toBeLessThan(1e-9);
    }
  });

  it('a curve through points of a line is the line, and never leaves the range of its neighbours', () => {
    const line = monotoneCubic([0, 1, 2.5, 4], [1, 3, 6, 9]);
    for (let x = 0; x <= 4; x += 0.1) expect(line(x)).toBeCloseTo(1 + 2 * x, 12);
    const xs = [0, 0.6, 1.1, 2, 3.3];
    const ys = [1, 7, 6.5, 3, 3];
    const curve = monotoneCubic(xs, ys);
    for (let i = 0; i + 1 < xs.length; i++) {
      for (let t = 0; t <= 1; t += 0.05) {
        const y = curve((xs[i] as number) + t * ((xs[i + 1] as number) - (xs[i] as number)));
        expect(y).toBeGreaterThanOrEqual(Math.min(ys[i] as number, ys[i + 1] as number) - 1e-12);
        expect(y).toBeLessThanOrEqual(Math.max(ys[i] as number, ys[i + 1] as number) + 1e-12);
      }
    }
  });
});
