// API keys: tiltwright.<id>.<secret>. The secret is 256 random bits, shown once and stored as SHA-256.
import { createHash, randomBytes, timingSafeEqual } from 'node:crypto';

export interface KeyParts {
  id: string;
  secret: string;
}

export const hashSecret = (secret: string) => createHash('sha256').update(secret).digest('hex');
export const newSecret = () => randomBytes(32).toString('base64url');
export const writeKey = ({ id, secret }: KeyParts) => `tiltwright.${id}.${secret}`;
export const keyPrefix = (id: string) => `tiltwright.${id}.`;

export function readKey(text: string): KeyParts | undefined {
  const match = /^tiltwright\.(key_[0-9A-Za-z]{26})\.([\w-]{43})$/.exec(text);
  return match ? { id: match[1]!, secret: match[2]! } : undefined;
}

export const secretMatches = (secret: string, storedHash: string) =>
  timingSafeEqual(Buffer.from(hashSecret(secret), 'hex'), Buffer.from(storedHash, 'hex'));
