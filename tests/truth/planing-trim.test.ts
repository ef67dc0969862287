// The quick search for the planing balance against small steps and halving, on random hulls.
import { planingTrim, thrustAt } from '@tiltwright/shared/engine/trim/savitsky.ts';
import { degToRad, radToDeg, waters } from '@tiltwright/shared/engine/units.ts';
import { describe, expect, it } from 'vitest';
import { plainPlaningTrim } from '../support/plain-savitsky.ts';
import { betweenOf, seededRandom } from '../support/random-scene.ts';

const seed = 1964;
const hulls = 1500;

describe(`planing trim, quick against plain, seed ${seed}`, () => {
  it('agrees to a millionth of a degree', () => {
    const between = betweenOf(seededRandom(seed));
    let worst = 0;
    let solved = 0;
    for (let i = 0; i < hulls; i++) {
      const lengthM = between(3, 9);
      const hull = {
        massKg: between(2, 9) * lengthM ** 3,
        lcgM: between(0.3, 0.45) * lengthM,
        vcgM: between(0.2, 0.8),
        chineBeamM: between(0.27, 0.4) * lengthM,
        deadriseRad: degToRad(between(0, 25)),
      };
      const thrust = thrustAt(hull, between(-0.8, -0.2), between(-0.3, 0), degToRad(between(-16, 6)));
      const speedMps = between(3, 25);
      const quick = planingTrim(hull, thrust, speedMps, waters.fresh);
      const plain = plainPlaningTrim(hull, thrust, speedMps, waters.fresh);
      expect(quick === null).toBe(plain === null);
      if (!quick || plain === null) continue;
      solved++;
      worst = Math.max(worst, Math.abs(radToDeg(quick.trimRad - plain)));
    }
    console.log(`planing trim: ${solved} of ${hulls} balances, worst difference ${worst.toExponential(1)}°`);
    expect(solved).toBeGreaterThan(hulls / 2);
    expect(worst).toBeLessThanOrEqual(1e-6);
  }, 60_000);
});
