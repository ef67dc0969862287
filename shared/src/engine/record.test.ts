import { describe, expect, it } from 'vitest';
import {
  alongTrackM,
  bottomLevelDb,
  depressionOfRay,
  firstBottomM,
  groundRangeM,
  objectHeightM,
  objectShadow,
  pitchGainDb,
  rayInFan,
  rolledDepression,
  speckleDb,
  trackOffsetM,
} from './record.ts';
import { degToRad } from './units.ts';

const fan = { axisRad: degToRad(22), kappa: 1, pitchRad: 0, alongRad: degToRad(1.2) };
const bottom = { lambertDb: -27, absorptionDbPerKm: 100, resolutionM: 0.02 };

describe('a picture of a flat bottom', () => {
  it('puts a 13 m echo from 5 m above the bottom 12 m to the side', () => expect(groundRangeM(13, 5)).toBeCloseTo(12, 12));

  it('shadows an object of 1 m at 12 m from 5 m up over 3 m of ground, and reads its height back', () => {
    const shadow = objectShadow(12, 1, 5);
    if (!shadow) throw new Error('no shadow');
    expect(shadow.groundM).toBeCloseTo(3, 12);
    expect(shadow.topM).toBeCloseTo(Math.hypot(12, 4), 12);
    expect(shadow.endM).toBeCloseTo(Math.hypot(15, 5), 12);
    expect(objectHeightM(shadow.topM, shadow.endM, 5)).toBeCloseTo(1, 12);
  });

  it('has no shadow end for what is as high as the sensor', () => expect(objectShadow(12, 5, 5)).toBeNull());

  it('meets the bottom aft of a nose-down fan, and a little later', () => {
    expect(trackOffsetM(10, degToRad(-10))).toBeCloseTo(-1.763, 3);
    expect(firstBottomM(10, degToRad(-10))).toBeCloseTo(10.154, 3);
  });

  it('sees a ray less depressed in a pitched fan, either way', () => {
    const inside = degToRad(40);
    for (const pitch of [-10, 10].map(degToRad)) {
      expect(depressionOfRay(inside, pitch)).toBeLessThan(inside);
      expect(rayInFan(depressionOfRay(inside, pitch), pitch)).toBeCloseTo(inside, 12);
    }
  });

  it('gains depression on the lowered side and loses it on the other', () => {
    expect(rolledDepression(0.4, 0.1, 'starboard')).toBeCloseTo(0.5, 12);
    expect(rolledDepression(0.4, 0.1, 'port')).toBeCloseTo(0.3, 12);
  });

  it('is as wide as the aperture close by and R·h far off, without a jump', () => {
    const [aperture, wavelength, along] = [0.16, 0.0032, 0.0177];
    const near = aperture ** 2 / (4 * wavelength);
    expect(alongTrackM(near * 0.9, aperture, wavelength, along)).toBe(aperture);
    expect(alongTrackM(2 * near, aperture, wavelength, along)).toBeCloseTo(2 * near * along, 12);
    expect(alongTrackM(near * 1.999999, aperture, wavelength, along)).toBeCloseTo(2 * near * along, 5);
  });

  it('speckles by 5.57 dB in a single look', () => expect(speckleDb).toBeCloseTo(5.57, 2));

  it('falls by 50 dB a decade of range over a flat bottom, pattern and absorption left out', () => {
    const flatFan = { ...fan, kappa: 0 };
    const quiet = { ...bottom, absorptionDbPerKm: 0 };
    const drop = bottomLevelDb(10, 0.01, flatFan, quiet) - bottomLevelDb(100, 0.01, flatFan, quiet);
    // 40 dB spreading, 20 dB from the grazing angle, less 10 dB of area.
    expect(drop).toBeCloseTo(50, 3);
  });

  it('changes the far bottom by less than speckle when pitched by 10°', () => {
    expect(Math.abs(pitchGainDb(40, 5, fan, degToRad(-10), bottom))).toBeLessThan(speckleDb);
    expect(pitchGainDb(40, 5, fan, 0, bottom)).toBe(0);
  });
});
