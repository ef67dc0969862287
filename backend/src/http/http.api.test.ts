import { expect, test } from 'vitest';
import { callers, expectProblem, testApp } from '../../../tests/support/test-app.ts';

const visitor = () => testApp().as('visitor');

test('an unknown address below the API is a problem, not a page', async () => {
  const agent = await visitor();
  expectProblem(await agent.get('/api/v1/boatyards'), 'route-not-found');
  expectProblem(await agent.get('/api/v2/hulls'), 'route-not-found');
  expectProblem(await agent.post('/api/v1/hulls/x/y/z').send({}), 'route-not-found');
});

test('a known address with another method names the methods it takes', async () => {
  const answer = await (await visitor()).put('/api/v1/hulls').send({});
  expectProblem(answer, 'method-not-allowed');
  expect(answer.headers.allow).toBe('GET, HEAD');
});

test('an unknown query parameter is an error that lists the known ones', async () => {
  const problem = expectProblem(await (await visitor()).get('/api/v1/hulls?colour=red'), 'unknown-parameter');
  expect(problem.issues[0]).toMatchObject({ path: 'colour' });
  expect(problem.issues[0]!.message).toContain('lengthMinM');
});

test.each([
  ['limit=lots', 'limit'],
  ['limit=0', 'limit'],
  ['limit=5&limit=6', 'limit'],
  ['year=18.5', 'year'],
  ['generic=maybe', 'generic'],
  ['form=banana', 'form'],
])('the parameter %s is refused by name', async (query, path) => {
  const problem = expectProblem(await (await visitor()).get(`/api/v1/hulls?${query}`), 'invalid-input');
  expect(problem.issues.map((issue) => issue.path)).toContain(path);
});

test('a cursor of someone’s own making is refused', async () => {
  expectProblem(await (await visitor()).get('/api/v1/hulls?cursor=abc'), 'invalid-input');
});

test('malformed JSON, another kind of body and an oversize one', async () => {
  const agent = await visitor();
  expectProblem(await agent.post('/api/v1/fits').type('json').send('{"hull": '), 'malformed-json');
  expectProblem(await agent.post('/api/v1/fits').type('text').send('hull=1'), 'unsupported-media-type');
  expectProblem(
    await agent
      .post('/api/v1/fits')
      .type('json')
      .send(JSON.stringify({ ref: 'x'.repeat(1_100_000) })),
    'body-too-large',
  );
  expectProblem(await agent.post('/api/v1/fits').set('Content-Encoding', 'sieve').type('json').send('{}'), 'unsupported-media-type');
});

test('a broken percent sign in an address', async () => {
  expectProblem(await (await visitor()).get('/api/v1/hulls/%E0%A4%A'), 'bad-request');
});

test('every answer carries the caller’s request id, or one of ours', async () => {
  const agent = await visitor();
  expect((await agent.get('/healthz').set('X-Request-Id', 'job-17')).headers['x-request-id']).toBe('job-17');
  expect((await agent.get('/healthz').set('X-Request-Id', 'a b')).headers['x-request-id']).toMatch(/^[0-9a-f-]{36}$/);
  const problem = expectProblem(await agent.get('/api/v1/nothing').set('X-Request-Id', 'job-18'), 'route-not-found');
  expect(problem.instance).toBe('/api/v1/nothing#job-18');
});

test('security headers stand on pages, API and problems alike', async () => {
  const agent = await visitor();
  for (const address of ['/healthz', '/api/v1/hulls?limit=1', '/api/v1/nothing']) {
    const { headers } = await agent.get(address);
    expect(headers['content-security-policy']).toContain("script-src 'self'");
    expect(headers['content-security-policy']).not.toContain('unsafe');
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['x-powered-by']).toBeUndefined();
  }
});

test('a write from another site is refused, whoever is signed in', async () => {
  const app = testApp();
  for (const caller of callers) {
    const agent = await app.as(caller);
    expectProblem(await agent.delete('/api/v1/session').set('Origin', 'https://elsewhere.example'), 'foreign-origin');
  }
});

test('health needs nobody signed in', async () => {
  const agent = await visitor();
  await agent.get('/healthz').expect(200, { status: 'alive' });
  await agent.get('/readyz').expect(200, { status: 'ready' });
});
