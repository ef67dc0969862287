import { Session } from '@tiltwright/shared/schemas/account.ts';
import { expect, test } from 'vitest';
import { callers, expectProblem, parsed, testApp } from '../../../../tests/support/test-app.ts';
import { auditLog, sessions, users } from '../../db/schema/people.ts';
import { demoPassword } from '../../db/seed.ts';

const credentials = { email: 'customer@tiltwright.example', password: demoPassword };

test('signing in sets a cookie that scripts cannot read; signing out ends it', async () => {
  const agent = await testApp().as('visitor');
  const answer = await agent.post('/api/v1/session').send(credentials).expect(200);
  expect(parsed(Session, answer).account).toMatchObject({ email: credentials.email, roles: ['customer'] });
  expect(answer.headers['set-cookie']![0]).toMatch(/HttpOnly; SameSite=Lax/i);
  expect(parsed(Session, await agent.get('/api/v1/session')).account?.email).toBe(credentials.email);
  await agent.delete('/api/v1/session').expect(204);
  expect(parsed(Session, await agent.get('/api/v1/session')).account).toBeNull();
  expectProblem(await agent.get('/api/v1/me'), 'sign-in-needed');
});

test('in production the cookie travels over https only', async () => {
  const agent = await testApp({ NODE_ENV: 'production', SESSION_SECRET: 'x'.repeat(32), TRUST_PROXY: '1' }).as('visitor');
  const answer = await agent.post('/api/v1/session').set('X-Forwarded-Proto', 'https').send(credentials).expect(200);
  expect(answer.headers['set-cookie']![0]).toMatch(/; Secure/);
});

test('a wrong password and an unknown address are answered alike', async () => {
  const agent = await testApp().as('visitor');
  const wrong = expectProblem(await agent.post('/api/v1/session').send({ ...credentials, password: 'not this one' }), 'wrong-credentials');
  const unknown = expectProblem(
    await agent.post('/api/v1/session').send({ ...credentials, email: 'nobody@tiltwright.example' }),
    'wrong-credentials',
  );
  expect({ ...unknown, instance: '' }).toEqual({ ...wrong, instance: '' });
});

test('the eleventh try in a row has to wait, also with the right password', async () => {
  const agent = await testApp().as('visitor');
  for (let tries = 0; tries < 10; tries++)
    expectProblem(await agent.post('/api/v1/session').send({ ...credentials, password: 'a guess' }), 'wrong-credentials');
  const answer = await agent.post('/api/v1/session').send(credentials);
  expectProblem(answer, 'too-many-requests');
  expect(Number(answer.headers['retry-after'])).toBeGreaterThan(0);
});

test('an expired session is named as such and changes nothing', async () => {
  const app = testApp();
  const agent = await app.as('steward');
  app.db
    .update(sessions)
    .set({ expiresAt: Date.now() - 1 })
    .run();
  const problem = expectProblem(
    await agent.post('/api/v1/imports').field('table', 'hulls').attach('file', Buffer.from('maker,model\n'), 'hulls.csv'),
    'session-expired',
  );
  expect(problem.detail).toContain('sign in again');
});

test('a disabled account is out at once', async () => {
  const app = testApp();
  const agent = await app.as('customer');
  app.db.update(users).set({ disabledAt: new Date().toISOString() }).run();
  expect((await agent.get('/api/v1/me')).status).toBe(401);
  expectProblem(await agent.post('/api/v1/session').send(credentials), 'wrong-credentials');
});

test('the audit log cannot be rewritten', () => {
  const { db } = testApp();
  expect(db.select().from(auditLog).all().length).toBeGreaterThan(0);
  expect(() => db.delete(auditLog).run()).toThrow(/append-only/);
  expect(() => db.update(auditLog).set({ action: 'nothing' }).run()).toThrow(/append-only/);
});

test.each(callers)('%s and the demo owner’s boats', async (caller) => {
  const agent = await testApp().as(caller);
  const answer = await agent.get('/api/v1/me/boats');
  if (caller === 'customer') expect(answer.body.data).toHaveLength(3);
  else expectProblem(answer, caller === 'visitor' ? 'sign-in-needed' : 'not-allowed');
});
