import { CreatedKey, Key } from '@tiltwright/shared/schemas/account.ts';
import type supertest from 'supertest';
import { expect, test } from 'vitest';
import { newcomer } from '../../../../tests/support/people.ts';
import { callers, expectProblem, parsed, testApp } from '../../../../tests/support/test-app.ts';
import { apiKeys } from '../../db/schema/people.ts';
import { listOf } from '../../http/cursor.ts';

async function withKey(scopes: string[]) {
  const app = testApp();
  const integrator = await app.as('integrator');
  const created = parsed(CreatedKey, await integrator.post('/api/v1/me/keys').send({ name: 'Stock list', scopes }).expect(201));
  return { app, integrator, created, program: await app.as('visitor') };
}

test('a key is shown once and stored hashed', async () => {
  const { app, integrator, created } = await withKey(['catalog:read']);
  expect(created.key).toMatch(/^tiltwright\.key_\w{26}\.[\w-]{43}$/);
  const listed = await integrator.get('/api/v1/me/keys').expect(200);
  expect(parsed(listOf(Key), listed).data).toHaveLength(1);
  const secret = created.key.split('.')[2]!;
  expect(listed.text).not.toContain(secret);
  expect(JSON.stringify(app.db.select().from(apiKeys).all())).not.toContain(secret);
});

test('a key does what its scopes say and no more', async () => {
  const { program, created } = await withKey(['catalog:read']);
  const bearer = { Authorization: `Bearer ${created.key}` };
  await program.get('/api/v1/hulls?limit=1').set(bearer).expect(200);
  expectProblem(await program.post('/api/v1/fits').set(bearer).send({}), 'scope-missing');
  expectProblem(await program.get('/api/v1/me').set(bearer), 'not-allowed');
  expectProblem(await program.get('/api/v1/me/keys').set(bearer), 'not-allowed');
});

test('a revoked, mistyped or invented key is refused with the one problem shape', async () => {
  const { integrator, program, created } = await withKey(['catalog:read']);
  for (const key of [`${created.key.slice(0, -1)}~`, created.key.replace('key_', 'key_0'), 'nonsense']) {
    const answer = await program.get('/api/v1/hulls').set('Authorization', `Bearer ${key}`);
    expectProblem(answer, 'invalid-key');
    expect(answer.headers['www-authenticate']).toMatch(/^Bearer/);
  }
  await integrator.delete(`/api/v1/me/keys/${created.id}`).expect(204);
  expectProblem(await program.get('/api/v1/hulls').set('Authorization', `Bearer ${created.key}`), 'invalid-key');
});

test('a token in the address or the body is refused, and a server key in a browser too', async () => {
  const { program, created } = await withKey(['catalog:read']);
  expectProblem(await program.get(`/api/v1/hulls?access_token=${created.key}`), 'token-misplaced');
  expectProblem(await program.post('/api/v1/fits').send({ access_token: created.key }), 'token-misplaced');
  expectProblem(
    await program.get('/api/v1/hulls').set('Authorization', `Bearer ${created.key}`).set('Origin', 'https://shop.example'),
    'foreign-origin',
  );
});

test('another integrator’s key is neither seen nor revoked', async () => {
  const { app, created } = await withKey(['catalog:read']);
  const { agent: other } = await newcomer(app, { email: 'other@tiltwright.example', integrator: true });
  expect((await other.get('/api/v1/me/keys').expect(200)).body.data).toEqual([]);
  expectProblem(await other.delete(`/api/v1/me/keys/${created.id}`), 'not-found');
});

test.each(callers)('%s and keys: integrators only', async (caller) => {
  const agent: supertest.Agent = await testApp().as(caller);
  const answer = await agent.post('/api/v1/me/keys').send({ name: 'Mine', scopes: ['catalog:read'] });
  if (caller === 'integrator') expect(answer.status).toBe(201);
  else expectProblem(answer, caller === 'visitor' ? 'sign-in-needed' : 'not-allowed');
});

test('after a rotation both secrets work for the overlap, then the new one alone', async () => {
  const { app, integrator, program, created } = await withKey(['catalog:read']);
  const asks = (key: string) => program.get('/api/v1/makers').set('Authorization', `Bearer ${key}`);
  const rotated = parsed(CreatedKey, await integrator.post(`/api/v1/me/keys/${created.id}/rotate`).send({ overlapHours: 2 }).expect(200));
  expect(rotated.id).toBe(created.id);
  expect(rotated.key).not.toBe(created.key);
  expect(Date.parse(rotated.previousUntil!) - Date.now()).toBeGreaterThan(7_100_000);
  await asks(created.key).expect(200);
  await asks(rotated.key).expect(200);
  app.db.update(apiKeys).set({ previousUntil: '2020-01-01T00:00:00.000Z' }).run();
  expectProblem(await asks(created.key), 'invalid-key');
  await asks(rotated.key).expect(200);
  const last = parsed(CreatedKey, await integrator.post(`/api/v1/me/keys/${created.id}/rotate`).send({ overlapHours: 0 }).expect(200));
  expectProblem(await asks(rotated.key), 'invalid-key');
  await asks(last.key).expect(200);
  await integrator.delete(`/api/v1/me/keys/${created.id}`).expect(204);
  expectProblem(await integrator.post(`/api/v1/me/keys/${created.id}/rotate`).send({}), 'wrong-state');
});

test('revoking in the overlap ends both secrets, and an expired key is out', async () => {
  const { app, integrator, program, created } = await withKey(['catalog:read']);
  const asks = (key: string) => program.get('/api/v1/makers').set('Authorization', `Bearer ${key}`);
  const rotated = parsed(CreatedKey, await integrator.post(`/api/v1/me/keys/${created.id}/rotate`).send({}).expect(200));
  app.db.update(apiKeys).set({ expiresAt: '2020-01-01T00:00:00.000Z' }).run();
  expectProblem(await asks(rotated.key), 'invalid-key');
  app.db.update(apiKeys).set({ expiresAt: null }).run();
  await asks(rotated.key).expect(200);
  await integrator.delete(`/api/v1/me/keys/${created.id}`).expect(204);
  for (const key of [created.key, rotated.key]) expectProblem(await asks(key), 'invalid-key');
});

test('a browser key works from its origins alone, and only asks', async () => {
  const app = testApp();
  const integrator = await app.as('integrator');
  const order = { name: 'Shop page', kind: 'browser', origins: ['https://shop.example'], scopes: ['catalog:read', 'fit:compute'] };
  const { key } = parsed(CreatedKey, await integrator.post('/api/v1/me/keys').send(order).expect(201));
  const page = await app.as('visitor');
  const ask = (origin: string | undefined) => {
    const request = page.get('/api/v1/makers').set('Authorization', `Bearer ${key}`);
    return origin === undefined ? request : request.set('Origin', origin);
  };
  const answer = await ask('https://shop.example').expect(200);
  expect(answer.headers['access-control-allow-origin']).toBe('https://shop.example');
  expect(answer.headers['access-control-allow-credentials']).toBeUndefined();
  expect(answer.headers['access-control-expose-headers']).toContain('RateLimit');
  expect(answer.headers.vary).toContain('Origin');
  for (const origin of ['https://elsewhere.example', 'https://shop.example.evil.example', 'http://shop.example', 'null', undefined]) {
    const refused = await ask(origin);
    expectProblem(refused, 'foreign-origin');
    expect(refused.headers['access-control-allow-origin']).toBeUndefined();
  }
  const posted = await page
    .post('/api/v1/tilt')
    .set('Authorization', `Bearer ${key}`)
    .set('Origin', 'https://shop.example')
    .send({ hull: 'hul_nothing', speedKn: 5 });
  expectProblem(posted, 'unknown-part');
  expect(posted.headers['access-control-allow-origin']).toBe('https://shop.example');
});

test('a browser’s question ahead is answered without a cookie or a key', async () => {
  const agent = await testApp().as('visitor');
  const answer = await agent
    .options('/api/v1/fits')
    .set('Origin', 'https://shop.example')
    .set('Access-Control-Request-Method', 'POST')
    .set('Access-Control-Request-Headers', 'authorization,content-type')
    .expect(204);
  expect(answer.headers['access-control-allow-methods']).toContain('POST');
  expect(answer.headers['access-control-allow-headers']).toContain('Authorization');
  expect(answer.headers['access-control-allow-credentials']).toBeUndefined();
});

test.each([
  ['/origins', { kind: 'browser' }],
  ['/origins', { kind: 'server', origins: ['https://shop.example'] }],
  ['/scopes', { kind: 'browser', origins: ['https://shop.example'], scopes: ['boats:write'] }],
  ['/origins/0', { kind: 'browser', origins: ['https://shop.example/page'] }],
  ['/origins/0', { kind: 'browser', origins: ['*'] }],
])('a key order with a wrong %s is refused', async (path, wrong) => {
  const agent = await testApp().as('integrator');
  const problem = expectProblem(
    await agent.post('/api/v1/me/keys').send({ name: 'Page', scopes: ['catalog:read'], ...wrong }),
    'invalid-input',
  );
  expect(problem.issues.map((issue) => issue.path)).toContain(path);
});

test('a foreign page with a stolen cookie gains nothing from a made-up Authorization header', async () => {
  const agent = await testApp().as('integrator');
  const answer = await agent
    .post('/api/v1/me/keys')
    .set('Origin', 'https://elsewhere.example')
    .set('Authorization', 'Basic YTpi')
    .send({ name: 'Planted', scopes: ['catalog:read'] });
  expectProblem(answer, 'invalid-key');
});
