import { Webhook } from 'standardwebhooks';
import { expect, test } from 'vitest';
import { newWebhookSecret, signature, signedHeaders } from './sign.ts';

// Example values of the Standard Webhooks reference libraries ("sign function works").
const published = {
  secret: 'whsec_MfKQ9r8GKYqrTwjUPD8ILPZIo2LaLaSw',
  id: 'msg_p5jXN8AQM9LWM0D4loKWxJek',
  timestamp: 1614265330,
  body: '{"test": 2432232314}',
  signature: 'v1,g0hM9SsE+OTPJTGt/tmIKtSyZlE3uFJELVlNIOLJ1OE=',
};

test('the specification’s published example is signed as published', () => {
  const { secret, id, timestamp, body } = published;
  expect(signature(secret, id, timestamp, body)).toBe(published.signature);
});

test('the reference library accepts what is signed here, with either secret of a rotation, and nothing else', () => {
  const [now, before] = [newWebhookSecret(), newWebhookSecret()];
  const body = JSON.stringify({ type: 'edition.published', data: { why: 'Lake Ösier, 16′ 8″' } });
  const headers = signedHeaders([now, before], 'evt_7', Math.floor(Date.now() / 1000), body);
  expect(new Webhook(now).verify(body, headers)).toEqual(JSON.parse(body));
  expect(new Webhook(before).verify(body, headers)).toEqual(JSON.parse(body));
  expect(() => new Webhook(newWebhookSecret()).verify(body, headers)).toThrow(/No matching signature/);
  expect(() => new Webhook(now).verify(`${body} `, headers)).toThrow(/No matching signature/);
  expect(() => new Webhook(now).verify(body, { ...headers, 'webhook-id': 'evt_8' })).toThrow(/No matching signature/);
});

test('secrets are as long as the specification asks, 24 to 64 bytes', () => {
  const bytes = Buffer.from(newWebhookSecret().replace('whsec_', ''), 'base64').length;
  expect(bytes).toBeGreaterThanOrEqual(24);
  expect(bytes).toBeLessThanOrEqual(64);
});
