import { Boat, SavedFit, Share, SharedFit } from '@tiltwright/shared/schemas/boat.ts';
import { expect, test } from 'vitest';
import type * as z from 'zod';
import { callers, expectProblem, parsed, type TestApp, testApp } from '../../../../tests/support/test-app.ts';
import { hashPassword } from '../../auth/passwords.ts';
import { users } from '../../db/schema/people.ts';
import { listOf } from '../../http/cursor.ts';
import { newId } from '../../ids.ts';
import { fitExample } from '../questions/examples.ts';

const newBoat = { name: 'The skiff', question: fitExample };
const plainFit = { name: 'Port side', question: { ...fitExample, uncertainty: 'none', alsoAt: undefined } };

/** Another customer with an account of their own. */
async function otherCustomer(app: TestApp) {
  const password = 'twelve or more';
  const email = 'other@tiltwright.example';
  const createdAt = new Date().toISOString();
  app.db
    .insert(users)
    .values({ id: newId('usr'), email, name: 'Other', passwordHash: await hashPassword(password), roles: ['customer'], createdAt })
    .run();
  const agent = await app.as('visitor');
  await agent.post('/api/v1/session').send({ email, password }).expect(200);
  return agent;
}

test('a boat is kept, read, changed and deleted', async () => {
  const agent = await testApp().as('customer');
  const created = await agent.post('/api/v1/me/boats').send(newBoat).expect(201);
  const boat = parsed(Boat, created);
  expect(boat).toMatchObject({ name: 'The skiff', story: null, hull: null, revision: 1 });
  const read = await agent.get(`/api/v1/me/boats/${boat.id}`).expect(200);
  expect(read.headers.etag).toBe(created.headers.etag);
  await agent.get(`/api/v1/me/boats/${boat.id}`).set('If-None-Match', read.headers.etag!).expect(304);
  const changed = parsed(Boat, await agent.patch(`/api/v1/me/boats/${boat.id}`).send({ name: 'The old skiff' }).expect(200));
  expect(changed).toMatchObject({ name: 'The old skiff', revision: 2, question: boat.question });
  await agent.delete(`/api/v1/me/boats/${boat.id}`).expect(204);
  expectProblem(await agent.get(`/api/v1/me/boats/${boat.id}`), 'not-found');
});

test('a change or a removal from a stale copy is refused and changes nothing', async () => {
  const agent = await testApp().as('customer');
  const created = await agent.post('/api/v1/me/boats').send(newBoat).expect(201);
  const address = `/api/v1/me/boats/${created.body.id}`;
  const stale = created.headers.etag!;
  const fresh = (await agent.patch(address).set('If-Match', stale).send({ story: 'Port side goes dark.' }).expect(200)).headers.etag!;
  expectProblem(await agent.patch(address).set('If-Match', stale).send({ name: 'Overwritten' }), 'stale-revision');
  expectProblem(await agent.delete(address).set('If-Match', stale), 'stale-revision');
  expect((await agent.get(address)).body).toMatchObject({ name: 'The skiff', revision: 2 });
  await agent.delete(address).set('If-Match', `"other", ${fresh}`).expect(204);
});

test('boats come in pages, each once', async () => {
  const agent = await testApp().as('customer');
  for (let n = 0; n < 4; n++)
    await agent
      .post('/api/v1/me/boats')
      .send({ ...newBoat, name: `Boat ${n}` })
      .expect(201);
  const ids: string[] = [];
  let next: string | null = '';
  while (next !== null) {
    const page: z.infer<ReturnType<typeof listOf<typeof Boat>>> = parsed(
      listOf(Boat),
      await agent.get(`/api/v1/me/boats?limit=3${next && `&cursor=${next}`}`).expect(200),
    );
    ids.push(...page.data.map(({ id }) => id));
    next = page.next;
  }
  expect(new Set(ids).size).toBe(7);
  expectProblem(await agent.get('/api/v1/me/boats?cursor=%00'), 'invalid-input');
});

test('a fit is asked once, kept with its answer, and asked anew when its question changes', async () => {
  const agent = await testApp().as('customer');
  const boat = (await agent.get('/api/v1/me/boats?limit=1')).body.data[0].id;
  const saved = parsed(
    SavedFit,
    await agent
      .post('/api/v1/me/fits')
      .send({ ...plainFit, boat })
      .expect(201),
  );
  const single = (await agent.post('/api/v1/fits').send(plainFit.question)).body;
  expect(saved.answer).toEqual(single);
  const noted = parsed(SavedFit, await agent.patch(`/api/v1/me/fits/${saved.id}`).send({ note: 'Tried.' }).expect(200));
  expect(noted).toMatchObject({ note: 'Tried.', revision: 2, answer: saved.answer });
  const moved = { ...plainFit.question, placement: { ...fitExample.placement, offsetMm: 500 } };
  const asked = parsed(SavedFit, await agent.patch(`/api/v1/me/fits/${saved.id}`).send({ question: moved }).expect(200));
  expect(asked.answer.answerDigest).not.toBe(saved.answer.answerDigest);
  expect((await agent.get(`/api/v1/me/fits?boat=${boat}`)).body.data).toHaveLength(1);
  await agent.delete(`/api/v1/me/boats/${boat}`).expect(204);
  expect((await agent.get(`/api/v1/me/fits/${saved.id}`)).body.boat).toBeNull();
});

test('one creation under one mark, also when it is sent twice at once', async () => {
  const agent = await testApp().as('customer');
  const send = () => agent.post('/api/v1/me/boats').set('Idempotency-Key', 'boat-1').send(newBoat);
  const [first, second] = await Promise.all([send(), send()]);
  expect([first.status, second.status]).toEqual([201, 201]);
  expect(second.body).toEqual(first.body);
  expect((await agent.get('/api/v1/me/boats')).body.data).toHaveLength(4);
});

test('a link opens one fit to anyone, shows nobody’s name, and ends when it is withdrawn', async () => {
  const app = testApp();
  const agent = await app.as('customer');
  const fit = (await agent.post('/api/v1/me/fits').send({ ...plainFit, note: 'For my eyes.' })).body;
  const share = parsed(Share, await agent.post('/api/v1/me/shares').send({ fit: fit.id }).expect(201));
  expect(share.token).toMatch(/^[\w-]{32}$/);
  const visitor = await app.as('visitor');
  const answer = await visitor.get(`/api/v1/shares/${share.token}`).expect(200);
  expect(answer.headers['x-robots-tag']).toBe('noindex');
  expect(parsed(SharedFit, answer).answer).toEqual(fit.answer);
  expect(answer.text).not.toContain('For my eyes');
  expect(answer.text).not.toContain('usr_');
  await agent.delete(`/api/v1/me/shares/${share.id}`).expect(204);
  const gone = expectProblem(await visitor.get(`/api/v1/shares/${share.token}`), 'not-found');
  const never = expectProblem(await visitor.get(`/api/v1/shares/${'x'.repeat(32)}`), 'not-found');
  expect(gone.detail).toBe(never.detail);
});

test('another customer’s boats, fits and links are not there', async () => {
  const app = testApp();
  const owner = await app.as('customer');
  const other = await otherCustomer(app);
  const boat = (await owner.post('/api/v1/me/boats').send(newBoat)).body.id;
  const fit = (await owner.post('/api/v1/me/fits').send(plainFit)).body.id;
  const share = (await owner.post('/api/v1/me/shares').send({ fit })).body.id;
  for (const list of ['boats', 'fits', 'shares']) expect((await other.get(`/api/v1/me/${list}`).expect(200)).body.data).toEqual([]);
  expectProblem(await other.get(`/api/v1/me/boats/${boat}`), 'not-found');
  expectProblem(await other.patch(`/api/v1/me/boats/${boat}`).send({ name: 'Mine' }), 'not-found');
  expectProblem(await other.delete(`/api/v1/me/boats/${boat}`), 'not-found');
  expectProblem(await other.get(`/api/v1/me/fits/${fit}`), 'not-found');
  expectProblem(await other.patch(`/api/v1/me/fits/${fit}`).send({ name: 'Mine' }), 'not-found');
  expectProblem(await other.delete(`/api/v1/me/fits/${fit}`), 'not-found');
  expectProblem(await other.post('/api/v1/me/shares').send({ fit }), 'not-found');
  expectProblem(await other.delete(`/api/v1/me/shares/${share}`), 'not-found');
  expectProblem(await other.post('/api/v1/me/fits').send({ ...plainFit, boat }), 'not-found');
  expect((await owner.get(`/api/v1/me/boats/${boat}`)).body.name).toBe('The skiff');
});

test.each(callers)('%s and boats, fits and links: customers only', async (caller) => {
  const agent = await testApp().as(caller);
  for (const answer of [
    await agent.post('/api/v1/me/boats').send(newBoat),
    await agent.get('/api/v1/me/fits'),
    await agent.get('/api/v1/me/shares'),
  ]) {
    if (caller === 'customer') expect(answer.status).toBeLessThan(300);
    else expectProblem(answer, caller === 'visitor' ? 'sign-in-needed' : 'not-allowed');
  }
});
