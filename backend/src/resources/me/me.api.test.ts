import { eq } from 'drizzle-orm';
import { expect, test } from 'vitest';
import { newcomer } from '../../../../tests/support/people.ts';
import { callers, expectProblem, testApp } from '../../../../tests/support/test-app.ts';
import { editions } from '../../db/schema/catalog.ts';
import { mailOutbox } from '../../db/schema/mail.ts';
import { auditLog, boats, users } from '../../db/schema/people.ts';
import { demoPassword } from '../../db/seed.ts';
import { allReferences } from './export-person.ts';

type Rows = Record<string, Record<string, unknown>[]>;

test('the export holds what is one’s own and no secret', async () => {
  const app = testApp();
  const agent = await app.as('customer');
  const answer = await agent.get('/api/v1/me/export').expect(200);
  const rows = answer.body as Rows;
  expect(rows.users).toMatchObject([{ email: 'customer@tiltwright.example', roles: ['customer'] }]);
  expect(rows.boats).toHaveLength(3);
  expect(rows.audit_log!.map(({ action }) => action)).toContain('session.begin');
  expect(answer.text).not.toMatch(/argon2|_hash|password/);
  expect(answer.text).not.toContain('integrator@');
  expect(answer.headers['content-disposition']).toContain('tiltwright-account.json');
});

test('every table that refers to a person goes with the person, and is in the export by that', () => {
  const { db } = testApp();
  const toPeople = allReferences(db).filter(({ to }) => to === 'users');
  expect(toPeople.map(({ table }) => table)).toEqual(expect.arrayContaining(['boats', 'sessions', 'api_keys', 'second_factors']));
  for (const { table } of toPeople) {
    const rules = db.$client.pragma(`foreign_key_list("${table}")`) as { table: string; on_delete: string }[];
    expect(
      rules.filter((rule) => rule.table === 'users').map((rule) => rule.on_delete),
      table,
    ).toEqual(['CASCADE']);
  }
});

test('deleting asks for the password, takes what is one’s own and leaves history whole and nameless', async () => {
  const app = testApp();
  const { agent, account } = await newcomer(app, { email: 'leaver@tiltwright.example', name: 'Leaver' });
  app.db
    .update(users)
    .set({ roles: ['customer', 'steward'] })
    .where(eq(users.id, account.id))
    .run();
  app.db.update(boats).set({ userId: account.id }).run();
  app.db.update(editions).set({ actor: account.id }).run();
  const before = app.db.select().from(auditLog).all().length;
  expectProblem(await agent.delete('/api/v1/me').send({ password: 'not this one' }), 'wrong-credentials');
  expectProblem(await agent.delete('/api/v1/me'), 'invalid-input');
  await agent.delete('/api/v1/me').send({ password: 'twelve or more' }).expect(204);
  expectProblem(await agent.get('/api/v1/me'), 'sign-in-needed');
  expect(app.db.select().from(boats).all()).toEqual([]);
  expect(app.db.select().from(mailOutbox).where(eq(mailOutbox.toAddress, 'leaver@tiltwright.example')).all()).toEqual([]);
  expect(app.db.select().from(auditLog).all().length).toBeGreaterThan(before);
  const admin = await app.as('admin');
  const { data } = (await admin.get(`/api/v1/audit?actor=${account.id}`).expect(200)).body as { data: { actorName: string | null }[] };
  expect(data.length).toBeGreaterThan(1);
  expect(data.every(({ actorName }) => actorName === null)).toBe(true);
  expect((await agent.get('/api/v1/editions?limit=1').expect(200)).body.data[0].actor).toBe(account.id);
  const everything = JSON.stringify(app.db.$client.prepare('SELECT * FROM audit_log').all());
  expect(everything).not.toContain('leaver@');
  expect(everything).not.toContain('Leaver');
});

test('the last admin cannot leave', async () => {
  const app = testApp();
  const admin = await app.as('admin');
  expectProblem(await admin.delete('/api/v1/me').send({ password: demoPassword }), 'wrong-state');
  app.db
    .update(users)
    .set({ roles: ['admin'] })
    .where(eq(users.email, 'steward@tiltwright.example'))
    .run();
  await admin.delete('/api/v1/me').send({ password: demoPassword }).expect(204);
});

test.each(callers)('%s and one’s own account', async (caller) => {
  const agent = await testApp().as(caller);
  for (const address of ['/api/v1/me', '/api/v1/me/export', '/api/v1/me/second-factor']) {
    const answer = await agent.get(address);
    if (caller === 'visitor') expectProblem(answer, 'sign-in-needed');
    else expect(answer.status, address).toBe(200);
    if (caller !== 'visitor' && address === '/api/v1/me') expect(answer.body.email).toBe(`${caller}@tiltwright.example`);
  }
});
