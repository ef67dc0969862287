import { MailPromise } from '@tiltwright/shared/schemas/access.ts';
import { Account, Session } from '@tiltwright/shared/schemas/account.ts';
import { eq } from 'drizzle-orm';
import { describe, expect, test } from 'vitest';
import { mailsTo, newcomer, tokenSentTo } from '../../../../tests/support/people.ts';
import { expectProblem, parsed, testApp } from '../../../../tests/support/test-app.ts';
import { passwordResets, signUps } from '../../db/schema/access.ts';
import { mailOutbox } from '../../db/schema/mail.ts';
import { apiKeys, auditLog, users } from '../../db/schema/people.ts';
import { demoPassword } from '../../db/seed.ts';

const skipper = { email: 'skipper@tiltwright.example', password: 'twelve or more', name: 'A skipper' };
const known = { email: 'customer@tiltwright.example', password: demoPassword };

describe('signing up', () => {
  test('a mail’s link and the password make a customer who is signed in; the address is kept in lower case', async () => {
    const app = testApp();
    const agent = await app.as('visitor');
    parsed(
      MailPromise,
      await agent
        .post('/api/v1/accounts')
        .send({ ...skipper, email: 'Skipper@Tiltwright.Example' })
        .expect(202),
    );
    expectProblem(await agent.get('/api/v1/me'), 'sign-in-needed');
    expectProblem(await agent.post('/api/v1/session').send({ email: skipper.email, password: skipper.password }), 'wrong-credentials');
    const body = { token: tokenSentTo(app.db, skipper.email), password: skipper.password };
    const { account } = parsed(Session, await agent.post('/api/v1/accounts/verify').send(body).expect(201));
    expect(account).toMatchObject({ email: skipper.email, roles: ['customer'], units: null, secondFactor: false });
    expect(parsed(Account, await agent.get('/api/v1/me').expect(200)).id).toBe(account!.id);
    const stored = app.db.select().from(users).where(eq(users.email, skipper.email)).get()!;
    expect(stored.passwordHash).toMatch(/^\$argon2id\$/);
    expect(JSON.stringify(app.db.select().from(auditLog).all())).not.toContain(skipper.password);
    expect(app.db.select().from(signUps).all()).toEqual([]);
  });

  test('the answer is the same for an address with an account and for one without', async () => {
    const app = testApp();
    const agent = await app.as('visitor');
    const fresh = await agent.post('/api/v1/accounts').send(skipper);
    const taken = await agent.post('/api/v1/accounts').send({ ...skipper, email: 'steward@tiltwright.example' });
    const about = ({ status, headers, body }: typeof fresh) => ({
      status,
      headers: Object.keys(headers),
      body: { ...body, outbox: String(body.outbox).split('=')[0] },
    });
    expect(about(taken)).toEqual(about(fresh));
    expect(mailsTo(app.db, skipper.email)[0]!.kind).toBe('verify-address');
    const [told] = mailsTo(app.db, 'steward@tiltwright.example');
    expect(told!.kind).toBe('account-exists');
    expect(told!.text).not.toContain('#token');
    await agent.post('/api/v1/session').send({ email: 'steward@tiltwright.example', password: demoPassword }).expect(200);
  });

  test('whoever clicks the link of another’s sign-up opens no account under a password they do not know', async () => {
    const app = testApp();
    const agent = await app.as('visitor');
    await agent
      .post('/api/v1/accounts')
      .send({ ...skipper, password: 'a stranger’s choice' })
      .expect(202);
    const token = tokenSentTo(app.db, skipper.email);
    expectProblem(await agent.post('/api/v1/accounts/verify').send({ token, password: 'the owner’s own' }), 'wrong-credentials');
    expect(app.db.select().from(users).where(eq(users.email, skipper.email)).get()).toBeUndefined();
  });

  test('a link works once, within a day, and only whole', async () => {
    const app = testApp();
    const { agent } = await newcomer(app, skipper);
    const verify = (token: string) => agent.post('/api/v1/accounts/verify').send({ token, password: skipper.password });
    expectProblem(await verify(tokenSentTo(app.db, skipper.email)), 'link-expired');
    await agent
      .post('/api/v1/accounts')
      .send({ ...skipper, email: 'late@tiltwright.example' })
      .expect(202);
    const token = tokenSentTo(app.db, 'late@tiltwright.example');
    expectProblem(await verify(token.slice(1)), 'link-expired');
    app.db
      .update(signUps)
      .set({ expiresAt: new Date(Date.now() - 1).toISOString() })
      .run();
    expectProblem(await verify(token), 'link-expired');
  });

  test('only the token’s hash is stored', async () => {
    const app = testApp();
    await (await app.as('visitor')).post('/api/v1/accounts').send(skipper).expect(202);
    expect(JSON.stringify(app.db.select().from(signUps).all())).not.toContain(tokenSentTo(app.db, skipper.email));
  });

  test('a form cannot fill a mailbox: three mails of a kind an hour, and the answer stays the same', async () => {
    const app = testApp();
    const agent = await app.as('visitor');
    for (let n = 0; n < 5; n++) await agent.post('/api/v1/accounts').send(skipper).expect(202);
    for (let n = 0; n < 5; n++) await agent.post('/api/v1/password-resets').send({ email: known.email }).expect(202);
    expect(mailsTo(app.db, skipper.email)).toHaveLength(3);
    expect(mailsTo(app.db, known.email)).toHaveLength(3);
  });

  test('roles beyond customer and integrator cannot be chosen, a short password is refused beside its field', async () => {
    const app = testApp();
    const agent = await app.as('visitor');
    expectProblem(await agent.post('/api/v1/accounts').send({ ...skipper, roles: ['admin'] }), 'invalid-input');
    const short = expectProblem(await agent.post('/api/v1/accounts').send({ ...skipper, password: 'short' }), 'invalid-input');
    expect(short.issues[0]!.path).toBe('/password');
    expect((await newcomer(app, { ...skipper, integrator: true })).account.roles).toEqual(['customer', 'integrator']);
  });
});

describe('a lost password', () => {
  const ask = async (app: ReturnType<typeof testApp>, email: string) =>
    (await app.as('visitor')).post('/api/v1/password-resets').send({ email });

  test('a link sets a new one, ends every session, and tells the owner', async () => {
    const app = testApp();
    const elsewhere = await app.as('customer');
    await ask(app, known.email);
    const agent = await app.as('visitor');
    const token = tokenSentTo(app.db, known.email);
    await agent.post(`/api/v1/password-resets/${token}`).send({ password: 'quite another one' }).expect(204);
    expect((await elsewhere.get('/api/v1/me')).status).toBe(401);
    expectProblem(await agent.post('/api/v1/session').send(known), 'wrong-credentials');
    await agent
      .post('/api/v1/session')
      .send({ ...known, password: 'quite another one' })
      .expect(200);
    expect(mailsTo(app.db, known.email)[0]!.kind).toBe('password-changed');
    expectProblem(await agent.post(`/api/v1/password-resets/${token}`).send({ password: 'and a third one' }), 'link-expired');
  });

  test('the answer is the same for known, unknown and disabled addresses; only the known one is written to', async () => {
    const app = testApp();
    app.db.update(users).set({ disabledAt: new Date().toISOString() }).where(eq(users.email, 'integrator@tiltwright.example')).run();
    const addresses = [known.email, 'nobody@tiltwright.example', 'integrator@tiltwright.example'];
    const answers = [];
    for (const email of addresses) answers.push(await ask(app, email));
    expect(new Set(answers.map(({ status, body }) => JSON.stringify([status, body.detail])))).toHaveProperty('size', 1);
    expect(answers[0]!.status).toBe(202);
    expect(
      app.db
        .select()
        .from(mailOutbox)
        .all()
        .map(({ toAddress }) => toAddress),
    ).toEqual([known.email]);
  });

  test('a newer link replaces the older; an old one runs out after an hour', async () => {
    const app = testApp();
    await ask(app, known.email);
    const first = tokenSentTo(app.db, known.email);
    await ask(app, known.email);
    const agent = await app.as('visitor');
    expectProblem(await agent.post(`/api/v1/password-resets/${first}`).send({ password: 'quite another one' }), 'link-expired');
    const expires = Date.parse(app.db.select().from(passwordResets).get()!.expiresAt) - Date.now();
    expect(expires).toBeGreaterThan(59 * 60_000);
    expect(expires).toBeLessThanOrEqual(60 * 60_000);
    app.db
      .update(passwordResets)
      .set({ expiresAt: new Date(Date.now() - 1).toISOString() })
      .run();
    const second = tokenSentTo(app.db, known.email);
    expectProblem(await agent.post(`/api/v1/password-resets/${second}`).send({ password: 'quite another one' }), 'link-expired');
  });
});

describe('one’s own account', () => {
  test('name and units are changed and remembered', async () => {
    const app = testApp();
    const agent = await app.as('customer');
    const units = { length: 'in', speed: 'mph', mass: 'lb' };
    expect(parsed(Account, await agent.patch('/api/v1/me').send({ name: 'Renamed', units }).expect(200))).toMatchObject({
      name: 'Renamed',
      units,
    });
    expect(parsed(Session, await agent.get('/api/v1/session')).account).toMatchObject({ name: 'Renamed', units });
    expectProblem(await agent.patch('/api/v1/me').send({ roles: ['admin'] }), 'invalid-input');
    expectProblem(await agent.patch('/api/v1/me').send({ units: { ...units, speed: 'parsec' } }), 'invalid-input');
  });

  test('a new password needs the old one and signs the other devices out', async () => {
    const app = testApp();
    const here = await app.as('customer');
    const elsewhere = await app.as('customer');
    const change = { current: 'not this one', password: 'quite another one' };
    expectProblem(await here.put('/api/v1/me/password').send(change), 'wrong-credentials');
    await here
      .put('/api/v1/me/password')
      .send({ ...change, current: demoPassword })
      .expect(204);
    await here.get('/api/v1/me').expect(200);
    expect((await elsewhere.get('/api/v1/me')).status).toBe(401);
    expect(mailsTo(app.db, known.email)[0]!.kind).toBe('password-changed');
  });

  test('an API key opens none of it', async () => {
    const app = testApp();
    const integrator = await app.as('integrator');
    const { body } = await integrator
      .post('/api/v1/me/keys')
      .send({ name: 'A key', scopes: ['boats:write'] })
      .expect(201);
    const program = await app.as('visitor');
    for (const address of ['/api/v1/me', '/api/v1/me/export', '/api/v1/me/second-factor'])
      expectProblem(await program.get(address).set('Authorization', `Bearer ${body.key}`), 'not-allowed');
    expect(app.db.select().from(apiKeys).all()).toHaveLength(1);
  });
});
