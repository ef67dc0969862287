import { Person, PersonSession } from '@tiltwright/shared/schemas/desk.ts';
import { eq } from 'drizzle-orm';
import { expect, test } from 'vitest';
import { callers, expectProblem, parsed, type TestApp, testApp } from '../../../../tests/support/test-app.ts';
import { auditLog, users } from '../../db/schema/people.ts';
import { demoPassword } from '../../db/seed.ts';
import { listOf } from '../../http/cursor.ts';

const idOf = (app: TestApp, name: string) =>
  app.db
    .select()
    .from(users)
    .where(eq(users.email, `${name}@tiltwright.example`))
    .get()!.id;
const actions = (app: TestApp) =>
  app.db
    .select()
    .from(auditLog)
    .all()
    .map(({ action }) => action);

test('people are found by part of a name or address, by role and by state, page by page', async () => {
  const app = testApp();
  const admin = await app.as('admin');
  const emails = async (query: string) =>
    parsed(listOf(Person), await admin.get(`/api/v1/users${query}`).expect(200)).data.map(({ email }) => email.split('@')[0]);
  expect(await emails('')).toEqual(['admin', 'customer', 'integrator', 'steward']);
  expect(await emails('?q=DEMO%20CUST')).toEqual(['customer']);
  expect(await emails('?q=%25')).toEqual([]);
  expect(await emails('?role=steward')).toEqual(['steward']);
  expect(await emails('?state=disabled')).toEqual([]);
  const first = parsed(listOf(Person), await admin.get('/api/v1/users?limit=3'));
  expect(first.data).toHaveLength(3);
  expect(await emails(`?limit=3&cursor=${first.next}`)).toEqual(['steward']);
  expect((await admin.get('/api/v1/users')).text).not.toMatch(/argon2|password/i);
});

test('a disabled account is out at once, its keys stop, and it is let in again when enabled', async () => {
  const app = testApp();
  const admin = await app.as('admin');
  const integrator = await app.as('integrator');
  const { key } = (
    await integrator
      .post('/api/v1/me/keys')
      .send({ name: 'A key', scopes: ['catalog:read'] })
      .expect(201)
  ).body;
  const id = idOf(app, 'integrator');
  const person = parsed(Person, await admin.patch(`/api/v1/users/${id}`).send({ disabled: true }).expect(200));
  expect(person.disabledAt).not.toBeNull();
  expect(person.sessions).toBe(0);
  expect((await integrator.get('/api/v1/me')).status).toBe(401);
  const program = await app.as('visitor');
  expectProblem(await program.get('/api/v1/hulls?limit=1').set('Authorization', `Bearer ${key}`), 'invalid-key');
  await admin.patch(`/api/v1/users/${id}`).send({ disabled: false }).expect(200);
  await app.as('integrator');
  expect(actions(app)).toEqual(expect.arrayContaining(['account.disable', 'account.enable']));
});

test('roles change at once, also for someone who is signed in, and the log says from what to what', async () => {
  const app = testApp();
  const admin = await app.as('admin');
  const customer = await app.as('customer');
  expectProblem(await customer.get('/api/v1/imports'), 'not-allowed');
  const id = idOf(app, 'customer');
  await admin
    .patch(`/api/v1/users/${id}`)
    .send({ roles: ['customer', 'steward', 'steward'] })
    .expect(200);
  await customer.get('/api/v1/imports').expect(200);
  expect(app.db.select().from(auditLog).where(eq(auditLog.action, 'account.roles')).get()!.detail).toEqual({
    before: ['customer'],
    after: ['customer', 'steward'],
  });
  await admin
    .patch(`/api/v1/users/${id}`)
    .send({ roles: ['customer'] })
    .expect(200);
  expectProblem(await customer.get('/api/v1/imports'), 'not-allowed');
  expectProblem(await admin.patch(`/api/v1/users/${id}`).send({ roles: [] }), 'invalid-input');
});

test('the last admin keeps the role and stays enabled', async () => {
  const app = testApp();
  const admin = await app.as('admin');
  const id = idOf(app, 'admin');
  expectProblem(await admin.patch(`/api/v1/users/${id}`).send({ roles: ['steward'] }), 'wrong-state');
  expectProblem(await admin.patch(`/api/v1/users/${id}`).send({ disabled: true }), 'wrong-state');
  await admin
    .patch(`/api/v1/users/${idOf(app, 'steward')}`)
    .send({ roles: ['admin'] })
    .expect(200);
  await admin
    .patch(`/api/v1/users/${id}`)
    .send({ roles: ['customer'] })
    .expect(200);
});

test('where someone is signed in is listed without what opens the session, and ended', async () => {
  const app = testApp();
  const admin = await app.as('admin');
  const customer = await app.as('customer');
  const id = idOf(app, 'customer');
  const { data } = parsed(listOf(PersonSession), await admin.get(`/api/v1/users/${id}/sessions`).expect(200));
  expect(data.length).toBeGreaterThan(0);
  expect(data.at(-1)!.startedAt).toMatch(/^\d{4}-/);
  await admin.delete(`/api/v1/users/${id}/sessions`).expect(204);
  expect((await customer.get('/api/v1/me')).status).toBe(401);
  expect(parsed(Person, await admin.get(`/api/v1/users/${id}`)).sessions).toBe(0);
  await (await app.as('visitor'))
    .post('/api/v1/session')
    .send({ email: 'customer@tiltwright.example', password: demoPassword })
    .expect(200);
});

test('nobody is found under an unknown id', async () => {
  const admin = await testApp().as('admin');
  for (const address of ['/api/v1/users/usr_none', '/api/v1/users/usr_none/sessions']) expectProblem(await admin.get(address), 'not-found');
  expectProblem(await admin.patch('/api/v1/users/usr_none').send({ disabled: true }), 'not-found');
  expectProblem(await admin.delete('/api/v1/users/usr_none/sessions'), 'not-found');
});

test.each(callers)('%s and the admin’s desk: admins only', async (caller) => {
  const app = testApp();
  const agent = await app.as(caller);
  const id = idOf(app, 'customer');
  const reads = ['/users', `/users/${id}`, `/users/${id}/sessions`, '/invitations', '/audit', '/audit.csv', '/mail', '/health'];
  for (const address of reads) {
    const answer = await agent.get(`/api/v1${address}`);
    if (caller === 'admin') expect(answer.status, address).toBe(200);
    else expectProblem(answer, caller === 'visitor' ? 'sign-in-needed' : 'not-allowed');
  }
  if (caller === 'admin') return;
  const writes = [
    agent.patch(`/api/v1/users/${id}`).send({ roles: ['admin'] }),
    agent.delete(`/api/v1/users/${id}/sessions`),
    agent.post('/api/v1/invitations').send({ email: 'friend@tiltwright.example', roles: ['admin'] }),
    agent.delete('/api/v1/invitations/inv_none'),
    agent.post('/api/v1/mail/mai_none/resend'),
  ];
  for (const answer of await Promise.all(writes)) expectProblem(answer, caller === 'visitor' ? 'sign-in-needed' : 'not-allowed');
  expect(app.db.select().from(users).where(eq(users.id, id)).get()!.roles).toEqual(['customer']);
});
