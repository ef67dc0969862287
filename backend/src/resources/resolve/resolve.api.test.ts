import { ResolveReply } from '@tiltwright/shared/schemas/resolve.ts';
import { expect, test } from 'vitest';
import { expectProblem, parsed, testApp } from '../../../../tests/support/test-app.ts';

const resolve = async (names: unknown[], candidates = 3) => {
  const agent = await testApp().as('visitor');
  return parsed(ResolveReply, await agent.post('/api/v1/hulls/resolve').send({ names, candidates }).expect(200));
};

test.each([
  ['Withyholm Reedcutter 14 2019', 'Reedcutter 14'],
  ['2016 withyholm reedcutter 14', 'Reedcutter 14'],
  ['2019 reedcuter14', 'Reedcutter 14'],
  ['Reed Cutter 14 2019 w/ trailer, cover', 'Reedcutter 14'],
  ['OSTREL HEDDLE-14', 'Heddle 14'],
  ['ostrl heddle 12', 'Heddle 12'],
  ['Quilhaven coperplate 670', 'Copperplate 670'],
])('%s is %s without asking', async (name, model) => {
  const { data } = await resolve([name]);
  const [{ best, candidates }] = data as [(typeof data)[number]];
  expect(candidates[0]!.model).toBe(model);
  expect(best, JSON.stringify(candidates)).toBe(candidates[0]!.id);
  expect(candidates[0]!.why.length).toBeGreaterThan(0);
});

test('a name that could be several hulls is left to a person, with all of them', async () => {
  const { data } = await resolve(['Ostrel Heddle'], 10);
  expect(data[0]!.best).toBeNull();
  const models = data[0]!.candidates.map(({ model }) => model);
  expect(models).toEqual(expect.arrayContaining(['Heddle 10', 'Heddle 12', 'Heddle 14']));
});

test('two generations of one name are told apart by the year alone', async () => {
  const { data } = await resolve(['Reedcutter 14', '2019 Reedcutter 14', '2024 Reedcutter 14']);
  expect(data[0]!.best).toBeNull();
  expect(data[0]!.candidates[0]!.score).toBe(1);
  expect(data[1]!.best).not.toBeNull();
  expect(data[2]!.best).not.toBeNull();
  expect(data[1]!.best).not.toBe(data[2]!.best);
});

test('the wrong size is not taken, and what is no boat has no candidate', async () => {
  const { data } = await resolve(['Ostrel Heddle 15', 'outboard oil filter xqz']);
  expect(data[0]!.best).toBeNull();
  expect(data[1]!.best).toBeNull();
});

test('a year outside the model’s years counts against it, and says so', async () => {
  const { data } = await resolve(['Ostrel Heddle 14', { name: 'Ostrel Heddle 14', year: 1995 }]);
  expect(data[0]!.best).not.toBeNull();
  expect(data[1]!.best).toBeNull();
  expect(data[1]!.candidates[0]!.why).toContain('not built in 1995');
});

test('order, refs and the maker apart from the name are kept', async () => {
  const { data } = await resolve(
    [{ ref: 'a', name: 'Heddle 12', maker: 'Ostrel' }, 'Reedcutter 14', { ref: 'c', name: 'Copperplate 670' }],
    1,
  );
  expect(data.map(({ ref }) => ref)).toEqual(['a', undefined, 'c']);
  expect(data.map(({ candidates }) => candidates[0]!.model)).toEqual(['Heddle 12', 'Reedcutter 14', 'Copperplate 670']);
});

test('a thousand names are taken, one more is not; each costs a unit', async () => {
  const agent = await testApp({ LIMIT_ANONYMOUS: '5000' }).as('visitor');
  const names = Array.from({ length: 1000 }, (_, n) => `Heddle ${n % 20}`);
  const answer = await agent.post('/api/v1/hulls/resolve').send({ names }).expect(200);
  expect(answer.body.data).toHaveLength(1000);
  expect((await agent.get('/api/v1/makers')).headers.ratelimit).toMatch(/r=3999/);
  expectProblem(await agent.post('/api/v1/hulls/resolve').send({ names: [...names, 'one more'] }), 'invalid-input');
});
