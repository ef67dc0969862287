import { Secret } from 'otpauth';
import { describe, expect, it } from 'vitest';
import { oneTimeCode } from '../../../tests/support/one-time-code.ts';
import { factorUri, hashRecoveryCode, newFactorSecret, newRecoveryCodes, openSecret, sealSecret, stepOfCode } from './second-factor.ts';

// RFC 6238, appendix B, SHA-1 rows; the table's eight digits end in the six a six-digit code has (RFC 4226, 5.3).
const published: [timeS: number, eightDigits: string][] = [
  [59, '94287082'],
  [1111111109, '07081804'],
  [1111111111, '14050471'],
  [1234567890, '89005924'],
  [2000000000, '69279037'],
  [20000000000, '65353130'],
];
const secret = Secret.fromUTF8('12345678901234567890').base32;

describe('codes', () => {
  it.each(published)('at %i s the code is the end of %s', (timeS, eightDigits) => {
    expect(stepOfCode(secret, eightDigits.slice(2), 0, timeS * 1000)).toBe(Math.floor(timeS / 30));
  });

  it('is what an authenticator made from the two RFCs shows', () => {
    const own = newFactorSecret();
    const nowMs = Date.now();
    expect(stepOfCode(own, oneTimeCode(own, 0, nowMs), 0, nowMs)).toBe(Math.floor(nowMs / 30_000));
  });

  it('works once: the same step is not taken again, a newer one is', () => {
    expect(stepOfCode(secret, '287082', 1, 59_000)).toBeNull();
    expect(stepOfCode(secret, '287082', 0, 59_000)).toBe(1);
  });

  it('is taken one step late or early, not two', () => {
    expect(stepOfCode(secret, '287082', 0, 59_000 + 30_000)).toBe(1);
    expect(stepOfCode(secret, '287082', 0, 59_000 - 30_000)).toBe(1);
    expect(stepOfCode(secret, '287082', 0, 59_000 + 60_000)).toBeNull();
  });

  it.each(['', '28708', '2870822', 'abcdef', ' 287082', '２８７０８２'])('%j is no code', (code) => {
    expect(stepOfCode(secret, code, 0, 59_000)).toBeNull();
  });
});

describe('secrets', () => {
  it('are 160 bits and differ', () => {
    expect(Secret.fromBase32(newFactorSecret()).bytes).toHaveLength(20);
    expect(newFactorSecret()).not.toBe(newFactorSecret());
  });

  it('come back only under the site secret they were sealed with, and never stand in the open', () => {
    const sealed = sealSecret(secret, 'a'.repeat(32));
    expect(sealed).not.toContain(secret);
    expect(sealSecret(secret, 'a'.repeat(32))).not.toBe(sealed);
    expect(openSecret(sealed, 'a'.repeat(32))).toBe(secret);
    expect(openSecret(sealed, 'b'.repeat(32))).toBeNull();
  });

  it('are handed to an authenticator as an otpauth address', () => {
    expect(factorUri(secret, 'owner@tiltwright.example')).toBe(
      `otpauth://totp/Tiltwright:owner%40tiltwright.example?issuer=Tiltwright&secret=${secret}&algorithm=SHA1&digits=6&period=30`,
    );
  });
});

it('recovery codes are ten, all different, and stand copying with other marks and letters', () => {
  const codes = newRecoveryCodes();
  expect(new Set(codes).size).toBe(10);
  expect(codes.every((code) => /^([a-z2-7]{4}-){3}[a-z2-7]{4}$/.test(code))).toBe(true);
  expect(hashRecoveryCode(codes[0]!.toUpperCase().replaceAll('-', ' '))).toBe(hashRecoveryCode(codes[0]!));
});
