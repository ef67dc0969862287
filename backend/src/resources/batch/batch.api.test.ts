import { BatchDone, BatchProblem } from '@tiltwright/shared/schemas/batch.ts';
import { FitAnswer } from '@tiltwright/shared/schemas/fit.ts';
import { expect, test } from 'vitest';
import { callers, expectProblem, testApp } from '../../../../tests/support/test-app.ts';
import { fitExample } from '../questions/examples.ts';
import { batchExample } from './examples.ts';

type Agent = Awaited<ReturnType<ReturnType<typeof testApp>['as']>>;

async function send(agent: Agent, text: string) {
  const answer = await agent
    .post('/api/v1/fits/batch')
    .type('application/x-ndjson')
    .buffer(true)
    .parse((res, done) => {
      let body = '';
      res.setEncoding('utf8');
      res.on('data', (piece: string) => {
        body += piece;
      });
      res.on('end', () => done(null, body));
    })
    .send(text);
  expect(answer.status, String(answer.body)).toBe(200);
  expect(answer.headers['content-type']).toBe('application/x-ndjson');
  const lines = String(answer.body)
    .trimEnd()
    .split('\n')
    .map((line) => JSON.parse(line));
  return { lines: lines.slice(0, -1), done: BatchDone.parse(lines.at(-1)), headers: answer.headers };
}

const plain = { ...fitExample, alsoAt: undefined };
const lines = (...values: unknown[]) => values.map((value) => JSON.stringify(value)).join('\n');

test('the documented example: shared parts by name, two answers in order, and a last line', async () => {
  const { lines: answers, done } = await send(await testApp().as('integrator'), batchExample);
  expect(answers.map((answer) => FitAnswer.parse(answer).ref)).toEqual(['job 1', 'job 2']);
  expect(done).toMatchObject({ done: true, count: 2, problems: 0 });
});

test('a line answers what the same single question without sampling answers', async () => {
  const agent = await testApp().as('integrator');
  const single = (await agent.post('/api/v1/fits').send({ ...plain, uncertainty: 'none' })).body;
  const { lines: answers } = await send(agent, lines(plain));
  expect(answers[0]).toEqual(single);
  expect(answers[0].dominantInput).toBeNull();
});

test('a wrong line gets its problem and the others their answers', async () => {
  const text = [
    JSON.stringify({ ...plain, ref: 'good' }),
    '{"ref": "cut',
    JSON.stringify({ ...plain, ref: 'wrong', running: { speedKn: -3 } }),
    '',
    JSON.stringify({ ...plain, ref: 'unknown', hull: 'hul_nothing' }),
    JSON.stringify({ ...plain, ref: 'unnamed', hull: '#nothing' }),
    '[]',
    JSON.stringify({ ...plain, ref: 'last' }),
  ].join('\r\n');
  const { lines: answers, done } = await send(await testApp().as('integrator'), text);
  const problems = answers.filter((line) => 'problem' in line).map((line) => BatchProblem.parse(line));
  expect(problems.map(({ line, ref, problem }) => [line, ref, problem.code])).toEqual([
    [2, undefined, 'malformed-json'],
    [3, 'wrong', 'invalid-input'],
    [5, 'unknown', 'unknown-part'],
    [6, 'unnamed', 'unknown-part'],
    [7, undefined, 'invalid-input'],
  ]);
  expect(problems[1]!.problem.issues[0]!.path).toBe('/running/speedKn');
  expect([answers[0].ref, answers.at(-1).ref]).toEqual(['good', 'last']);
  expect(done).toMatchObject({ count: 7, problems: 5 });
});

test('wrong shared parts are refused at once, and prototype names are no parts', async () => {
  const agent = await testApp().as('integrator');
  const refused = await agent
    .post('/api/v1/fits/batch')
    .type('application/x-ndjson')
    .send(lines({ shared: { hulls: { a: { form: 'banana', lengthM: 4 } } } }, plain));
  expect(expectProblem(refused, 'invalid-input').issues[0]!.path).toBe('/shared/hulls/a/form');
  const { lines: answers } = await send(
    agent,
    `{"shared":{"hulls":{}}}\n${['#__proto__', '#constructor', '#toString'].map((hull) => JSON.stringify({ ...plain, hull })).join('\n')}`,
  );
  expect(answers.map((line) => BatchProblem.parse(line).problem.code)).toEqual(['unknown-part', 'unknown-part', 'unknown-part']);
});

test('an empty batch ends at once; another kind of body is refused', async () => {
  const agent = await testApp().as('integrator');
  expect((await send(agent, '\n\n')).done).toMatchObject({ count: 0, problems: 0 });
  expectProblem(await agent.post('/api/v1/fits/batch').send([plain]), 'unsupported-media-type');
});

test('a line without an end does not fill the memory', async () => {
  const text = `${JSON.stringify({ shared: {} })}\n{"ref":"${'x'.repeat(200_000)}"}\n${JSON.stringify(plain)}`;
  const { lines: answers } = await send(await testApp().as('integrator'), text);
  expect(BatchProblem.parse(answers[0])).toMatchObject({ line: 2, problem: { code: 'body-too-large' } });
  expect(FitAnswer.parse(answers[1]).verdict).toBeDefined();
});

test('past ten thousand lines it says so and stops', async () => {
  const { lines: answers, done } = await send(await testApp().as('integrator'), `${'0\n'.repeat(10_002)}`);
  expect(answers).toHaveLength(10_001);
  expect(BatchProblem.parse(answers[9_999]).problem.code).toBe('invalid-input');
  expect(BatchProblem.parse(answers[10_000])).toMatchObject({ line: 10_001, problem: { code: 'body-too-large' } });
  expect(done.count).toBe(10_000);
});

test('a batch costs the sum of its lines', async () => {
  const agent = await testApp({ LIMIT_ACCOUNT: '1000' }).as('integrator');
  await send(agent, lines(plain, plain, { ...plain, uncertainty: 'sampled' }));
  // 1 for the batch, 2 + 2 + 20 for its lines, 1 for this.
  expect((await agent.get('/api/v1/makers')).headers.ratelimit).toMatch(/r=974/);
});

test.each(callers)('%s and batches: whoever is signed in', async (caller) => {
  const agent = await testApp().as(caller);
  if (caller === 'visitor')
    expectProblem(await agent.post('/api/v1/fits/batch').type('application/x-ndjson').send(lines(plain)), 'sign-in-needed');
  else expect((await send(agent, lines(plain))).done.count).toBe(1);
});
