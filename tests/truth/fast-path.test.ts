// The engine's fast way of casting a slab against the plain one, ray by ray, on random boats.
import { fanOf } from '@tiltwright/shared/engine/beams/fan.ts';
import { nearestPass } from '@tiltwright/shared/engine/beams/least-clearance.ts';
import { castSlab } from '@tiltwright/shared/engine/beams/slab.ts';
import { describe, expect, it } from 'vitest';
import { plainNearestPass } from '../support/plain-least-clearance.ts';
import { castPlainSlab } from '../support/plain-slab.ts';
import { betweenOf, randomScene, seededRandom } from '../support/random-scene.ts';

const seed = 20261201;
const rayTarget = 1_000_000;

describe(`fast slab against plain slab, seed ${seed}`, () => {
  it('agrees to 1e-9 over a million random rays', () => {
    const between = betweenOf(seededRandom(seed));
    let rays = 0;
    let hit = 0;
    let worst = 0;
    while (rays < rayTarget) {
      const { solids, sensor, element } = randomScene(between);
      const fan = fanOf(element);
      for (const side of ['port', 'starboard'] as const) {
        const fast = castSlab(solids, sensor, element, fan, side);
        const plain = castPlainSlab(solids, sensor, element, fan, side);
        for (let i = 0; i < plain.blocked.length; i++) {
          worst = Math.max(worst, Math.abs((fast.blocked[i] as number) - (plain.blocked[i] as number)));
          if ((plain.blocked[i] as number) > 0) hit++;
        }
        plain.bySolid.forEach((own, k) => {
          own?.forEach((taken, i) => {
            worst = Math.max(worst, Math.abs(taken - (fast.bySolid[k]?.[i] ?? 0)));
          });
        });
        rays += 51 * plain.blocked.length;
      }
    }
    console.log(`fast path: ${rays} rays, ${hit} directions with something in the way, worst difference ${worst.toExponential(1)}`);
    expect(hit).toBeGreaterThan(1000);
    expect(worst).toBeLessThanOrEqual(1e-9);
  }, 60_000);
});

describe(`least clearance against every ray, seed ${seed}`, () => {
  it('agrees to a tenth of a millimetre wherever nothing is hit', () => {
    const between = betweenOf(seededRandom(seed + 1));
    let compared = 0;
    let worst = 0;
    while (compared < 24) {
      const { solids, sensor, element } = randomScene(between);
      if (solids.length > 7) continue;
      const fan = fanOf(element);
      for (const side of ['port', 'starboard'] as const) {
        if (castSlab(solids, sensor, element, fan, side).blocked.some((blocked) => blocked > 0)) continue;
        const fast = nearestPass(solids, sensor, element, fan, side);
        const plain = plainNearestPass(solids, sensor, element, fan, side);
        if (!fast || !plain) throw new Error('an engine a metre away must be within reach');
        worst = Math.max(worst, Math.abs(fast.clearanceM - plain.clearanceM));
        compared++;
      }
    }
    console.log(`least clearance: ${compared} sides, worst difference ${(worst * 1000).toFixed(4)} mm`);
    expect(worst).toBeLessThanOrEqual(1e-4);
  }, 120_000);
});
