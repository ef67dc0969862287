import { parseTable } from '@tiltwright/shared/csv/formats.ts';
import { tables } from '@tiltwright/shared/schemas/catalog-record.ts';
import { ChangePage, RecordDifference, RolledBack } from '@tiltwright/shared/schemas/edition.ts';
import { HullSheet } from '@tiltwright/shared/schemas/hull.ts';
import { expect, test } from 'vitest';
import { type Agent, checked, published } from '../../../../tests/support/import-steps.ts';
import { callers, expectProblem, parsed, testApp } from '../../../../tests/support/test-app.ts';
import { outbox } from '../../db/schema/outbox.ts';
import { listOf } from '../../http/cursor.ts';
import { currentEdition } from '../catalog/queries.ts';

const header = 'maker,model,form,length_m,beam_m,deadrise_deg,method,source';
const row = (model: string, rest: string) => `Alderwick,${model},flat,4,${rest}`;
const hullOf = async (agent: Agent, q: string) => (await agent.get('/api/v1/hulls').query({ q })).body.data[0];
const sheetOf = async (agent: Agent, id: string) => parsed(HullSheet, await agent.get(`/api/v1/hulls/${id}`).expect(200));
const rollBack = (agent: Agent, edition: number, body: object = {}) => agent.post(`/api/v1/editions/${edition}/rollback`).send(body);

test('a rollback restores values with where they came from, withdraws what was new, and is an edition itself', async () => {
  const app = testApp();
  const steward = await app.as('steward');
  await published(steward, [header, row('Smew', '1.5,1,estimated,first list')].join('\n'));
  const edition = await published(
    steward,
    [header, row('Smew', '1.6,2,published,second list'), row('Scaup', '1.5,1,published,second list')].join('\n'),
  );
  const [smew, scaup] = [await hullOf(steward, 'smew'), await hullOf(steward, 'scaup')];
  expect(smew).toMatchObject({ beamM: 1.6, deadriseDeg: 2, revision: 2 });

  const result = parsed(RolledBack, await rollBack(steward, edition, { why: 'List withdrawn' }).expect(200));
  expect(result).toEqual({ edition: edition + 1, records: 2, withdrawn: 1, kept: [] });
  const restored = await sheetOf(steward, smew.id);
  expect(restored).toMatchObject({ beamM: 1.5, deadriseDeg: 1, revision: 3, status: 'published' });
  expect(restored.values.beamM).toEqual({ value: 1.5, basis: 'estimated', sigma: null, source: 'first list', sourceDate: null });

  expect(await hullOf(steward, 'scaup')).toBeUndefined();
  expect((await steward.get('/api/v1/hulls?maker=Alderwick')).body.data).toHaveLength(1);
  expect((await steward.get('/api/v1/search?q=scaup')).body.data).toEqual([]);
  expect(await sheetOf(steward, scaup.id)).toMatchObject({ status: 'withdrawn', model: 'Scaup' });
  const history = (await steward.get(`/api/v1/hulls/${smew.id}/revisions`)).body.data;
  expect(history.map(({ why, edition: at }: { why: string; edition: number }) => [at, why])).toEqual([
    [edition + 1, 'List withdrawn'],
    [edition, null],
    [edition - 1, null],
  ]);

  // A rollback is an edition like others: rolled back, the withdrawn record stands again.
  parsed(RolledBack, await rollBack(steward, edition + 1).expect(200));
  expect(await sheetOf(steward, scaup.id)).toMatchObject({ status: 'published', beamM: 1.5 });
  expect((await hullOf(steward, 'scaup')).id).toBe(scaup.id);
  expect(await hullOf(steward, 'smew')).toMatchObject({ beamM: 1.6, deadriseDeg: 2 });
});

test('what a later edition has set again stays, and is named', async () => {
  const steward = await testApp().as('steward');
  await published(steward, [header, row('Smew', '1.5,1,published,a')].join('\n'));
  const middle = await published(steward, [header, row('Smew', '1.6,2,published,b')].join('\n'));
  await published(steward, [header, row('Smew', '1.7,,published,c')].join('\n'));
  const { id } = await hullOf(steward, 'smew');
  const result = parsed(RolledBack, await rollBack(steward, middle).expect(200));
  expect(result.kept).toEqual([{ record: id, fields: ['beamM'] }]);
  expect(await sheetOf(steward, id)).toMatchObject({ beamM: 1.7, deadriseDeg: 1 });
  expectProblem(await rollBack(steward, middle), 'wrong-state');
});

test('trim points are rolled back and come again under their old id', async () => {
  const steward = await testApp().as('steward');
  await published(steward, [header, row('Smew', '1.5,1,published,a')].join('\n'));
  const points = 'hull_maker,hull_model,speed_kn,trim_deg,method,source\nAlderwick,Smew,12,4.5,measured,log\n';
  const edition = await published(steward, points, 'trim-points');
  const { id } = await hullOf(steward, 'smew');
  const listed = async () => (await steward.get(`/api/v1/hulls/${id}/trim-points`)).body.data;
  const [point] = await listed();
  await rollBack(steward, edition).expect(200);
  expect(await listed()).toEqual([]);
  expect((await checked(steward, points, 'trim-points')).counts).toMatchObject({ new: 1 });
  await published(steward, points.replace('4.5', '4.7'), 'trim-points');
  expect(await listed()).toMatchObject([{ id: point.id, trimDeg: 4.7 }]);
});

test('two editions side by side: the net difference, whatever happened in between', async () => {
  const app = testApp();
  const steward = await app.as('steward');
  const before = currentEdition(app.db);
  const first = await published(steward, [header, row('Smew', '1.5,1,published,a')].join('\n'));
  await published(steward, [header, row('Smew', '1.6,2,published,b')].join('\n'));
  const last = await published(steward, [header, row('Smew', '1.6,1,published,c')].join('\n'));
  const compare = async (a: number, b: number) =>
    parsed(listOf(RecordDifference), await steward.get(`/api/v1/editions/${a}/compare/${b}`).expect(200)).data;
  expect(await compare(first, last)).toMatchObject([
    { kind: 'hulls', name: 'Alderwick Smew', isNew: false, changes: [{ field: 'beamM', before: 1.5, after: 1.6 }] },
  ]);
  expect((await compare(before, last))[0]).toMatchObject({ isNew: true });
  expect(await compare(last, last)).toEqual([]);
  expectProblem(await steward.get(`/api/v1/editions/${last}/compare/${first}`), 'invalid-input');
  expectProblem(await steward.get(`/api/v1/editions/${first}/compare/999`), 'not-found');
});

test('the feed gives every change once, oldest first, and goes on from where one stopped', async () => {
  const app = testApp();
  const [steward, visitor] = [await app.as('steward'), await app.as('visitor')];
  const known = currentEdition(app.db);
  await published(
    steward,
    [header, row('Smew', '1.5,1,published,a'), row('Scaup', '1.5,1,published,a'), row('Teal', '1.5,1,published,a')].join('\n'),
  );
  const feed = async (after: string) => parsed(ChangePage, await visitor.get('/api/v1/changes').query({ after, limit: 2 }).expect(200));
  const one = await feed(String(known));
  const two = await feed(one.next);
  expect([one.more, two.more]).toEqual([true, false]);
  expect(new Set([...one.data, ...two.data].map(({ record }) => record)).size).toBe(3);
  const later = await feed(two.next);
  expect(later).toMatchObject({ data: [], more: false, next: two.next });
  await published(steward, [header, row('Teal', '1.6,1,published,b')].join('\n'));
  expect((await feed(later.next)).data).toMatchObject([
    { isNew: false, source: 'b', changes: [{ field: 'beamM', before: 1.5, after: 1.6 }] },
  ]);
  expectProblem(await visitor.get('/api/v1/changes?after=somewhere'), 'invalid-input');
});

test('an edition and the word about it to the outside stand or fall together', async () => {
  const app = testApp();
  const steward = await app.as('steward');
  const seeded = app.db.select().from(outbox).all().length;
  const edition = await published(steward, [header, row('Smew', '1.5,1,published,a')].join('\n'), 'hulls', { why: 'Spring list' });
  const { id } = await hullOf(steward, 'smew');
  const told = app.db.select().from(outbox).all().slice(seeded);
  expect(told).toMatchObject([
    { topic: 'hull.changed', edition, payload: { hull: id, edition } },
    { topic: 'edition.published', edition, payload: { edition, records: 1, why: 'Spring list' } },
  ]);
});

test.each(tables)('the export of %s reads back as unchanged throughout, and holds nothing a spreadsheet runs', async (table) => {
  const app = testApp();
  const [steward, visitor] = [await app.as('steward'), await app.as('visitor')];
  if (table === 'hulls') await published(steward, `${header}\n'=Alder+wick,Smew,flat,4,1.5,1,published,a\n`);
  const { text } = await visitor
    .get(`/api/v1/exports/${table}.csv`)
    .expect(200)
    .expect('Content-Type', /text\/csv/);
  const read = parseTable(Buffer.from(text), { table });
  if (read.problem) throw new Error(read.message);
  for (const { cells } of read.rows) for (const cell of cells) expect(cell).not.toMatch(/^[=+@\t]/);
  const { counts, rows } = await checked(steward, text, table);
  expect(counts).toEqual({ new: 0, changed: 0, unchanged: rows, duplicate: 0, conflict: 0, error: 0 });
  expect(rows).toBeGreaterThan(14);
});

test('a table that is none is refused', async () => {
  expectProblem(await (await testApp().as('visitor')).get('/api/v1/exports/users.csv'), 'invalid-input');
});

test.each(callers)('%s: rolls back only as steward or admin, compares and exports like anyone', async (caller) => {
  const app = testApp();
  const agent = await app.as(caller);
  const edition = currentEdition(app.db);
  await agent.get(`/api/v1/editions/0/compare/${edition}?limit=1`).expect(200);
  await agent.get('/api/v1/exports/mounts.csv').expect(200);
  const answer = await rollBack(agent, edition);
  if (caller === 'steward' || caller === 'admin') expect(answer.status).toBe(200);
  else {
    expectProblem(answer, caller === 'visitor' ? 'sign-in-needed' : 'not-allowed');
    expect(currentEdition(app.db)).toBe(edition);
  }
});
