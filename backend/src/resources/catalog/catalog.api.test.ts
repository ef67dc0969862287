import { catalogTables } from '@tiltwright/shared/schemas/catalog-record.ts';
import { SearchHit } from '@tiltwright/shared/schemas/edition.ts';
import { hullForms } from '@tiltwright/shared/schemas/hull.ts';
import { expect, test } from 'vitest';
import { expectProblem, parsed, testApp } from '../../../../tests/support/test-app.ts';
import { listOf } from '../../http/cursor.ts';
import { kinds } from './kinds.ts';

test.each(catalogTables)('every record of %s reads by its schema, and its sheet too', async (kind) => {
  const agent = await testApp().as('visitor');
  let cursor = '';
  let seen = 0;
  do {
    const { data, next } = parsed(listOf(kinds[kind].record), await agent.get(`/api/v1/${kind}?limit=20${cursor}`).expect(200));
    seen += data.length;
    parsed(kinds[kind].sheet, await agent.get(`/api/v1/${kind}/${data[0]!.id}`).expect(200));
    cursor = next ? `&cursor=${next}` : '';
  } while (cursor);
  const least = { hulls: 60, 'lower-units': 40, transducers: 14, mounts: 18 };
  expect(seen).toBeGreaterThan(least[kind]);
});

test('the demo world has hulls of every form and generic parts whose every value is a class default', async () => {
  const agent = await testApp().as('visitor');
  for (const form of hullForms)
    expect((await agent.get(`/api/v1/hulls?form=${form}&generic=false&limit=1`)).body.data, form).toHaveLength(1);
  const { data } = (await agent.get('/api/v1/hulls?generic=true')).body;
  expect(data.length).toBeGreaterThan(5);
  const sheet = (await agent.get(`/api/v1/hulls/${data[0].id}`)).body;
  expect(new Set(Object.values(sheet.values as Record<string, { basis: string }>).map(({ basis }) => basis))).toEqual(new Set(['class']));
});

test('filters narrow the list', async () => {
  const agent = await testApp().as('visitor');
  const { data } = (await agent.get('/api/v1/hulls?lengthMinM=4&lengthMaxM=4.5&deadriseMaxDeg=10&generic=false')).body;
  expect(data.length).toBeGreaterThan(0);
  for (const hull of data) {
    expect(hull.lengthM).toBeGreaterThanOrEqual(4);
    expect(hull.lengthM).toBeLessThanOrEqual(4.5);
    expect(hull.deadriseDeg).toBeLessThanOrEqual(10);
  }
});

test('the pages of a list hold every record once', async () => {
  const agent = await testApp().as('visitor');
  const ids: string[] = [];
  let next: string | null = '';
  while (next !== null) {
    const { body }: { body: { data: { id: string }[]; next: string | null } } = await agent
      .get(`/api/v1/hulls?limit=7${next ? `&cursor=${next}` : ''}`)
      .expect(200);
    ids.push(...body.data.map((hull) => hull.id));
    next = body.next;
  }
  expect(new Set(ids).size).toBe(ids.length);
  expect(ids.length).toBeGreaterThan(60);
});

test.each([
  ['reedcutter 14', 'Reedcutter 14'],
  ['redcutter 14', 'Reedcutter 14'],
  ['reedcuter14', 'Reedcutter 14'],
  ['reedctuter 14', 'Reedcutter 14'],
  ['reed cutter 14', 'Reedcutter 14'],
  ['withyhlom reedcuttr 14', 'Reedcutter 14'],
  ['quilhaven coperplate', 'Copperplate 670'],
  ['copper plate 670', 'Copperplate 670'],
  ['HEDDLE-14', 'Heddle 14'],
  ['ostrl hedle 14', 'Heddle 14'],
  ['drawknfe 50', 'Drawknife 50'],
  ['tithebarn', 'Tithe Barn 76'],
])('%s finds %s first', async (q, model) => {
  const agent = await testApp().as('visitor');
  const { data } = (await agent.get('/api/v1/hulls').query({ q }).expect(200)).body;
  expect(data[0]?.model).toBe(model);
});

test('words that are no boat find nothing, and one box finds motors too', async () => {
  const agent = await testApp().as('visitor');
  expect((await agent.get('/api/v1/hulls?q=xqzzkv').expect(200)).body.data).toEqual([]);
  expect((await agent.get('/api/v1/hulls').query({ q: '***' }).expect(200)).body.data).toEqual([]);
  const hits = parsed(listOf(SearchHit), await agent.get('/api/v1/search').query({ q: 'whetston' }).expect(200));
  expect(hits.data[0]).toMatchObject({ kind: 'lower-units', corrected: [] });
  const slip = parsed(listOf(SearchHit), await agent.get('/api/v1/search').query({ q: 'wetstone' }).expect(200));
  expect(slip.data[0]).toMatchObject({ kind: 'lower-units', corrected: ['wetstone'] });
});

test('a sheet is answered 304 to whoever has its revision', async () => {
  const agent = await testApp().as('visitor');
  const { id } = (await agent.get('/api/v1/hulls?limit=1')).body.data[0];
  const { headers } = await agent.get(`/api/v1/hulls/${id}`).expect(200);
  expect(headers.etag).toMatch(/^"hul_/);
  await agent.get(`/api/v1/hulls/${id}`).set('If-None-Match', headers.etag!).expect(304);
});

test('an unknown id is not found, in the one shape', async () => {
  const agent = await testApp().as('visitor');
  for (const kind of catalogTables) {
    expectProblem(await agent.get(`/api/v1/${kind}/nothing`), 'not-found');
    expectProblem(await agent.get(`/api/v1/${kind}/nothing/revisions`), 'not-found');
  }
  expectProblem(await agent.get('/api/v1/hulls/nothing/trim-points'), 'not-found');
  expectProblem(await agent.get('/api/v1/editions/999'), 'not-found');
});
