import { Limit } from '@tiltwright/shared/schemas/limit.ts';
import { expect, test } from 'vitest';
import { expectProblem, parsed, testApp } from '../../../tests/support/test-app.ts';
import type { Db } from '../db/connect.ts';
import { editions } from '../db/schema/catalog.ts';
import { currentEdition } from '../resources/catalog/queries.ts';
import { listOf } from './cursor.ts';
import { networkOf } from './limits.ts';

const tilt = '/api/v1/tilt?speedKn=10&hull=';

/** An edition without a change. */
function publishNothing(db: Db): void {
  const edition = currentEdition(db) + 1;
  db.insert(editions).values({ edition, publishedAt: new Date().toISOString(), actor: 'usr_test', why: null, records: 0 }).run();
}

test('every answer says the limit and what is left of it', async () => {
  const agent = await testApp({ LIMIT_ANONYMOUS: '60' }).as('visitor');
  const first = await agent.get('/api/v1/hulls?limit=1').expect(200);
  expect(first.headers['ratelimit-policy']).toBe('"anonymous";q=60;w=60');
  expect(first.headers.ratelimit).toMatch(/^"anonymous";r=59;t=(60|59)$/);
  const second = await agent.get('/api/v1/makers').expect(200);
  expect(second.headers.ratelimit).toMatch(/^"anonymous";r=58;t=/);
});

test('past the limit: 429 with when to come back, and nothing is done', async () => {
  const agent = await testApp({ LIMIT_ANONYMOUS: '3' }).as('visitor');
  for (let asked = 0; asked < 3; asked++) await agent.get('/api/v1/makers').expect(200);
  const answer = await agent.get('/api/v1/makers');
  const problem = expectProblem(answer, 'too-many-requests');
  expect(problem.detail).toContain('3 units');
  const seconds = Number(answer.headers['retry-after']);
  expect(seconds).toBeGreaterThan(0);
  expect(seconds).toBeLessThanOrEqual(60);
  expect(answer.headers.ratelimit).toMatch(/r=0/);
  expect(answer.headers.etag).toBeUndefined();
});

test('questions cost what they take: a plain fit 2, a sampled one 20, a wrong one its base', async () => {
  const agent = await testApp({ LIMIT_ANONYMOUS: '100' }).as('visitor');
  const { example } = (await agent.get('/api/v1/openapi.json')).body.paths['/fits'].post.requestBody.content['application/json'];
  await agent
    .post('/api/v1/fits')
    .send({ ...example, uncertainty: 'none' })
    .expect(200);
  await agent.post('/api/v1/fits').send(example).expect(200);
  expectProblem(await agent.post('/api/v1/fits').send({}), 'invalid-input');
  // 100 − 2 − 20 − 2 − 1
  expect((await agent.get('/api/v1/makers').expect(200)).headers.ratelimit).toMatch(/r=75/);
});

test('health, the document, the session and signing in cost nothing', async () => {
  const agent = await testApp({ LIMIT_ANONYMOUS: '1' }).as('visitor');
  await agent.get('/api/v1/makers').expect(200);
  expectProblem(await agent.get('/api/v1/makers'), 'too-many-requests');
  for (const address of ['/healthz', '/readyz', '/api/v1/openapi.json', '/api/v1/session', '/api/docs/']) {
    const { headers } = await agent.get(address).expect(200);
    expect(headers.ratelimit, address).toBeUndefined();
  }
});

test('pages of the site, accounts and addresses each have a count of their own', async () => {
  const app = testApp({ LIMIT_ANONYMOUS: '1', LIMIT_PAGE: '5', LIMIT_ACCOUNT: '9' });
  const visitor = await app.as('visitor');
  await visitor.get('/api/v1/makers').expect(200);
  expectProblem(await visitor.get('/api/v1/makers'), 'too-many-requests');
  const onPage = await visitor.get('/api/v1/makers').set('Sec-Fetch-Site', 'same-origin').expect(200);
  expect(onPage.headers['ratelimit-policy']).toBe('"page";q=5;w=60');
  const customer = await app.as('customer');
  expect((await customer.get('/api/v1/makers').expect(200)).headers.ratelimit).toMatch(/^"account";r=8/);
  const steward = await app.as('steward');
  expect((await steward.get('/api/v1/makers').expect(200)).headers.ratelimit).toMatch(/^"account";r=8/);
});

test('a key has a minute and a day, and the day outlives the process', async () => {
  const app = testApp({ LIMIT_KEY: '100', LIMIT_KEY_DAY: '3' });
  const integrator = await app.as('integrator');
  const created = await integrator.post('/api/v1/me/keys').send({ name: 'Stock', scopes: ['catalog:read'] });
  const bearer = { Authorization: `Bearer ${created.body.key}` };
  const program = await app.as('visitor');
  const first = await program.get('/api/v1/makers').set(bearer).expect(200);
  expect(first.headers['ratelimit-policy']).toBe('"key";q=100;w=60, "key-day";q=3;w=86400');
  expect(first.headers.ratelimit).toMatch(/"key";r=99;t=\d+, "key-day";r=2;t=\d+/);
  await program.get('/api/v1/makers').set(bearer).expect(200);
  await program.get('/api/v1/makers').set(bearer).expect(200);
  const over = await program.get('/api/v1/makers').set(bearer);
  expect(expectProblem(over, 'too-many-requests').detail).toContain('midnight');
  const { data } = (await integrator.get('/api/v1/me/usage').expect(200)).body;
  expect(data).toEqual([{ key: created.body.id, day: new Date().toISOString().slice(0, 10), requests: 4, units: 3, refused: 1 }]);
  const restarted = await app.again().as('visitor');
  expectProblem(await restarted.get('/api/v1/makers').set(bearer), 'too-many-requests');
});

test('the admin changes a limit at once, and back', async () => {
  const app = testApp({ LIMIT_ANONYMOUS: '60' });
  const admin = await app.as('admin');
  const visitor = await app.as('visitor');
  expect(parsed(listOf(Limit), await admin.get('/api/v1/limits').expect(200)).data.map(({ caller }) => caller)).toEqual([
    'anonymous',
    'page',
    'account',
    'key',
  ]);
  const changed = parsed(Limit, await admin.put('/api/v1/limits/anonymous').send({ unitsPerMinute: 7 }).expect(200));
  expect(changed).toMatchObject({ unitsPerMinute: 7, changedBy: expect.stringMatching(/^usr_/) });
  expect((await visitor.get('/api/v1/makers').expect(200)).headers['ratelimit-policy']).toBe('"anonymous";q=7;w=60');
  expectProblem(await admin.put('/api/v1/limits/anonymous').send({ unitsPerMinute: 0 }), 'invalid-input');
  await admin.delete('/api/v1/limits/anonymous').expect(204);
  expect((await visitor.get('/api/v1/makers').expect(200)).headers['ratelimit-policy']).toBe('"anonymous";q=60;w=60');
  for (const caller of ['customer', 'integrator', 'steward'] as const) {
    const agent = await app.as(caller);
    expectProblem(await agent.get('/api/v1/limits'), 'not-allowed');
    expectProblem(await agent.put('/api/v1/limits/anonymous').send({ unitsPerMinute: 7 }), 'not-allowed');
  }
});

test('an answer of the catalog is 304 for whoever has it, until the next edition', async () => {
  const app = testApp();
  const agent = await app.as('visitor');
  const { id } = (await agent.get('/api/v1/hulls?limit=1')).body.data[0];
  for (const address of [`${tilt}${id}`, '/api/v1/hulls?limit=3', '/api/v1/search?q=reedcutter', `/api/v1/hulls/${id}/trim?speedKn=9`]) {
    const fresh = await agent.get(address).expect(200);
    const etag = fresh.headers.etag!;
    await agent.get(address).set('If-None-Match', etag).expect(304);
    // Kept answers read as made ones.
    const again = await agent.get(address).expect(200);
    expect(again.body).toEqual(fresh.body);
    expect(again.headers.etag).toBe(etag);
    publishNothing(app.db);
    const after = await agent.get(address).set('If-None-Match', etag).expect(200);
    expect(after.headers.etag).not.toBe(etag);
  }
});

test('a home line with IPv6 is one caller', () => {
  expect(networkOf('2001:db8:1:2:3:4:5:6')).toBe(networkOf('2001:db8:1:2::9'));
  expect(networkOf('2001:db8:1:2::1')).not.toBe(networkOf('2001:db8:1:3::1'));
  expect(networkOf('2001:0db8::1')).toBe('2001:db8:0:0');
  expect(networkOf('::ffff:192.0.2.7')).toBe('192.0.2.7');
  expect(networkOf('192.0.2.7')).toBe('192.0.2.7');
});
