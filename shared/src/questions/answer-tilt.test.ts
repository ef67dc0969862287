import { describe, expect, it } from 'vitest';
import { TiltQuestion, TiltReply } from '../schemas/tilt.ts';
import { answerTilt } from './answer-tilt.ts';
import type { HullPart, MountPart } from './parts.ts';

const hull: HullPart = { form: 'modified-v', lengthM: 5.2, transomAngleDeg: 14 };
const mount: MountPart = { kind: 'transom-bracket', tiltMinDeg: -12, tiltMaxDeg: 12, tiltZeroDeg: 0 };
const ask = (changes: object, parts: { hull?: HullPart; mount?: MountPart } = {}) => {
  const all = { hull, ...parts };
  return TiltReply.parse(answerTilt(TiltQuestion.parse({ ...all, speedKn: 20, ...changes }), all, { edition: 3 }));
};

describe('a tilt', () => {
  it('is the target less the trim, within 1.645 standard deviations either way', () => {
    const { trim, tilt } = ask({ targetDeg: -2, measuredTrimDeg: 4, measuredSigmaDeg: 0.4 });
    expect(trim).toMatchObject({ valueDeg: 4, sigmaDeg: 0.5, basis: 'yours' });
    expect(tilt.neededDeg).toBe(-6);
    expect(tilt.interval90Deg).toEqual([expect.closeTo(-6 - 0.8224, 3), expect.closeTo(-6 + 0.8224, 3)]);
    expect(tilt.bracketSettingDeg).toBeNull();
  });

  it('reads on the bracket less the transom angle, and asks for a wedge past its range', () => {
    const { tilt } = ask({ measuredTrimDeg: 1, measuredSigmaDeg: 0.4 }, { mount });
    expect(tilt).toMatchObject({ bracketSettingDeg: -15, inBracketRange: false, wedgeDeg: -3 });
  });

  it('names what it took for granted, but nothing it did not need', () => {
    const fields = ask({}).assumptions.map(({ field }) => field);
    expect(fields).toContain('hull.deadriseDeg');
    expect(fields).toContain('hull.loadedMassKg');
    expect(fields).not.toContain('hull.keelPadMm');
    expect(ask({ measuredTrimDeg: 4 }).assumptions.map(({ field }) => field)).toEqual(['running.measuredSigmaDeg']);
  });

  it('carries a measured curve of the hull', () => {
    const trimPoints = [{ speedKn: 20, trimDeg: 4.6, sigmaDeg: 0.3, motorTrimDeg: 0, loadedMassKg: 900 }];
    const { trim } = ask({ loadedMassKg: 900 }, { hull: { ...hull, trimPoints } });
    expect(trim.basis).toBe('measured');
    expect(trim.valueDeg).toBeCloseTo(4.6, 5);
  });

  it('is less sure of a hull known by form and length alone', () => {
    const stated = {
      ...hull,
      beamM: 2.1,
      chineBeamM: 1.7,
      deadriseDeg: 17,
      dryMassKg: 500,
      loadedMassKg: 900,
      lcgM: 2,
      vcgM: 0.45,
      staticTrimDeg: 0.5,
    };
    expect(ask({}).trim.sigmaDeg).toBeGreaterThan(ask({}, { hull: stated }).trim.sigmaDeg);
  });
});
