import { readdirSync } from 'node:fs';
import { Edition, Revision } from '@tiltwright/shared/schemas/edition.ts';
import { Hull, HullSheet } from '@tiltwright/shared/schemas/hull.ts';
import { type Import, ImportRow, PublishedEdition } from '@tiltwright/shared/schemas/import.ts';
import { expect, test } from 'vitest';
import * as z from 'zod';
import { checked, settled, upload } from '../../../../tests/support/import-steps.ts';
import { callers, expectProblem, parsed, testApp } from '../../../../tests/support/test-app.ts';
import { listOf } from '../../http/cursor.ts';
import { currentEdition } from '../catalog/queries.ts';

const twoNewOneWrong = [
  'maker,model,form,length_m,beam_m,deadrise_deg,transom_angle_deg,source',
  'Alderwick,Moorhen 46,modified-v,4.6,1.9,17,13,Alderwick list',
  'Alderwick,Moorhen 52,modified-v,17\' 1",2.1,18,13,Alderwick list',
  'Alderwick,Moorhen 60,modified-v,6.0,2.3,steep,13,Alderwick list',
].join('\n');

test('two new rows and a wrong one: counted, explained, published, found with slips in the name', async () => {
  const app = testApp();
  const steward = await app.as('steward');
  const visitor = await app.as('visitor');
  const before = currentEdition(app.db);

  const checkedImport = await checked(steward, twoNewOneWrong);
  expect(checkedImport.status).toBe('checked');
  expect(checkedImport.counts).toEqual({ new: 2, changed: 0, unchanged: 0, duplicate: 0, conflict: 0, error: 1 });

  const wrong = parsed(listOf(ImportRow), await steward.get(`/api/v1/imports/${checkedImport.id}/rows?fate=error`).expect(200));
  expect(wrong.data.map(({ n, errors }) => [n, errors.map(({ column, value }) => [column, value])])).toEqual([
    [4, [['deadrise_deg', 'steep']]],
  ]);

  expect(parsed(listOf(Hull), await visitor.get('/api/v1/hulls?q=moorhen').expect(200)).data).toEqual([]);
  const { edition } = parsed(
    PublishedEdition,
    await steward.post(`/api/v1/imports/${checkedImport.id}/publish`).send({ why: 'Spring list' }).expect(200),
  );
  expect(edition).toBe(before + 1);

  const { data } = parsed(listOf(Hull), await visitor.get('/api/v1/hulls').query({ q: 'aldrewick mooren 52' }).expect(200));
  expect(data[0]).toMatchObject({ maker: 'Alderwick', model: 'Moorhen 52', deadriseDeg: 18, edition });
  // 17 ft 1 in = 205 in = 205 × 0.0254 m.
  expect(data[0]!.lengthM).toBeCloseTo(5.207, 6);

  const sheet = parsed(HullSheet, await visitor.get(`/api/v1/hulls/${data[0]!.id}`).expect(200));
  expect(sheet.values.deadriseDeg).toEqual({ value: 18, basis: 'published', sigma: null, source: 'Alderwick list', sourceDate: null });
  const history = parsed(listOf(Revision), await visitor.get(`/api/v1/hulls/${data[0]!.id}/revisions`).expect(200));
  expect(history.data).toHaveLength(1);
  expect(history.data[0]).toMatchObject({ revision: 1, edition, why: 'Spring list', source: 'Alderwick list' });
  expect(parsed(Edition, await visitor.get(`/api/v1/editions/${edition}`).expect(200))).toMatchObject({ records: 2, why: 'Spring list' });
});

test('the same table a second time is unchanged throughout, and says that the file is known', async () => {
  const steward = await testApp().as('steward');
  const first = await checked(steward, twoNewOneWrong);
  await steward.post(`/api/v1/imports/${first.id}/publish`).expect(200);
  const second = await checked(steward, twoNewOneWrong);
  expect(second.counts).toMatchObject({ new: 0, changed: 0, unchanged: 2, error: 1 });
  expect(second.sameFileAs).toBe(first.id);
  expectProblem(await steward.post(`/api/v1/imports/${second.id}/publish`), 'wrong-state');
});

test('a changed cell is shown field by field; a blank one leaves the stored value alone', async () => {
  const app = testApp();
  const steward = await app.as('steward');
  const first = await checked(steward, twoNewOneWrong);
  await steward.post(`/api/v1/imports/${first.id}/publish`).expect(200);

  const second = await checked(steward, 'maker,model,form,length_m,deadrise_deg\nalderwick,MOORHEN-46,modified-v,4.6,19\n');
  expect(second.counts).toMatchObject({ new: 0, changed: 1 });
  const rows = parsed(listOf(ImportRow), await steward.get(`/api/v1/imports/${second.id}/rows`).expect(200));
  expect(rows.data[0]!.changes).toEqual([{ field: 'deadriseDeg', before: 17, after: 19 }]);
  await steward.post(`/api/v1/imports/${second.id}/publish`).expect(200);
  const { data } = parsed(listOf(Hull), await steward.get('/api/v1/hulls?q=moorhen 46').expect(200));
  expect(data[0]).toMatchObject({ maker: 'Alderwick', model: 'Moorhen 46', deadriseDeg: 19, beamM: 1.9, revision: 2 });
});

test('a row twice in a file is a duplicate; two rows that disagree about one boat are wrong', async () => {
  const steward = await testApp().as('steward');
  const rows = [
    'maker,model,form,length_m,deadrise_deg',
    'Alderwick,Coot,flat,4,1',
    'Alderwick,Coot,flat,4,1',
    'Alderwick,Teal,flat,4,1',
    'Alderwick,Teal,flat,4,2',
  ];
  const { counts } = await checked(steward, rows.join('\n'));
  expect(counts).toMatchObject({ new: 2, duplicate: 1, error: 1 });
});

test('a value of lower basis than the stored one becomes a conflict, not an overwrite', async () => {
  const app = testApp();
  const steward = await app.as('steward');
  const measured = await checked(steward, 'maker,model,form,length_m,deadrise_deg,method\nAlderwick,Grebe,shallow-v,4.4,11,measured\n');
  await steward.post(`/api/v1/imports/${measured.id}/publish`).expect(200);
  const published = await checked(steward, 'maker,model,form,length_m,deadrise_deg,method\nAlderwick,Grebe,shallow-v,4.4,12,published\n');
  expect(published.counts).toMatchObject({ conflict: 1, changed: 0 });
  expectProblem(await steward.post(`/api/v1/imports/${published.id}/publish`), 'wrong-state');
  const { data } = parsed(listOf(Hull), await steward.get('/api/v1/hulls?q=grebe').expect(200));
  expect(data[0]!.deadriseDeg).toBe(11);
});

test('two imports checked against the same edition: the second is told that the catalog moved on', async () => {
  const steward = await testApp().as('steward');
  const one = await checked(steward, 'maker,model,form,length_m\nAlderwick,Smew,flat,4\n');
  const other = await checked(steward, 'maker,model,form,length_m\nAlderwick,Scaup,flat,4\n');
  await steward.post(`/api/v1/imports/${one.id}/publish`).expect(200);
  expectProblem(await steward.post(`/api/v1/imports/${other.id}/publish`), 'stale-edition');
  await steward.post(`/api/v1/imports/${other.id}/check`).expect(202);
  expect((await settled(steward, other.id)).status).toBe('checked');
  await steward.post(`/api/v1/imports/${other.id}/publish`).expect(200);
});

test('a trim point finds its hull by name and year, and says so where there is none', async () => {
  const app = testApp();
  const steward = await app.as('steward');
  const hulls = await checked(
    steward,
    'maker,model,form,length_m,years\nAlderwick,Dabchick,flat,4,2015-18\nAlderwick,Dabchick,flat,4.1,2019+\n',
  );
  await steward.post(`/api/v1/imports/${hulls.id}/publish`).expect(200);
  const points = [
    'hull_maker,hull_model,hull_year,speed_kn,trim_deg,method,source',
    'Alderwick,Dabchick,2016,12,4.5,measured,log 1',
    'Alderwick,Dabchick,,12,4.5,measured,log 1',
    'Alderwick,Nobody,2016,12,4.5,measured,log 1',
  ];
  const trim = await checked(steward, points.join('\n'), 'trim-points');
  expect(trim.counts).toMatchObject({ new: 1, error: 2 });
  const wrong = parsed(listOf(ImportRow), await steward.get(`/api/v1/imports/${trim.id}/rows?fate=error`).expect(200));
  expect(wrong.data.map(({ errors }) => errors[0]!.code)).toEqual(['ambiguous-hull', 'unknown-hull']);
  await steward.post(`/api/v1/imports/${trim.id}/publish`).expect(200);
  const hull = parsed(listOf(Hull), await steward.get('/api/v1/hulls?q=dabchick&year=2016').expect(200)).data[0]!;
  const listed = await steward.get(`/api/v1/hulls/${hull.id}/trim-points`).expect(200);
  expect(listed.body.data).toMatchObject([{ speedKn: 12, trimDeg: 4.5, basis: 'measured', source: 'log 1' }]);
});

test('errors come back as CSV with a reason column', async () => {
  const steward = await testApp().as('steward');
  const { id } = await checked(steward, twoNewOneWrong);
  const { text } = await steward
    .get(`/api/v1/imports/${id}/errors.csv`)
    .expect(200)
    .expect('Content-Type', /text\/csv/);
  const lines = text.trim().split(/\r?\n/);
  expect(lines).toHaveLength(2);
  expect(lines[0]!.endsWith(',reason')).toBe(true);
  expect(lines[1]).toContain('Moorhen 60');
  expect(lines[1]).toContain('deadrise_deg: ');
});

const notTables: [what: string, bytes: Buffer, code: 'binary-file' | 'wrong-encoding' | 'no-header' | 'bad-table'][] = [
  ['a spreadsheet binary named .csv', Buffer.from('PK\u0003\u0004\u0014\u0000\u0006\u0000 and so on', 'latin1'), 'binary-file'],
  ['a picture', Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13]), 'binary-file'],
  [
    'a UTF-8 mark before bytes that are not UTF-8',
    Buffer.concat([Buffer.from([0xef, 0xbb, 0xbf]), Buffer.from('maker,model\nM\xfcller,A\n', 'latin1')]),
    'wrong-encoding',
  ],
  ['rows without a header', Buffer.from('Alderwick,Smew,flat,4\nAlderwick,Scaup,flat,4\n'), 'no-header'],
  ['nothing at all', Buffer.from(''), 'bad-table'],
  ['a quote that never closes', Buffer.from('maker,model,form,length_m\n"Alderwick,Smew,flat,4\n'), 'bad-table'],
];

test.each(notTables)('%s is refused with its reason and not kept', async (_what, bytes, code) => {
  const app = testApp();
  const steward = await app.as('steward');
  const edition = currentEdition(app.db);
  const problem = expectProblem(await upload(steward, bytes), code);
  expect(problem.issues[0]?.path).toBe('/file');
  expect(readdirSync(app.config.uploadsFolder)).toEqual([]);
  expect(
    (await steward.get('/api/v1/imports').expect(200)).body.data.filter(
      (row: Import) => row.fileName === 'hulls.csv' && row.edition === null,
    ),
  ).toEqual([]);
  expect(currentEdition(app.db)).toBe(edition);
});

test('a file over the limit, an unknown table, a missing file and a form that is none', async () => {
  const app = testApp({ UPLOAD_MAX_MB: '1' });
  const steward = await app.as('steward');
  expectProblem(await upload(steward, `maker,model\n${'x'.repeat(1_100_000)},y\n`), 'body-too-large');
  expectProblem(await upload(steward, 'maker,model\n', 'boats'), 'invalid-input');
  expectProblem(await steward.post('/api/v1/imports').field('table', 'hulls'), 'invalid-input');
  expectProblem(await steward.post('/api/v1/imports').send({ table: 'hulls' }), 'unsupported-media-type');
  expect(readdirSync(app.config.uploadsFolder)).toEqual([]);
});

test.each(callers)('%s and imports: stewards and admins only', async (caller) => {
  const app = testApp();
  const agent = await app.as(caller);
  const allowed = caller === 'steward' || caller === 'admin';
  const code = caller === 'visitor' ? 'sign-in-needed' : 'not-allowed';
  const answer = await upload(agent, twoNewOneWrong);
  if (allowed) expect(answer.status).toBe(201);
  else {
    expectProblem(answer, code);
    expectProblem(await agent.get('/api/v1/imports'), code);
    expect(readdirSync(app.config.uploadsFolder)).toEqual([]);
  }
});

test('a discarded import is gone from the disk and cannot be published', async () => {
  const app = testApp();
  const steward = await app.as('steward');
  const { id } = await checked(steward, twoNewOneWrong);
  await steward.delete(`/api/v1/imports/${id}`).expect(204);
  expect(readdirSync(app.config.uploadsFolder)).toEqual([]);
  expectProblem(await steward.post(`/api/v1/imports/${id}/publish`), 'wrong-state');
  expect(z.object({ status: z.literal('discarded') }).safeParse((await steward.get(`/api/v1/imports/${id}`)).body).success).toBe(true);
});
