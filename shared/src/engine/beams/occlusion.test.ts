import { describe, expect, it } from 'vitest';
import { attitudeRotation, noRotation } from '../rotation.ts';
import type { SideElement } from '../sensor.ts';
import type { Solid } from '../solids/solid.ts';
import { degToRad, radToDeg } from '../units.ts';
import { fanOf } from './fan.ts';
import { diffractionMarginM } from './least-clearance.ts';
import { sideClearance, tiltWindow } from './occlusion.ts';
import { clearShare } from './sectors.ts';
import { castSlab } from './slab.ts';

const element: SideElement = {
  apertureM: 0.17,
  depressionRad: degToRad(30),
  verticalWidthRad: degToRad(40),
  alongTrackWidthRad: degToRad(1),
  levelDb: -3,
  levelWay: 'one',
};
const level = { originM: [0, 0, 0] as const, rotation: noRotation };
const poseAt = (tiltRad: number) => ({ ...level, rotation: attitudeRotation(0, tiltRad, 0) });

/** A thin wall to port, 1 m off, from x to x, from z to z. */
const wall = (fromX: number, toX: number, fromZ: number, toZ: number, opacity = 1): Solid => ({
  shape: { kind: 'box', halfLengthM: (toX - fromX) / 2, halfWidthM: 0.0005, halfHeightM: (toZ - fromZ) / 2 },
  pose: { originM: [(fromX + toX) / 2, -1.0005, (fromZ + toZ) / 2], rotation: noRotation },
  opacity,
  owner: { unit: null, part: 'obstacle', label: 'wall' },
});

describe('a fan of 40° about 30°', () => {
  it('has steps of half a degree with both ends', () => {
    const { depressionsRad, weights, stepRad } = fanOf(element);
    expect(depressionsRad).toHaveLength(81);
    expect([radToDeg(depressionsRad[0] as number), radToDeg(depressionsRad[80] as number), radToDeg(stepRad)]).toEqual([
      expect.closeTo(10, 9),
      expect.closeTo(50, 9),
      expect.closeTo(0.5, 9),
    ]);
    expect(weights[40]).toBeCloseTo(1, 12);
    // −3 dB one way at the edges is a quarter two ways.
    expect(weights[0]).toBeCloseTo(0.25, 6);
  });
});

describe('a wall beside the sensor', () => {
  const seen = (solids: Solid[]) => sideClearance(solids, level, element, 'port', 0.003);

  it('hides everything below the depression of its upper edge', () => {
    const { sectors, clearShare: share, leastClearanceM } = seen([wall(-1, 1, Math.tan(degToRad(30.25)), 3)]);
    expect(sectors).toEqual([
      {
        fromDeg: expect.closeTo(30.25, 1),
        toDeg: expect.closeTo(50, 9),
        share: expect.closeTo(1 - share, 6),
        kind: 'hidden',
        by: wall(0, 1, 0, 1).owner,
      },
    ]);
    expect(share).toBeGreaterThan(0.48);
    expect(share).toBeLessThan(0.53);
    expect(leastClearanceM).toBe(0);
  });

  it('thins the beam where it takes less than half of the aperture', () => {
    // Of 17 cells across 170 mm the five foremost start ahead of x = 0.035.
    const { sectors, clearShare: share } = seen([wall(0.035, 1, 0, 3)]);
    expect(share).toBeCloseTo(1 - 5 / 17, 1);
    expect(sectors.map(({ kind }) => kind)).toEqual(['thinned']);
  });

  it('lets through what its opacity leaves, twice over where two stand', () => {
    expect(seen([wall(-1, 1, -1, 3, 0.4)]).clearShare).toBeCloseTo(0.6, 9);
    expect(seen([wall(-1, 1, -1, 3, 0.4), wall(-1, 1, -1, 3, 0.5)]).clearShare).toBeCloseTo(0.3, 9);
  });

  it('is not seen from the other side, and its distance is told', () => {
    const other = sideClearance([wall(-1, 1, -1, 3)], level, element, 'starboard', 0.003);
    expect([other.clearShare, other.verdict]).toEqual([1, 'clear']);
    expect(other.leastClearanceM).toBeCloseTo(1, 4);
  });

  it('passes below a beam by a distance that the diffraction margin is set against', () => {
    const low = wall(-1, 1, Math.tan(degToRad(50)) + 0.1, 3);
    const { leastClearanceM, diffractionMarginM: margin } = seen([low]);
    expect(leastClearanceM).toBeCloseTo(0.1 * Math.cos(degToRad(50)), 2);
    expect(margin).toBeCloseTo(diffractionMarginM(0.003, 1 / Math.cos(degToRad(50))), 2);
  });

  it('has the widest Fresnel zone half way', () => {
    expect(diffractionMarginM(0.003, 10)).toBeCloseTo(Math.sqrt(0.003 * 5), 12);
    expect([diffractionMarginM(0.003, 0), diffractionMarginM(0.003, 20)]).toEqual([0, 0]);
  });
});

describe('the tilt window', () => {
  const aft = [wall(-1, -0.12, -1, 3)];
  const share = (tiltDeg: number) =>
    clearShare(fanOf(element), castSlab(aft, poseAt(degToRad(tiltDeg)), element, fanOf(element), 'port').blocked);

  it('is the run of clear tilts around the set one', () => {
    const { windowRad, nearestClearRad } = tiltWindow(aft, poseAt, element, ['port'], 0, share(0) >= 0.99);
    const [low, high] = (windowRad ?? [0, 0]).map(radToDeg) as [number, number];
    expect(nearestClearRad).toBeNull();
    expect(share(low)).toBeGreaterThanOrEqual(0.99);
    if (low > -20) expect(share(low - 0.5)).toBeLessThan(0.99);
    if (high < 20) expect(share(high + 0.5)).toBeLessThan(0.99);
    expect(high - low).toBeGreaterThan(0);
    expect(high - low).toBeLessThan(40);
  });

  it('names the nearest clear tilt where the set one is not', () => {
    const set = -15;
    expect(share(set)).toBeLessThan(0.99);
    const { windowRad, nearestClearRad } = tiltWindow(aft, poseAt, element, ['port'], degToRad(set), false);
    expect(windowRad).toBeNull();
    const nearest = radToDeg(nearestClearRad ?? Number.NaN);
    expect(share(nearest)).toBeGreaterThanOrEqual(0.99);
    for (let tiltDeg = -20; tiltDeg <= 20; tiltDeg += 0.5) {
      if (Math.abs(tiltDeg - set) < Math.abs(nearest - set) - 1e-9) expect(share(tiltDeg)).toBeLessThan(0.99);
    }
  });
});
