// An authenticator of our own for tests, straight from RFC 4226 section 5.3 and RFC 6238 section 4.2.
import { createHmac } from 'node:crypto';

const alphabet = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ234567';

function fromBase32(text: string): Buffer {
  const bits = [...text].map((letter) => alphabet.indexOf(letter).toString(2).padStart(5, '0')).join('');
  return Buffer.from(bits.match(/.{8}/g)!.map((byte) => Number.parseInt(byte, 2)));
}

/** Six digits for now, or some 30-second steps ahead: a code works once, and a test does not wait for the next. */
export function oneTimeCode(secret: string, stepsAhead = 0, nowMs = Date.now()): string {
  const counter = Buffer.alloc(8);
  counter.writeBigUInt64BE(BigInt(Math.floor(nowMs / 30_000) + stepsAhead));
  const hash = createHmac('sha1', fromBase32(secret)).update(counter).digest();
  const truncated = hash.readUInt32BE(hash[19]! & 0xf) & 0x7fffffff;
  return String(truncated % 1_000_000).padStart(6, '0');
}
