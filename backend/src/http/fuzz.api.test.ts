// Every operation is asked what its own schema describes, bent and broken: no 5xx, no hang, and every answer is one the
// document promises. DEEP=1 asks twenty times as much.

import { Problem } from '@tiltwright/shared/schemas/problem.ts';
import fc from 'fast-check';
import type supertest from 'supertest';
import type TestAgent from 'supertest/lib/agent.js';
import { expect, test } from 'vitest';
import { type Components, hostile, type Schema, schemaValue } from '../../../tests/support/json-schema-values.ts';
import { type TestApp, testApp } from '../../../tests/support/test-app.ts';
import { hashPassword } from '../auth/passwords.ts';
import { hulls } from '../db/schema/catalog.ts';
import { limits } from '../db/schema/limits.ts';
import { users } from '../db/schema/people.ts';
import { newId } from '../ids.ts';
import { allRoutes } from '../routes.ts';
import type { Route } from './operation.ts';

const deep = process.env.DEEP === '1';
const runs = deep ? 200 : 8;
/** Longer than this is a hang; the dearest question takes a second on a busy machine. */
const patienceMs = 10_000;

interface Parameter {
  name: string;
  in: 'path' | 'query' | 'header';
  schema: Schema;
}
interface Described {
  parameters?: Parameter[];
  requestBody?: { content: Record<string, { schema: Schema }> };
  responses: Record<string, unknown>;
}
interface Document {
  paths: Record<string, Record<string, Described>>;
  components: { schemas: Components };
}

/** Somebody who may do everything, so that nothing is turned away at the door. */
async function everyRole(app: TestApp): Promise<TestAgent> {
  const password = 'twelve or more';
  const email = 'fuzz@tiltwright.example';
  const roles = ['customer', 'integrator', 'steward', 'admin'] as const;
  const createdAt = new Date().toISOString();
  app.db
    .insert(users)
    .values({ id: newId('usr'), email, name: 'Fuzz', passwordHash: await hashPassword(password), roles: [...roles], createdAt })
    .run();
  const agent = await app.as('visitor');
  await agent.post('/api/v1/session').send({ email, password }).expect(200);
  return agent;
}

const word = (value: unknown) => (typeof value === 'string' ? value : (JSON.stringify(value) ?? ''));
/** A lone surrogate cannot be written into an address at all. */
const addressable = (text: string) => encodeURIComponent(text.replace(/\p{Surrogate}/gu, '\ufffd'));

function checkAnswer({ operation }: Route, described: Described, answer: supertest.Response, asked: string): void {
  const said = `${asked} → ${answer.status} ${answer.text?.slice(0, 300)}`;
  expect(answer.status, said).toBeLessThan(500);
  // An address that fell apart into another one is that one's answer.
  if (['route-not-found', 'method-not-allowed'].includes(answer.body?.code)) return;
  expect(Object.keys(described.responses), said).toContain(String(answer.status));
  if (answer.status >= 400) {
    expect(answer.headers['content-type'], said).toMatch(/^application\/problem\+json/);
    expect(Problem.safeParse(answer.body).error?.issues ?? [], said).toEqual([]);
  } else if (operation.reply.schema && !operation.reply.contentType && answer.status === operation.reply.status) {
    expect(operation.reply.schema.safeParse(answer.body).error?.issues ?? [], said).toEqual([]);
  }
}

const bodyOf = (described: Described) => described.requestBody?.content['application/json']?.schema;

test('every operation, asked by its own schema', { timeout: deep ? 1_800_000 : 180_000 }, async () => {
  const app = testApp();
  const agent = await everyRole(app);
  const document = (await agent.get('/api/v1/openapi.json')).body as Document;
  const ids = fc.constantFrom(
    ...app.db
      .select({ id: hulls.id })
      .from(hulls)
      .limit(3)
      .all()
      .map(({ id }) => id),
  );
  const lasts = new Set(['signOut', 'deleteMe']);
  const routes = allRoutes(app.deps).sort((a, b) => Number(lasts.has(a.operation.id)) - Number(lasts.has(b.operation.id)));
  let asked = 0;
  let good = 0;
  for (const route of routes) {
    const { operation } = route;
    const described = document.paths[operation.path]![operation.method]!;
    const { schemas } = document.components;
    const parameters = (described.parameters ?? []).filter((parameter) => parameter.in !== 'header');
    const given = fc.record(
      Object.fromEntries(
        parameters.map(({ name, in: place, schema }) => [
          name,
          place === 'path'
            ? fc.oneof(ids, schemaValue(schema, schemas), hostile)
            : fc.option(fc.oneof(ids, schemaValue(schema, schemas)), { nil: undefined }),
        ]),
      ),
    );
    const schema = bodyOf(described);
    const body = schema ? schemaValue(schema, schemas) : fc.constant(undefined);
    await fc.assert(
      fc.asyncProperty(given, body, async (values, sent) => {
        const path = operation.path.replace(/\{(\w+)\}/g, (_, name: string) => addressable(word(values[name])) || '%20');
        const query = parameters
          .filter(({ name, in: place }) => place === 'query' && values[name] !== undefined)
          .map(({ name }) => `${name}=${addressable(word(values[name]))}`)
          .join('&');
        const request = agent[operation.method](`/api/v1${path}${query && `?${query}`}`).timeout(patienceMs);
        const answer = await (sent === undefined ? request : request.type('json').send(JSON.stringify(sent)));
        checkAnswer(route, described, answer, `${operation.method} ${path}?${query} ${JSON.stringify(sent)?.slice(0, 600)}`);
        asked += 1;
        if (answer.status < 300) good += 1;
      }),
      { numRuns: runs, interruptAfterTimeLimit: deep ? 60_000 : 4000, markInterruptAsFailure: false },
    );
    // A limit that was changed on the way must not still the rest.
    app.db.delete(limits).run();
    app.deps.limits.reload();
  }
  expect(asked).toBeGreaterThan(routes.length);
  // Questions that are all turned away at the door prove little.
  expect(good / asked).toBeGreaterThan(0.1);
});

const nested = (depth: number) => `${'{"a":'.repeat(depth)}1${'}'.repeat(depth)}`;
const rawBodies: [name: string, body: string][] = [
  ['a body 100 000 lists deep', '['.repeat(100_000) + ']'.repeat(100_000)],
  ['a body 50 000 objects deep', nested(50_000)],
  ['repeated names', '{"hull":"a","hull":{"form":"flat"},"hull":["b"],"lowerUnits":[],"lowerUnits":1}'],
  ['prototype names', '{"__proto__":{"hull":"x"},"constructor":{"prototype":{"y":1}},"hull":{"__proto__":{"form":"flat"}}}'],
  ['a hundred thousand names', `{${Array.from({ length: 100_000 }, (_, n) => `"k${n}":0`).join(',')}}`],
  ['numbers no machine holds', '{"hull":1e999999,"lowerUnits":[-1e999999],"running":{"speedKn":1E400}}'],
  ['half a surrogate', '{"ref":"\\ud800","hull":"\\udfff"}'],
  ['a mark of byte order', '\ufeff{}'],
  ['nothing but blanks', '   \n  '],
  ['a bare word', 'null'],
  ['not UTF-8', Buffer.from([0x7b, 0x22, 0xff, 0xfe, 0x22, 0x3a, 0x31, 0x7d]).toString('latin1')],
];

/** The same reader stands before every body: each raw one is sent to every sixth operation, and to all of them with DEEP=1. */
const everySixth = 6;

test.each(rawBodies)('%s is answered as the document says', { timeout: 60_000 }, async (name, body) => {
  const app = testApp();
  const agent = await everyRole(app);
  const document = (await agent.get('/api/v1/openapi.json')).body as Document;
  const offset = rawBodies.findIndex(([other]) => other === name);
  for (const [index, route] of allRoutes(app.deps).entries()) {
    const { operation } = route;
    if (!deep && index % everySixth !== offset % everySixth) continue;
    if (!operation.body || ['signOut', 'deleteMe'].includes(operation.id)) continue;
    const path = operation.path.replace(/\{\w+\}/g, '7');
    const answer = await agent[operation.method](`/api/v1${path}`).timeout(patienceMs).type('json').send(body);
    checkAnswer(route, document.paths[operation.path]![operation.method]!, answer, `${operation.method} ${path}`);
  }
  expect(({} as Record<string, unknown>).hull).toBeUndefined();
});

test('repeated, bracketed and prototype parameters build nothing', async () => {
  const agent = await testApp().as('visitor');
  for (const query of [
    'limit=1&limit=2',
    'limit[]=1',
    'limit[a]=1',
    '__proto__=1',
    '__proto__[x]=1',
    'constructor=1',
    'hasOwnProperty=1',
    '=',
    '&&&',
    'q=%00',
    'q=%F0%9F%9A%A4',
  ]) {
    const answer = await agent.get(`/api/v1/hulls?${query}`);
    expect(answer.status, query).toBeLessThan(500);
    if (answer.status >= 400) expect(Problem.safeParse(answer.body).success, query).toBe(true);
  }
});
