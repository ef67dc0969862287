import { Import, ImportRow } from '@tiltwright/shared/schemas/import.ts';
import { expect, test } from 'vitest';
import { type Agent, check, checked, publish, published, uploaded } from '../../../../tests/support/import-steps.ts';
import { callers, expectProblem, parsed, testApp } from '../../../../tests/support/test-app.ts';
import { listOf } from '../../http/cursor.ts';
import { beginCheck } from './check-import.ts';

const header = 'maker,model,form,length_m,beam_m,deadrise_deg,dry_mass_kg';
const patch = (agent: Agent, id: string, n: number, body: object) => agent.patch(`/api/v1/imports/${id}/rows/${n}`).send(body);
const countsOf = async (agent: Agent, id: string) => parsed(Import, await agent.get(`/api/v1/imports/${id}`).expect(200)).counts;

test('a wrong cell is mended in place, the row judged again, the mended value published', async () => {
  const steward = await testApp().as('steward');
  const { id, counts } = await checked(steward, `${header}\nAlderwick,Smew,flat,4,1.5,steep,\nAlderwick,Scaup,flat,4,1.5,1,\n`);
  expect(counts).toMatchObject({ new: 1, error: 1 });
  const row = parsed(ImportRow, await patch(steward, id, 2, { cells: { deadrise_deg: '2°' } }).expect(200));
  expect(row).toMatchObject({ n: 2, fate: 'new', errors: [], edits: { deadrise_deg: '2°' }, cells: { deadrise_deg: 'steep' } });
  expect(await countsOf(steward, id)).toMatchObject({ new: 2, error: 0 });
  const back = parsed(ImportRow, await patch(steward, id, 2, { cells: { deadrise_deg: null } }).expect(200));
  expect(back).toMatchObject({ fate: 'error', edits: {} });
  await patch(steward, id, 2, { cells: { deadrise_deg: '2' } }).expect(200);
  await publish(steward, id);
  expect((await steward.get('/api/v1/hulls').query({ q: 'alderwick smew' })).body.data[0].deadriseDeg).toBe(2);
});

test('edits outlive a new check, and a column that the file has not can be filled', async () => {
  const steward = await testApp().as('steward');
  const { id } = await checked(steward, 'maker,model,length_m\nAlderwick,Smew,4\nAlderwick,Scaup,4\n');
  expect(await countsOf(steward, id)).toMatchObject({ error: 2 });
  await patch(steward, id, 3, { cells: { form: 'flat' } }).expect(200);
  expect((await check(steward, id)).counts).toMatchObject({ new: 1, error: 1 });
});

test('the same fix for all cells alike, and only for those', async () => {
  const steward = await testApp().as('steward');
  const rows = ['Smew,semi-vee', 'Scaup,semi-vee ', 'Teal,semi-v', 'Coot,flat'].map((row) => `Alderwick,${row},4`);
  const { id } = await checked(steward, ['maker,model,form,length_m', ...rows].join('\n'));
  expect(await countsOf(steward, id)).toMatchObject({ new: 1, error: 3 });
  const fix = { column: 'form', from: 'semi-vee', to: 'modified-v' };
  expect((await steward.post(`/api/v1/imports/${id}/fixes`).send(fix).expect(200)).body).toEqual({ rows: 2 });
  expect(await countsOf(steward, id)).toMatchObject({ new: 3, error: 1 });
  expectProblem(await steward.post(`/api/v1/imports/${id}/fixes`).send({ ...fix, from: 'nowhere' }), 'invalid-input');
  expect((await check(steward, id)).counts).toMatchObject({ new: 3, error: 1 });
});

test('a mended name frees the row it clashed with, and clashes with another', async () => {
  const steward = await testApp().as('steward');
  const rows = ['Teal,flat,4,1.4,1,', 'Teal,flat,4,1.4,2,', 'Coot,flat,4,1.4,2,'].map((row) => `Alderwick,${row}`);
  const { id, counts } = await checked(steward, [header, ...rows].join('\n'));
  expect(counts).toMatchObject({ new: 2, error: 1 });
  const fateOf = async (n: number) =>
    parsed(listOf(ImportRow), await steward.get(`/api/v1/imports/${id}/rows`)).data.find((row) => row.n === n)!;
  await patch(steward, id, 2, { cells: { model: 'Smew' } }).expect(200);
  expect([(await fateOf(2)).fate, (await fateOf(3)).fate]).toEqual(['new', 'new']);
  await patch(steward, id, 3, { cells: { model: 'Coot' } }).expect(200);
  expect(await fateOf(4)).toMatchObject({ fate: 'duplicate', errors: [{ message: 'Row 3 says the same.' }] });
  expect(await countsOf(steward, id)).toEqual({ new: 2, changed: 0, unchanged: 0, duplicate: 1, conflict: 0, error: 0 });
});

test('a conflict is decided for the catalog or for the row, field by field of that row', async () => {
  const app = testApp();
  const steward = await app.as('steward');
  await published(steward, 'maker,model,form,length_m,deadrise_deg,method\nAlderwick,Grebe,shallow-v,4.4,11,measured\n');
  const lower = 'maker,model,form,length_m,deadrise_deg,beam_m,method\nAlderwick,Grebe,shallow-v,4.4,12,1.7,published\n';
  const { id } = await checked(steward, lower);
  expect(parsed(ImportRow, await patch(steward, id, 2, { resolution: 'catalog' }).expect(200))).toMatchObject({
    fate: 'changed',
    resolution: 'catalog',
    changes: [{ field: 'beamM', before: null, after: 1.7 }],
  });
  expect(parsed(ImportRow, await patch(steward, id, 2, { resolution: null }).expect(200)).fate).toBe('conflict');
  const won = parsed(ImportRow, await patch(steward, id, 2, { resolution: 'row' }).expect(200));
  expect(won.changes).toContainEqual({ field: 'deadriseDeg', before: 11, after: 12 });
  await publish(steward, id);
  const hull = (await steward.get('/api/v1/hulls').query({ q: 'grebe' })).body.data[0];
  const { values } = (await steward.get(`/api/v1/hulls/${hull.id}`)).body;
  expect(values.deadriseDeg).toMatchObject({ value: 12, basis: 'published' });
  expect(values.lengthM).toMatchObject({ value: 4.4, basis: 'measured' });
});

test('skipped rows stay out; held cautions too, unless they are ticked', async () => {
  const steward = await testApp().as('steward');
  // 900 kg dry on a 4 m hull is a caution, no error.
  const rows = ['Smew,flat,4,1.5,1,120', 'Scaup,flat,4,1.5,1,120', 'Teal,flat,4,1.5,1,900', 'Coot,flat,4,1.5,1,900'];
  const { id } = await checked(steward, [header, ...rows.map((row) => `Alderwick,${row}`)].join('\n'));
  await patch(steward, id, 3, { decision: 'skip' }).expect(200);
  await patch(steward, id, 5, { decision: 'accept' }).expect(200);
  await publish(steward, id, { holdCautions: true });
  const models = (await steward.get('/api/v1/hulls?maker=Alderwick')).body.data.map((hull: { model: string }) => hull.model);
  expect(models).toEqual(['Coot', 'Smew']);
});

test('rows of a published import, unknown rows, unknown columns and an outdated check are refused', async () => {
  const steward = await testApp().as('steward');
  const { id } = await checked(steward, `${header}\nAlderwick,Smew,flat,4,1.5,1,\n`);
  expectProblem(await patch(steward, id, 9, { decision: 'skip' }), 'not-found');
  const { issues } = expectProblem(await patch(steward, id, 2, { cells: { colour: 'red' } }), 'invalid-input');
  expect(issues[0]!.path).toBe('/cells/colour');
  expectProblem(await patch(steward, id, 2, { cells: { model: 7 } }), 'invalid-input');
  await published(steward, `${header}\nAlderwick,Scaup,flat,4,1.5,1,\n`);
  expectProblem(await patch(steward, id, 2, { decision: 'skip' }), 'stale-edition');
  await check(steward, id);
  await publish(steward, id);
  expectProblem(await patch(steward, id, 2, { decision: 'skip' }), 'wrong-state');
});

test('of two stewards who publish, the second is told which of her rows the first has changed', async () => {
  const app = testApp();
  const [one, other] = [await app.as('steward'), await app.as('admin')];
  await published(one, `${header}\nAlderwick,Smew,flat,4,1.5,1,\n`);
  const mine = await checked(one, `${header}\nAlderwick,Smew,flat,4,1.5,2,\n`);
  const hers = await checked(other, `${header}\nAlderwick,Smew,flat,4,1.6,,\n`);
  await publish(one, mine.id);
  const problem = expectProblem(await other.post(`/api/v1/imports/${hers.id}/publish`), 'stale-edition');
  expect(problem.issues).toEqual([{ path: '/rows/2', code: 'changed-since', message: expect.stringContaining('Alderwick Smew') }]);
  expect((await check(other, hers.id)).counts).toMatchObject({ changed: 1 });
  await publish(other, hers.id);
});

test('a check under way is cancelled: the file stays, and can be checked again', async () => {
  const app = testApp();
  const steward = await app.as('steward');
  const id = await uploaded(steward, `${header}\nAlderwick,Smew,flat,4,1.5,1,\n`);
  expectProblem(await steward.post(`/api/v1/imports/${id}/cancel`), 'wrong-state');
  beginCheck(app, id);
  expect(parsed(Import, await steward.post(`/api/v1/imports/${id}/cancel`).expect(200))).toMatchObject({
    status: 'uploaded',
    counts: null,
  });
  expect((await check(steward, id)).counts).toMatchObject({ new: 1 });
});

test('progress comes as server-sent events that end with the check', async () => {
  const steward = await testApp().as('steward');
  const rows = Array.from({ length: 3000 }, (_, index) => `Alderwick,Smew ${index},flat,4,1.5,1,`);
  const id = await uploaded(steward, [header, ...rows].join('\n'));
  await steward.post(`/api/v1/imports/${id}/check`).expect(202);
  const { text, headers } = await steward
    .get(`/api/v1/imports/${id}/events`)
    .buffer(true)
    .parse(readText)
    .expect(200)
    .then((answer) => ({ text: answer.body as string, headers: answer.headers }));
  expect(headers['content-type']).toMatch(/^text\/event-stream/);
  const events = text.split('\n\n').filter((event) => event.startsWith('event: import\n'));
  const seen = events.map((event) => Import.parse(JSON.parse(event.split('\ndata: ')[1]!)));
  expect(seen.at(-1)).toMatchObject({ status: 'checked', checkedRows: 3000, counts: { new: 3000 } });
});

function readText(response: unknown, done: (error: Error | null, body: string) => void): void {
  const stream = response as NodeJS.ReadableStream;
  let text = '';
  stream.on('data', (piece) => {
    text += String(piece);
  });
  stream.on('end', () => done(null, text));
}

test.each(callers)('%s and review: stewards and admins only', async (caller) => {
  const app = testApp();
  const { id } = await checked(await app.as('steward'), `${header}\nAlderwick,Smew,flat,4,1.5,1,\n`);
  const agent = await app.as(caller);
  const answers = [
    await patch(agent, id, 2, { decision: 'skip' }),
    await agent.post(`/api/v1/imports/${id}/fixes`).send({ column: 'form', from: 'flat', to: 'pontoon' }),
    await agent.get(`/api/v1/imports/${id}/events`),
  ];
  for (const answer of answers) {
    if (caller === 'steward' || caller === 'admin') expect(answer.status).toBe(200);
    else expectProblem(answer, caller === 'visitor' ? 'sign-in-needed' : 'not-allowed');
  }
});
