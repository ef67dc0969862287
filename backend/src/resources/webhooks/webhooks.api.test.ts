import http from 'node:http';
import type { AddressInfo } from 'node:net';
import { CreatedWebhook, Delivery, Webhook as HookSchema } from '@tiltwright/shared/schemas/webhook.ts';
import { eq } from 'drizzle-orm';
import { Webhook as Verifier } from 'standardwebhooks';
import { expect, onTestFinished, test } from 'vitest';
import { callers, expectProblem, parsed, type TestApp, testApp } from '../../../../tests/support/test-app.ts';
import { mailOutbox } from '../../db/schema/mail.ts';
import { outbox } from '../../db/schema/outbox.ts';
import { auditLog } from '../../db/schema/people.ts';
import { deliveries, webhooks } from '../../db/schema/webhooks.ts';
import { listOf } from '../../http/cursor.ts';
import { deliverDue, removeOldDeliveries, retryWaitsMs } from '../../webhooks/deliver.ts';
import { spreadEvents } from '../../webhooks/spread-events.ts';

const order = { url: 'https://shop.example/tiltwright', name: 'Stock', topics: ['edition.published'] };
const open = { httpsOnly: false, privateToo: true };

interface Received {
  headers: Record<string, string>;
  body: string;
}

/** A shop's receiver on loopback; `status` is what it answers next. */
async function receiver() {
  const received: Received[] = [];
  const state = { status: 204, received, url: '' };
  const server = http
    .createServer((req, res) => {
      let body = '';
      req.on('data', (piece: Buffer) => {
        body += piece.toString();
      });
      req.on('end', () => {
        received.push({ headers: req.headers as Record<string, string>, body });
        res.writeHead(state.status).end();
      });
    })
    .listen(0, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  onTestFinished(() => void server.close());
  state.url = `http://127.0.0.1:${(server.address() as AddressInfo).port}/hook`;
  return state;
}

async function hooked(topics = ['edition.published']) {
  const app = testApp({ WEBHOOK_PRIVATE_TARGETS: 'true' });
  spreadEverything(app);
  const shop = await receiver();
  const agent = await app.as('integrator');
  const hook = parsed(
    CreatedWebhook,
    await agent
      .post('/api/v1/me/webhooks')
      .send({ ...order, url: shop.url, topics })
      .expect(201),
  );
  return { app, shop, agent, hook };
}

const spreadEverything = ({ db }: TestApp) => {
  while (spreadEvents(db) > 0);
};
const deliver = ({ db }: TestApp, at = Date.now()) => deliverDue(db, { rules: open, siteUrl: 'https://site.example', now: () => at });
function tell(
  { db }: TestApp,
  topic: 'edition.published' | 'hull.changed' | 'correction.decided',
  payload: Record<string, unknown>,
  edition: number | null = null,
) {
  db.insert(outbox).values({ topic, edition, payload, createdAt: new Date().toISOString() }).run();
}

test('an event reaches the receiver once, signed so that the reference library accepts it', async () => {
  const { app, shop, hook, agent } = await hooked();
  tell(app, 'edition.published', { edition: 77, records: 3, why: null }, 77);
  spreadEverything(app);
  spreadEverything(app);
  await deliver(app);
  await deliver(app);
  expect(shop.received).toHaveLength(1);
  const { headers, body } = shop.received[0]!;
  const message = new Verifier(hook.secret).verify(body, headers);
  expect(message).toMatchObject({ type: 'edition.published', data: { edition: 77, records: 3, hullsChanged: 0, hullsToldSingly: true } });
  const { data } = parsed(listOf(Delivery), await agent.get(`/api/v1/me/webhooks/${hook.id}/deliveries`).expect(200));
  expect(data).toHaveLength(1);
  expect(data[0]).toMatchObject({ status: 'delivered', tries: 1, lastStatus: 204, body, messageId: headers['webhook-id'] });
});

test('what a receiver did not ask for, and what was before it, it is not told', async () => {
  const { app, shop } = await hooked();
  tell(app, 'hull.changed', { hull: 'hul_x', edition: 5 }, 5);
  spreadEverything(app);
  await deliver(app);
  expect(shop.received).toEqual([]);
  expect(app.db.select().from(deliveries).all()).toEqual([]);
});

test('an edition of a thousand hulls is told once, not a thousand times', async () => {
  const { app, shop } = await hooked(['edition.published', 'hull.changed']);
  for (let n = 0; n < 501; n++) tell(app, 'hull.changed', { hull: `hul_${n}`, edition: 9 }, 9);
  tell(app, 'edition.published', { edition: 9, records: 501, why: null }, 9);
  spreadEverything(app);
  await deliver(app);
  expect(shop.received.map(({ body }) => JSON.parse(body).data)).toEqual([
    { edition: 9, records: 501, why: null, hullsChanged: 501, hullsToldSingly: false },
  ]);
});

test('a correction is told to its author alone, without naming the author', async () => {
  const { app, shop, hook } = await hooked(['correction.decided']);
  const { userId } = app.db.select().from(webhooks).where(eq(webhooks.id, hook.id)).get()!;
  tell(app, 'correction.decided', { correction: 'cor_1', author: userId, decision: 'accepted' });
  tell(app, 'correction.decided', { correction: 'cor_2', author: 'usr_other', decision: 'accepted' });
  spreadEverything(app);
  await deliver(app);
  expect(shop.received.map(({ body }) => JSON.parse(body).data)).toEqual([{ correction: 'cor_1', decision: 'accepted' }]);
});

test('a failing receiver is tried for three days with growing waits, then disabled with one mail', async () => {
  const { app, shop, agent, hook } = await hooked();
  shop.status = 503;
  tell(app, 'edition.published', { edition: 1 }, 1);
  tell(app, 'edition.published', { edition: 2 }, 2);
  spreadEverything(app);
  let at = Date.now();
  const began = at;
  for (const wait of retryWaitsMs) {
    await deliver(app, at);
    const before = shop.received.length;
    // Not a moment before it is due.
    await deliver(app, at + wait - 1);
    expect(shop.received).toHaveLength(before);
    at += Math.ceil(wait * 1.1) + 1;
  }
  await deliver(app, at);
  expect(at - began).toBeGreaterThan(3 * 86_400_000);
  const ids = new Set(shop.received.map(({ headers }) => headers['webhook-id']));
  expect(ids.size).toBe(2);
  const row = app.db.select().from(webhooks).get()!;
  expect(row.disabledWhy).toContain('answered 503');
  const mails = app.db
    .select()
    .from(mailOutbox)
    .all()
    .filter(({ kind }) => kind === 'webhook-disabled');
  expect(mails.map(({ toAddress }) => toAddress)).toEqual(['integrator@tiltwright.example']);
  expectProblem(await agent.post(`/api/v1/me/webhooks/${hook.id}/test`), 'wrong-state');
  const taken = parsed(HookSchema, await agent.patch(`/api/v1/me/webhooks/${hook.id}`).send({ enabled: true }).expect(200));
  expect(taken).toMatchObject({ disabledAt: null, disabledWhy: null });
});

test('410 Gone ends a webhook at once', async () => {
  const { app, shop } = await hooked();
  shop.status = 410;
  tell(app, 'edition.published', { edition: 1 }, 1);
  spreadEverything(app);
  await deliver(app);
  expect(app.db.select().from(webhooks).get()!.disabledWhy).toContain('410');
});

test('a try that went down with its process is made again under the same id', async () => {
  const { app, shop } = await hooked();
  tell(app, 'edition.published', { edition: 1 }, 1);
  spreadEverything(app);
  const at = Date.now();
  app.db
    .update(deliveries)
    .set({ status: 'sending', dueAt: at + 60_000 })
    .run();
  await deliver(app, at);
  expect(shop.received).toHaveLength(0);
  await deliver(app, at + 60_001);
  expect(shop.received).toHaveLength(1);
});

test('test, replay and rotation', async () => {
  const { app, shop, agent, hook } = await hooked();
  const sent = parsed(Delivery, await agent.post(`/api/v1/me/webhooks/${hook.id}/test`).expect(202));
  expectProblem(await agent.post(`/api/v1/me/webhooks/${hook.id}/deliveries/${sent.id}/replay`), 'wrong-state');
  await deliver(app);
  await agent.post(`/api/v1/me/webhooks/${hook.id}/deliveries/${sent.id}/replay`).expect(202);
  const rotated = parsed(CreatedWebhook, await agent.post(`/api/v1/me/webhooks/${hook.id}/rotate`).send({ overlapHours: 1 }).expect(200));
  await deliver(app);
  const [first, again] = shop.received as [Received, Received];
  expect(JSON.parse(first.body).type).toBe('webhook.test');
  expect(again.headers['webhook-id']).toBe(first.headers['webhook-id']);
  expect(again.body).toBe(first.body);
  for (const secret of [hook.secret, rotated.secret]) expect(() => new Verifier(secret).verify(again.body, again.headers)).not.toThrow();
  expect(() => new Verifier(rotated.secret).verify(first.body, first.headers)).toThrow();
});

test('deliveries that have ended are kept their time, those on their way longer', async () => {
  const { app, agent, hook } = await hooked();
  await agent.post(`/api/v1/me/webhooks/${hook.id}/test`).expect(202);
  expect(removeOldDeliveries(app.db, new Date(Date.now() + 1000))).toBe(0);
  await deliver(app);
  expect(removeOldDeliveries(app.db, new Date(Date.now() - 1000))).toBe(0);
  expect(removeOldDeliveries(app.db, new Date(Date.now() + 1000))).toBe(1);
});

test('secrets are shown once, and targets inside the network are refused', async () => {
  const app = testApp();
  const agent = await app.as('integrator');
  const created = parsed(CreatedWebhook, await agent.post('/api/v1/me/webhooks').send(order).expect(201));
  expect((await agent.get('/api/v1/me/webhooks')).text).not.toContain(created.secret);
  expect(JSON.stringify(app.db.select().from(auditLog).all())).not.toContain(created.secret);
  for (const url of ['http://127.0.0.1:9/', 'https://[::ffff:10.0.0.1]/', 'https://169.254.169.254/', 'https://a:b@shop.example/'])
    expect(expectProblem(await agent.post('/api/v1/me/webhooks').send({ ...order, url }), 'invalid-input').issues[0]!.path).toBe('/url');
  expectProblem(await agent.patch(`/api/v1/me/webhooks/${created.id}`).send({ url: 'https://10.0.0.1/' }), 'invalid-input');
});

test.each(callers)('%s and webhooks: integrators only, and only one’s own', async (caller) => {
  const { app, hook } = await hooked();
  const agent = await app.as(caller);
  const answer = await agent.get('/api/v1/me/webhooks');
  if (caller === 'integrator') expect(answer.body.data).toHaveLength(1);
  else {
    expectProblem(answer, caller === 'visitor' ? 'sign-in-needed' : 'not-allowed');
    expectProblem(await agent.delete(`/api/v1/me/webhooks/${hook.id}`), caller === 'visitor' ? 'sign-in-needed' : 'not-allowed');
  }
});

test('a key manages webhooks where its scope says so', async () => {
  const app = testApp();
  const integrator = await app.as('integrator');
  const program = await app.as('visitor');
  const key = async (scopes: string[]) => (await integrator.post('/api/v1/me/keys').send({ name: 'Hooks', scopes })).body.key as string;
  const list = (bearer: string) => program.get('/api/v1/me/webhooks').set('Authorization', `Bearer ${bearer}`);
  await list(await key(['webhooks:manage'])).expect(200);
  expectProblem(await list(await key(['catalog:read'])), 'scope-missing');
});
