import { CreatedKey, Key } from '@tiltwright/shared/schemas/account.ts';
import type supertest from 'supertest';
import { expect, test } from 'vitest';
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
  const other = await app.as('visitor');
  await other
    .post('/api/v1/accounts')
    .send({ email: 'other@tiltwright.example', password: 'twelve or more', name: 'Other', integrator: true })
    .expect(201);
  expect((await other.get('/api/v1/me/keys').expect(200)).body.data).toEqual([]);
  expectProblem(await other.delete(`/api/v1/me/keys/${created.id}`), 'not-found');
});

test.each(callers)('%s and keys: integrators only', async (caller) => {
  const agent: supertest.Agent = await testApp().as(caller);
  const answer = await agent.post('/api/v1/me/keys').send({ name: 'Mine', scopes: ['catalog:read'] });
  if (caller === 'integrator') expect(answer.status).toBe(201);
  else expectProblem(answer, caller === 'visitor' ? 'sign-in-needed' : 'not-allowed');
});
