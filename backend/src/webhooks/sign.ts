// Signatures of the Standard Webhooks specification: HMAC-SHA256 over id, timestamp and body, base64, version v1.
import { createHmac, randomBytes } from 'node:crypto';

const prefix = 'whsec_';

/** 32 random bytes; the specification asks for 24 to 64. */
export const newWebhookSecret = () => `${prefix}${randomBytes(32).toString('base64')}`;

export function signature(secret: string, messageId: string, timestampSeconds: number, body: string): string {
  const key = Buffer.from(secret.startsWith(prefix) ? secret.slice(prefix.length) : secret, 'base64');
  return `v1,${createHmac('sha256', key).update(`${messageId}.${timestampSeconds}.${body}`).digest('base64')}`;
}

/** Headers of one try; with two secrets the receiver may have either. */
export function signedHeaders(
  secrets: readonly string[],
  messageId: string,
  timestampSeconds: number,
  body: string,
): Record<string, string> {
  return {
    'webhook-id': messageId,
    'webhook-timestamp': String(timestampSeconds),
    'webhook-signature': secrets.map((secret) => signature(secret, messageId, timestampSeconds, body)).join(' '),
  };
}
