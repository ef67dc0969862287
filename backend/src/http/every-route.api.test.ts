// Every route asked by every caller: who may is written down here once more, apart from the code that decides it.
import { scopes } from '@tiltwright/shared/schemas/account.ts';
import type TestAgent from 'supertest/lib/agent.js';
import { describe, expect, test } from 'vitest';
import { type TestApp, testApp } from '../../../tests/support/test-app.ts';
import type { Permission } from '../auth/may.ts';
import { hashPassword } from '../auth/passwords.ts';
import { users } from '../db/schema/people.ts';
import { newId } from '../ids.ts';
import { fitExample } from '../resources/questions/examples.ts';
import { allRoutes } from '../routes.ts';
import type { Operation } from './operation.ts';

const people = ['visitor', 'customer', 'integrator', 'steward', 'admin'] as const;
const programs = ['key with every scope', 'key for the catalog', 'browser key'] as const;
type Who = (typeof people)[number] | (typeof programs)[number];
const everyone: Who[] = [...people, ...programs];
const members: Who[] = ['customer', 'integrator', 'steward', 'admin'];

/** The keys belong to an integrator, who is no customer: boats are out of their reach, whatever their scopes. */
const allowed: Record<Permission, Who[]> = {
  'catalog.read': everyone,
  'fit.compute': [...people, 'key with every scope', 'browser key'],
  'session.use': [...people],
  'account.own': members,
  'boats.own': ['customer'],
  'keys.own': ['integrator'],
  'batch.compute': [...members, 'key with every scope', 'browser key'],
  'webhooks.own': ['integrator', 'key with every scope'],
  'site.run': ['admin'],
  'limits.manage': ['admin'],
  'imports.manage': ['steward', 'admin'],
};
const refusals = ['sign-in-needed', 'not-allowed', 'scope-missing'];
const origin = 'https://shop.example';

interface Caller {
  agent: TestAgent;
  headers: Record<string, string>;
}

async function callersOf(app: TestApp): Promise<Map<Who, Caller>> {
  const callers = new Map<Who, Caller>();
  for (const who of people) callers.set(who, { agent: await app.as(who), headers: {} });
  const makeKey = async (order: object) => {
    const { body } = await callers
      .get('integrator')!
      .agent.post('/api/v1/me/keys')
      .send({ name: 'Walk', ...order })
      .expect(201);
    return { Authorization: `Bearer ${body.key}` };
  };
  callers.set('key with every scope', { agent: await app.as('visitor'), headers: await makeKey({ scopes }) });
  callers.set('key for the catalog', { agent: await app.as('visitor'), headers: await makeKey({ scopes: ['catalog:read'] }) });
  const browser = await makeKey({ kind: 'browser', origins: [origin], scopes: ['catalog:read', 'fit:compute'] });
  callers.set('browser key', { agent: await app.as('visitor'), headers: { ...browser, Origin: origin } });
  return callers;
}

const ask = ({ agent, headers }: Caller, { method, path }: Operation, fill: (name: string) => string) =>
  agent[method](`/api/v1${path.replace(/\{(\w+)\}/g, (_, name: string) => encodeURIComponent(fill(name)))}`).set(headers);

test('every route × every caller: in where written down, out everywhere else', { timeout: 120_000 }, async () => {
  const app = testApp();
  const callers = await callersOf(app);
  // Signing in and out comes last: it changes who is asking.
  const routes = allRoutes(app.deps).map(({ operation }) => operation);
  const ordered = [...routes.filter(({ may }) => may !== 'session.use'), ...routes.filter(({ may }) => may === 'session.use')];
  expect(ordered.length).toBeGreaterThan(80);
  let asked = 0;
  for (const operation of ordered) {
    for (const who of everyone) {
      const answer = await ask(callers.get(who)!, operation, () => '7');
      const name = `${operation.method} ${operation.path} as ${who}: ${answer.status} ${answer.text?.slice(0, 120)}`;
      if (allowed[operation.may].includes(who)) expect(refusals, name).not.toContain(answer.body?.code);
      else {
        expect(refusals, name).toContain(answer.body?.code);
        expect([401, 403], name).toContain(answer.status);
      }
      expect(answer.status, name).toBeLessThan(500);
      asked += 1;
    }
  }
  expect(asked).toBe(ordered.length * everyone.length);
});

describe('what belongs to somebody', () => {
  let app: TestApp;
  let owner: TestAgent;
  let stranger: TestAgent;
  let strangersKey: Record<string, string>;
  const ids: Record<string, string> = {};

  /** Somebody with every role of a customer and a shop. */
  async function join(email: string): Promise<TestAgent> {
    const password = 'twelve or more';
    const createdAt = new Date().toISOString();
    const roles = ['customer' as const, 'integrator' as const];
    app.db
      .insert(users)
      .values({ id: newId('usr'), email, name: 'Somebody', passwordHash: await hashPassword(password), roles, createdAt })
      .run();
    const agent = await app.as('visitor');
    await agent.post('/api/v1/session').send({ email, password }).expect(200);
    return agent;
  }

  async function makeEverything(): Promise<void> {
    const made = async (path: string, body: object) => (await owner.post(`/api/v1/me/${path}`).send(body)).body.id as string;
    const question = { ...fitExample, uncertainty: 'none' };
    ids['/me/boats/{id}'] = await made('boats', { name: 'secret-mark boat', question });
    ids['/me/fits/{id}'] = await made('fits', { name: 'secret-mark fit', question });
    ids['/me/shares/{id}'] = await made('shares', { fit: ids['/me/fits/{id}'] });
    ids['/me/keys/{id}'] = await made('keys', { name: 'secret-mark key', scopes: ['catalog:read'] });
    ids['/me/webhooks/{id}'] = await made('webhooks', {
      name: 'secret-mark hook',
      url: 'https://shop.example/',
      topics: ['edition.published'],
    });
    ids['{delivery}'] = await made(`webhooks/${ids['/me/webhooks/{id}']}/test`, {});
    for (const [place, id] of Object.entries(ids)) expect(id, place).toMatch(/^\w{3}_\w{26}$/);
  }

  test('is out of a stranger’s and a stranger’s key’s reach on every route', { timeout: 60_000 }, async () => {
    app = testApp();
    owner = await join('owner@tiltwright.example');
    stranger = await join('stranger@tiltwright.example');
    await makeEverything();
    const key = (await stranger.post('/api/v1/me/keys').send({ name: 'Key', scopes }).expect(201)).body.key as string;
    strangersKey = { Authorization: `Bearer ${key}` };
    const program = await app.as('visitor');
    const routes = allRoutes(app.deps).map(({ operation }) => operation);
    const own = routes.filter(({ path }) => path.startsWith('/me/') && path.includes('{'));
    expect(own.length).toBeGreaterThan(15);
    for (const operation of own) {
      const place = Object.keys(ids).find((prefix) => operation.path.startsWith(prefix));
      expect(place, `${operation.path}: make one of these in the test above`).toBeDefined();
      const fill = (name: string) => (name === 'delivery' ? ids['{delivery}']! : ids[place!]!);
      for (const caller of [
        { agent: stranger, headers: {} },
        { agent: program, headers: strangersKey },
      ]) {
        const answer = await ask(caller, operation, fill).send(operation.bodyExample as object | undefined);
        const name = `${operation.method} ${operation.path}: ${answer.status} ${answer.text.slice(0, 160)}`;
        expect(['not-found', 'not-allowed'], name).toContain(answer.body?.code);
        expect(answer.text, name).not.toContain('secret-mark');
      }
    }
    for (const { path, query } of routes.filter(({ method, path }) => method === 'get' && path.startsWith('/me') && !path.includes('{'))) {
      const answer = await stranger.get(`/api/v1${path}`);
      for (const forbidden of ['secret-mark', ...Object.values(ids)]) expect(answer.text, path).not.toContain(forbidden);
      expect(query?.shape ?? {}, path).not.toHaveProperty('user');
    }
    // And nothing was changed on the way.
    for (const place of ['boats', 'fits', 'webhooks'])
      expect((await owner.get(`/api/v1/me/${place}/${ids[`/me/${place}/{id}`]}`).expect(200)).text).toContain('secret-mark');
    expect((await owner.get('/api/v1/me/keys')).body.data[0]).toMatchObject({ revokedAt: null, previousUntil: null });
    expect((await owner.get('/api/v1/me/shares')).body.data[0].revokedAt).toBeNull();
  });
});
