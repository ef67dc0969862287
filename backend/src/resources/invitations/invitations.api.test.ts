import { Session } from '@tiltwright/shared/schemas/account.ts';
import { Invitation, InvitationOffer } from '@tiltwright/shared/schemas/desk.ts';
import { eq } from 'drizzle-orm';
import { expect, test } from 'vitest';
import { mailsTo, newcomer, tokenSentTo } from '../../../../tests/support/people.ts';
import { expectProblem, parsed, type TestApp, testApp } from '../../../../tests/support/test-app.ts';
import { invitations } from '../../db/schema/access.ts';
import { auditLog, users } from '../../db/schema/people.ts';
import { listOf } from '../../http/cursor.ts';

const keeper = { email: 'keeper@tiltwright.example', roles: ['steward'] };
const answer = { name: 'A keeper', password: 'twelve or more' };

async function invited(app: TestApp, wish: object = keeper) {
  const admin = await app.as('admin');
  const invitation = parsed(Invitation, await admin.post('/api/v1/invitations').send(wish).expect(201));
  return { admin, invitation, token: tokenSentTo(app.db, invitation.email) };
}

test('an invited person sees the offer, chooses name and password, and is signed in with the roles', async () => {
  const app = testApp();
  const { admin, token } = await invited(app);
  expect(mailsTo(app.db, keeper.email)[0]!.text).toContain('as a steward');
  const guest = await app.as('visitor');
  const offer = parsed(InvitationOffer, await guest.get(`/api/v1/invitations/${token}`).expect(200));
  expect(offer).toMatchObject({ email: keeper.email, roles: ['steward'], hasAccount: false });
  const { account } = parsed(Session, await guest.post(`/api/v1/invitations/${token}`).send(answer).expect(201));
  expect(account).toMatchObject({ email: keeper.email, name: 'A keeper', roles: ['steward'] });
  await guest.get('/api/v1/imports').expect(200);
  expect(parsed(listOf(Invitation), await admin.get('/api/v1/invitations')).data[0]).toMatchObject({ state: 'accepted' });
  expectProblem(await guest.post(`/api/v1/invitations/${token}`).send(answer), 'link-expired');
});

test('an offer is taken with a name and a password, or not at all', async () => {
  const app = testApp();
  const { token } = await invited(app);
  const guest = await app.as('visitor');
  const problem = expectProblem(await guest.post(`/api/v1/invitations/${token}`).send({}), 'invalid-input');
  expect(problem.issues.map(({ path }) => path)).toEqual(['/name', '/password']);
  expectProblem(await guest.post(`/api/v1/invitations/${token}`).send({ ...answer, roles: ['admin'] }), 'invalid-input');
  await guest.get(`/api/v1/invitations/${token}`).expect(200);
});

test('revoked, too old or replaced by a newer one, a link opens nothing', async () => {
  const app = testApp();
  const { admin, invitation, token } = await invited(app);
  const guest = await app.as('visitor');
  const newer = await invited(app);
  expectProblem(await guest.get(`/api/v1/invitations/${token}`), 'link-expired');
  await guest.get(`/api/v1/invitations/${newer.token}`).expect(200);
  await admin.delete(`/api/v1/invitations/${newer.invitation.id}`).expect(204);
  expectProblem(await guest.post(`/api/v1/invitations/${newer.token}`).send(answer), 'link-expired');
  const third = await invited(app);
  app.db
    .update(invitations)
    .set({ expiresAt: new Date(Date.now() - 1).toISOString() })
    .where(eq(invitations.id, third.invitation.id))
    .run();
  expectProblem(await guest.post(`/api/v1/invitations/${third.token}`).send(answer), 'link-expired');
  const states = parsed(listOf(Invitation), await admin.get('/api/v1/invitations')).data.map(({ state }) => state);
  expect(states).toEqual(['expired', 'revoked', 'revoked']);
  expect(invitation.state).toBe('open');
  expectProblem(await admin.delete('/api/v1/invitations/inv_none'), 'not-found');
});

test('who has an account is not invited; who got one meanwhile adds the roles by signing in', async () => {
  const app = testApp();
  const { admin, token } = await invited(app);
  expectProblem(await admin.post('/api/v1/invitations').send({ email: 'customer@tiltwright.example', roles: ['steward'] }), 'email-taken');
  // Their own sign-up comes in between.
  const { agent } = await newcomer(app, { email: keeper.email });
  const stranger = await app.as('customer');
  expectProblem(await stranger.post(`/api/v1/invitations/${token}`).send(answer), 'sign-in-needed');
  expect(parsed(InvitationOffer, await stranger.get(`/api/v1/invitations/${token}`)).hasAccount).toBe(true);
  const { account } = parsed(Session, await agent.post(`/api/v1/invitations/${token}`).send({}).expect(201));
  expect(account!.roles.toSorted()).toEqual(['customer', 'steward']);
});

test('the log knows who invited, without an address', async () => {
  const app = testApp();
  await invited(app);
  const admin = app.db.select().from(users).where(eq(users.email, 'admin@tiltwright.example')).get()!;
  const entry = app.db.select().from(auditLog).where(eq(auditLog.action, 'invitation.create')).get()!;
  expect(entry.actor).toBe(admin.id);
  expect(JSON.stringify(entry)).not.toContain('keeper');
});
