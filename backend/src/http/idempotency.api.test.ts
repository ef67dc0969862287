import { expect, test } from 'vitest';
import { expectProblem, testApp } from '../../../tests/support/test-app.ts';
import { idempotencyKeys } from '../db/schema/limits.ts';
import { apiKeys } from '../db/schema/people.ts';

const order = { name: 'Stock list', scopes: ['catalog:read'] };

test('a key made twice under one mark is made once, and its secret is not told again', async () => {
  const app = testApp();
  const agent = await app.as('integrator');
  const send = (body: object, mark: string) => agent.post('/api/v1/me/keys').set('Idempotency-Key', mark).send(body);
  const first = await send(order, 'nightly-1').expect(201);
  const second = await send(order, 'nightly-1');
  expect(expectProblem(second, 'already-created').detail).toContain(first.body.id);
  expect(second.text).not.toContain(first.body.key);
  expect(app.db.select().from(apiKeys).all()).toHaveLength(1);
  expect(JSON.stringify(app.db.select().from(idempotencyKeys).all())).not.toContain(first.body.key.split('.')[2]);
  expectProblem(await send({ ...order, name: 'Another' }, 'nightly-1'), 'idempotency-mismatch');
  await send(order, 'nightly-2').expect(201);
});

test('a creation that was refused may be tried again under its mark', async () => {
  const agent = await testApp().as('integrator');
  const send = (body: object) => agent.post('/api/v1/me/keys').set('Idempotency-Key', 'one').send(body);
  expectProblem(await send({ name: '' }), 'invalid-input');
  await send(order).expect(201);
});

test('another caller’s mark is another mark, and one that no header can carry is refused', async () => {
  const app = testApp();
  const agent = await app.as('integrator');
  await agent.post('/api/v1/me/keys').set('Idempotency-Key', 'same').send(order).expect(201);
  const other = await app.as('customer');
  expectProblem(await other.post('/api/v1/me/keys').set('Idempotency-Key', 'same').send(order), 'not-allowed');
  expectProblem(await agent.post('/api/v1/me/keys').set('Idempotency-Key', 'x'.repeat(201)).send(order), 'invalid-input');
});

test('a mark is forgotten after a day, and a first try that died with its process after a minute', async () => {
  const app = testApp();
  const agent = await app.as('integrator');
  const send = () => agent.post('/api/v1/me/keys').set('Idempotency-Key', 'old').send(order);
  await send().expect(201);
  app.db
    .update(idempotencyKeys)
    .set({ answer: null, createdAt: Date.now() - 5_000 })
    .run();
  expectProblem(await send(), 'idempotency-at-work');
  app.db
    .update(idempotencyKeys)
    .set({ createdAt: Date.now() - 61_000 })
    .run();
  await send().expect(201);
  app.db
    .update(idempotencyKeys)
    .set({ createdAt: Date.now() - 25 * 3_600_000 })
    .run();
  await send().expect(201);
  expect(app.db.select().from(idempotencyKeys).all()).toHaveLength(1);
});
