import { BegunSecondFactor, RecoveryCodes, SecondFactor } from '@tiltwright/shared/schemas/access.ts';
import { Session } from '@tiltwright/shared/schemas/account.ts';
import type TestAgent from 'supertest/lib/agent.js';
import { expect, test } from 'vitest';
import { oneTimeCode } from '../../../../tests/support/one-time-code.ts';
import { mailsTo } from '../../../../tests/support/people.ts';
import { expectProblem, parsed, testApp } from '../../../../tests/support/test-app.ts';
import { secondFactors } from '../../db/schema/access.ts';
import { demoPassword } from '../../db/seed.ts';

const address = '/api/v1/me/second-factor';
const steward = { email: 'steward@tiltwright.example', password: demoPassword };

async function setUp(agent: TestAgent) {
  const { secret, uri } = parsed(BegunSecondFactor, await agent.post(address).send({ password: demoPassword }).expect(201));
  const used = oneTimeCode(secret);
  const { codes } = parsed(RecoveryCodes, await agent.post(`${address}/confirm`).send({ code: used }).expect(200));
  return { secret, uri, codes, used };
}

test('once confirmed, signing in needs a code, each of which works once', async () => {
  const app = testApp();
  const agent = await app.as('steward');
  const { secret, uri, used } = await setUp(agent);
  expect(uri).toContain(`secret=${secret}`);
  expect(parsed(SecondFactor, await agent.get(address))).toMatchObject({ enabled: true, recoveryCodesLeft: 10, demanded: false });
  expect(mailsTo(app.db, steward.email)[0]!.kind).toBe('second-factor-changed');
  expect(app.db.select().from(secondFactors).get()!.sealedSecret).not.toContain(secret);

  const device = await app.as('visitor');
  expectProblem(await device.post('/api/v1/session').send(steward), 'second-factor-needed');
  expect(parsed(Session, await device.get('/api/v1/session')).account).toBeNull();
  expectProblem(await device.post('/api/v1/session').send({ ...steward, code: '000000' }), 'wrong-code');
  expectProblem(await device.post('/api/v1/session').send({ ...steward, code: used }), 'wrong-code');
  const code = oneTimeCode(secret, 1);
  const session = parsed(
    Session,
    await device
      .post('/api/v1/session')
      .send({ ...steward, code })
      .expect(200),
  );
  expect(session.account!.secondFactor).toBe(true);
  expectProblem(await (await app.as('visitor')).post('/api/v1/session').send({ ...steward, code }), 'wrong-code');
});

test('a wrong password is answered before any word of a code', async () => {
  const app = testApp();
  await setUp(await app.as('steward'));
  expectProblem(await (await app.as('visitor')).post('/api/v1/session').send({ ...steward, password: 'a guess' }), 'wrong-credentials');
});

test('begun but not confirmed, it changes nothing', async () => {
  const app = testApp();
  const agent = await app.as('steward');
  await agent.post(address).send({ password: demoPassword }).expect(201);
  expectProblem(await agent.post(`${address}/confirm`).send({ code: '000000' }), 'wrong-code');
  expect(parsed(SecondFactor, await agent.get(address))).toMatchObject({ enabled: false, recoveryCodesLeft: 0 });
  await app.as('steward');
});

test('a recovery code signs in once; new ones end the old', async () => {
  const app = testApp();
  const agent = await app.as('steward');
  const { secret, codes } = await setUp(agent);
  const device = await app.as('visitor');
  await device
    .post('/api/v1/session')
    .send({ ...steward, code: codes[0]!.toUpperCase() })
    .expect(200);
  expectProblem(await device.post('/api/v1/session').send({ ...steward, code: codes[0] }), 'wrong-code');
  expect(parsed(SecondFactor, await agent.get(address)).recoveryCodesLeft).toBe(9);
  const renewed = await agent.post(`${address}/recovery-codes`).send({ code: oneTimeCode(secret, 1) });
  const fresh = parsed(RecoveryCodes, renewed).codes;
  expectProblem(await device.post('/api/v1/session').send({ ...steward, code: codes[1] }), 'wrong-code');
  await device
    .post('/api/v1/session')
    .send({ ...steward, code: fresh[0] })
    .expect(200);
});

test('guessing codes has to stop after ten, from whichever address', async () => {
  const app = testApp({ TRUST_PROXY: '1' });
  const { secret } = await setUp(await app.as('steward'));
  const device = await app.as('visitor');
  const guess = (from: number, code: string) =>
    device
      .post('/api/v1/session')
      .set('X-Forwarded-For', `192.0.2.${from}`)
      .send({ ...steward, code });
  for (let n = 0; n < 10; n++) expectProblem(await guess(n, '000000'), 'wrong-code');
  expectProblem(await guess(11, oneTimeCode(secret, 1)), 'too-many-requests');
});

test('setting up and removing need the password; removing is told by mail', async () => {
  const app = testApp();
  const agent = await app.as('steward');
  expectProblem(await agent.post(address).send({ password: 'not this one' }), 'wrong-credentials');
  await setUp(agent);
  expectProblem(await agent.post(address).send({ password: demoPassword }), 'wrong-state');
  expectProblem(await agent.delete(address).send({ password: 'not this one' }), 'wrong-credentials');
  await agent.delete(address).send({ password: demoPassword }).expect(204);
  expect(mailsTo(app.db, steward.email)[0]!.subject).toContain('no code any more');
  await app.as('steward');
});

test('an admin frees someone who lost everything', async () => {
  const app = testApp();
  const agent = await app.as('steward');
  await setUp(agent);
  const { id } = (await agent.get('/api/v1/me')).body;
  expectProblem(await (await app.as('customer')).delete(`/api/v1/users/${id}/second-factor`), 'not-allowed');
  await (await app.as('admin')).delete(`/api/v1/users/${id}/second-factor`).expect(204);
  await app.as('steward');
});

test('where the site demands it of staff, their work waits for it and everything else goes on', async () => {
  const app = testApp({ STAFF_SECOND_FACTOR: 'true' });
  const agent = await app.as('steward');
  expect(parsed(Session, await agent.get('/api/v1/session')).account).toMatchObject({ secondFactor: false, secondFactorDemanded: true });
  expectProblem(await agent.get('/api/v1/imports'), 'second-factor-required');
  expectProblem(await (await app.as('admin')).get('/api/v1/users'), 'second-factor-required');
  await agent.get('/api/v1/me').expect(200);
  await setUp(agent);
  await agent.get('/api/v1/imports').expect(200);
  const customer = await app.as('customer');
  expect(parsed(Session, await customer.get('/api/v1/session')).account).toMatchObject({ secondFactorDemanded: false });
  await customer.get('/api/v1/me/boats').expect(200);
});
