// Time-based one-time codes (RFC 6238 over RFC 4226): six digits, SHA-1, 30 s, as every authenticator has them.
import { createCipheriv, createDecipheriv, hkdfSync, randomBytes } from 'node:crypto';
import { Secret, TOTP } from 'otpauth';
import { hashSecret } from './keys.ts';

const periodS = 30;
/** One step either way: a phone's clock may be half a minute off. */
const window = 1;

const totp = (secret: string, label: string) =>
  new TOTP({ issuer: 'Tiltwright', label, secret: Secret.fromBase32(secret), algorithm: 'SHA1', digits: 6, period: periodS });

/** 160 random bits, as RFC 4226 section 4 recommends; base32. */
export const newFactorSecret = () => new Secret({ size: 20 }).base32;

export const factorUri = (secret: string, email: string) => totp(secret, email).toString();

/**
 * The 30-second step the code stands for, or null where it is wrong or not newer than `lastStep`: a code works once.
 */
export function stepOfCode(secret: string, code: string, lastStep: number, nowMs: number): number | null {
  if (!/^\d{6}$/.test(code)) return null;
  const delta = totp(secret, '').validate({ token: code, timestamp: nowMs, window });
  if (delta === null) return null;
  const step = Math.floor(nowMs / 1000 / periodS) + delta;
  return step > lastStep ? step : null;
}

const sealingKey = (siteSecret: string) => Buffer.from(hkdfSync('sha256', siteSecret, '', 'second factors', 32));

/** AES-256-GCM under a key drawn from the site's secret: a copy of the database alone makes no codes. */
export function sealSecret(secret: string, siteSecret: string): string {
  const nonce = randomBytes(12);
  const cipher = createCipheriv('aes-256-gcm', sealingKey(siteSecret), nonce);
  const sealed = Buffer.concat([cipher.update(secret, 'utf8'), cipher.final()]);
  return Buffer.concat([nonce, cipher.getAuthTag(), sealed]).toString('base64url');
}

/** Null where the site's secret is no longer the one it was sealed under. */
export function openSecret(sealed: string, siteSecret: string): string | null {
  const bytes = Buffer.from(sealed, 'base64url');
  const cipher = createDecipheriv('aes-256-gcm', sealingKey(siteSecret), bytes.subarray(0, 12));
  cipher.setAuthTag(bytes.subarray(12, 28));
  try {
    return Buffer.concat([cipher.update(bytes.subarray(28)), cipher.final()]).toString('utf8');
  } catch {
    return null;
  }
}

/** 80 random bits in four groups, read over the phone without mistaking 0 for O. */
export function newRecoveryCodes(count = 10): string[] {
  return Array.from({ length: count }, () => new Secret({ size: 10 }).base32.toLowerCase().match(/.{4}/g)!.join('-'));
}

/** As it is stored: without what people add or leave out when they copy a code. */
export const hashRecoveryCode = (code: string) => hashSecret(code.toLowerCase().replace(/[^a-z0-9]/g, ''));
