import { Job, MatchResult } from '@tiltwright/shared/schemas/match.ts';
import { expect, test } from 'vitest';
import { callers, expectProblem, parsed, type TestApp, testApp } from '../../../../tests/support/test-app.ts';
import { jobResults, jobs } from '../../db/schema/jobs.ts';
import { fitExample } from '../questions/examples.ts';

const { hull: _hull, ref: _ref, alsoAt: _alsoAt, ...rig } = fitExample;
const order = { rig, hulls: { form: 'shallow-v' } };
type Agent = Awaited<ReturnType<TestApp['as']>>;

async function ended(agent: Agent, id: string): Promise<Job> {
  for (let asked = 0; asked < 600; asked++) {
    const job = parsed(Job, await agent.get(`/api/v1/jobs/${id}`).expect(200));
    if (job.status !== 'waiting' && job.status !== 'running') return job;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  throw new Error('the job did not end');
}
async function resultsOf(agent: Agent, id: string): Promise<MatchResult[]> {
  const { text, body } = await agent
    .get(`/api/v1/jobs/${id}/results`)
    .buffer(true)
    .parse((res, done) => {
      let all = '';
      res.on('data', (piece: Buffer) => {
        all += piece.toString();
      });
      res.on('end', () => done(null, all));
    });
  return String(text ?? body)
    .split('\n')
    .filter(Boolean)
    .map((line) => MatchResult.parse(JSON.parse(line)));
}

test('each hull of the filter gets the verdict that its own fit gets', async () => {
  const agent = await testApp().as('integrator');
  const answer = await agent.post('/api/v1/matches').send(order).expect(202);
  const { id, total } = parsed(Job, answer);
  expect(answer.headers.location).toBe(`/api/v1/jobs/${id}`);
  const job = await ended(agent, id);
  expect(job).toMatchObject({ status: 'done', done: total, error: null });
  const results = await resultsOf(agent, id);
  const listed = (await agent.get('/api/v1/hulls?form=shallow-v&generic=false&limit=200')).body.data as { id: string }[];
  expect(results.map(({ hull }) => hull)).toEqual(listed.map((hull) => hull.id).sort());
  expect(Object.values(job.counts).reduce((sum, n) => sum + n)).toBe(results.length);
  for (const { hull, verdict, reasons } of results.slice(0, 4)) {
    const single = (
      await agent
        .post('/api/v1/fits')
        .send({ ...rig, hull, uncertainty: 'none' })
        .expect(200)
    ).body;
    expect(verdict).toBe(single.verdict);
    for (const { code } of single.reasons) expect(reasons).toContain(code);
  }
  const { text } = await agent.get(`/api/v1/jobs/${id}/results?format=csv`).expect(200);
  expect(text.split('\r\n')[0]).toBe('hull,maker,model,package,year_from,year_to,verdict,reasons');
  expect(text.trimEnd().split('\r\n')).toHaveLength(results.length + 1);
});

test('a job that a restart cut off goes on after its last hull, and answers each once', async () => {
  const app = testApp();
  const agent = await app.as('integrator');
  const { id } = (await agent.post('/api/v1/matches').send(order).expect(202)).body;
  const whole = await resultsOf(agent, (await ended(agent, id)).id);
  const [first, ...rest] = whole;
  app.db.delete(jobResults).run();
  app.db.insert(jobResults).values({ jobId: id, hullId: first!.hull, verdict: first!.verdict, reasons: first!.reasons }).run();
  app.db.update(jobs).set({ status: 'running', done: 1, endedAt: null }).run();
  const restarted = await app.again().as('integrator');
  expect(await ended(restarted, id)).toMatchObject({ status: 'done', done: whole.length });
  expect((await resultsOf(restarted, id)).slice(1)).toEqual(rest);
});

test('a cancelled job stops and keeps what it has; deleted, it is gone', async () => {
  const agent = await testApp().as('integrator');
  const { id } = (await agent.post('/api/v1/matches').send({ rig, hulls: {} }).expect(202)).body;
  await agent.delete(`/api/v1/jobs/${id}`).expect(204);
  const job = await ended(agent, id);
  expect(job.status).toBe('cancelled');
  expect(await resultsOf(agent, id)).toHaveLength(job.done);
  await agent.delete(`/api/v1/jobs/${id}`).expect(204);
  expectProblem(await agent.get(`/api/v1/jobs/${id}`), 'not-found');
});

test('an unknown part is refused before any work, and each hull costs two units', async () => {
  const agent = await testApp({ LIMIT_ACCOUNT: '1000' }).as('integrator');
  const wrong = await agent.post('/api/v1/matches').send({ ...order, rig: { ...rig, transducer: 'trd_nothing' } });
  expect(expectProblem(wrong, 'unknown-part').issues[0]!.path).toBe('/rig/transducer');
  const { total, id } = (await agent.post('/api/v1/matches').send(order).expect(202)).body;
  const { headers } = await agent.get(`/api/v1/jobs/${id}`).expect(200);
  expect(headers.ratelimit).toContain(`r=${1000 - 1 - 1 - 2 * total - 1};`);
  await ended(agent, id);
});

test('another account’s job is not there', async () => {
  const app = testApp();
  const { id } = (await (await app.as('integrator')).post('/api/v1/matches').send(order).expect(202)).body;
  const other = await app.as('customer');
  for (const answer of [
    await other.get(`/api/v1/jobs/${id}`),
    await other.get(`/api/v1/jobs/${id}/results`),
    await other.delete(`/api/v1/jobs/${id}`),
  ])
    expectProblem(answer, 'not-found');
  expect((await other.get('/api/v1/jobs').expect(200)).body.data).toEqual([]);
  await ended(await app.as('integrator'), id);
});

test.each(callers)('%s and matches: whoever is signed in', async (caller) => {
  const agent = await testApp().as(caller);
  const answer = await agent.post('/api/v1/matches').send({ ...order, hulls: { lengthMaxM: 3.1 } });
  if (caller === 'visitor') expectProblem(answer, 'sign-in-needed');
  else await ended(agent, parsed(Job, answer).id);
});
