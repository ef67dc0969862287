import { ImportRow } from '@tiltwright/shared/schemas/import.ts';
import { MappingSheet } from '@tiltwright/shared/schemas/mapping.ts';
import { expect, test } from 'vitest';
import { type Agent, check, checked, publish, upload, uploaded } from '../../../../tests/support/import-steps.ts';
import { callers, expectProblem, parsed, testApp } from '../../../../tests/support/test-app.ts';
import { listOf } from '../../http/cursor.ts';

/** A maker's own list: title rows, own words, one column for two sizes, years in one cell, feet and inches, no maker. */
const ownWords = [
  'Alderwick boats;;;;;;',
  'Spring list;;;;;;',
  'Boat model;Size (L x B);Years made;Vee angle;Transom height (in);Dealer;Shape',
  'Moorhen 46;15\' 1" x 6\' 3";2015-18;17;20;Mill Lane;modified v',
  'Moorhen 52;17\' 1" x 6\' 11";2019+;18;20;Quay;modified v',
  'Moorhen 60;19\' 8";2019+;18;25;Quay;modified v',
].join('\n');

const sheetOf = async (agent: Agent, id: string) => parsed(MappingSheet, await agent.get(`/api/v1/imports/${id}/mapping`).expect(200));
const save = (agent: Agent, id: string, mapping: object) => agent.put(`/api/v1/imports/${id}/mapping`).send(mapping);

test('own headers below title rows: suggested, mapped with constants, a split and a unit, checked and published', async () => {
  const steward = await testApp().as('steward');
  const id = await uploaded(steward, ownWords);
  expect((await steward.get(`/api/v1/imports/${id}`)).body).toMatchObject({ needsMapping: true, headerRow: 3, status: 'uploaded' });
  expectProblem(await steward.post(`/api/v1/imports/${id}/check`), 'incomplete-mapping');

  const suggested = await sheetOf(steward, id);
  expect(suggested).toMatchObject({ origin: 'suggested', missing: ['maker'], leftOut: ['Dealer'] });
  expect(suggested.top[0]).toEqual(['Alderwick boats', '', '', '', '', '', '']);
  expect(suggested.mapping.columns).toMatchObject([
    { at: 0, to: 'model' },
    { at: 1, split: { by: 'times', into: ['length_m', 'beam_m'] } },
    { at: 2, to: 'years' },
    { at: 3, to: 'deadrise_deg' },
    { at: 4, to: 'transom_height_mm', unit: 'in' },
    { at: 5 },
    { at: 6, to: 'form' },
  ]);

  const incomplete = parsed(MappingSheet, await save(steward, id, suggested.mapping).expect(200));
  expect(incomplete).toMatchObject({ origin: 'saved', missing: ['maker'] });
  const problem = expectProblem(await steward.post(`/api/v1/imports/${id}/check`), 'incomplete-mapping');
  expect(problem.detail).toContain('maker');

  const constants = { maker: 'Alderwick', source: 'Alderwick spring list' };
  const saved = parsed(MappingSheet, await save(steward, id, { ...suggested.mapping, constants }).expect(200));
  expect(saved.missing).toEqual([]);
  const cell = (row: number, column: string) => saved.preview[row]!.cells.find((shown) => shown.column === column);
  // 15 ft 1 in = 181 in = 4.5974 m; 6 ft 3 in = 75 in = 1.905 m; 20 in = 508 mm.
  expect(cell(0, 'length_m')).toEqual({ column: 'length_m', text: '15\' 1"', value: 4.5974, problem: null });
  expect(cell(0, 'beam_m')?.value).toBe(1.905);
  expect(cell(0, 'transom_height_mm')?.value).toBe(508);
  expect(cell(0, 'years')?.value).toEqual([2015, 2018]);
  expect(cell(2, 'length_m')?.problem).toMatch(/does not split into length_m and beam_m/);

  const result = await check(steward, id);
  expect(result.counts).toMatchObject({ new: 2, error: 1 });
  await publish(steward, id);
  const hull = (await steward.get('/api/v1/hulls').query({ q: 'moorhen 52' })).body.data[0];
  expect(hull).toMatchObject({ maker: 'Alderwick', lengthM: 5.207, yearFrom: 2019, transomHeightMm: 508, form: 'modified-v' });
  const sheet = (await steward.get(`/api/v1/hulls/${hull.id}`)).body;
  expect(sheet.values.lengthM.source).toBe('Alderwick spring list');
});

test('the mapping is remembered and offered when a file of the same header comes again, its columns in another order', async () => {
  const steward = await testApp().as('steward');
  const first = await uploaded(steward, ownWords);
  const { mapping } = await sheetOf(steward, first);
  await save(steward, first, { ...mapping, constants: { maker: 'Alderwick' } }).expect(200);

  const turned = ownWords
    .split('\n')
    .map((line) => line.split(';').reverse().join(';'))
    .join('\n');
  const offered = await sheetOf(steward, await uploaded(steward, turned));
  expect(offered).toMatchObject({ origin: 'remembered', missing: [], mapping: { constants: { maker: 'Alderwick' } } });
  expect(offered.mapping.columns).toContainEqual({ at: 6, to: 'model', erase: false });
  expect(offered.preview[0]!.cells.find(({ column }) => column === 'model')?.text).toBe('Moorhen 46');
});

test('a dash erases only where the mapping says so for that column', async () => {
  const steward = await testApp().as('steward');
  const header = 'maker,model,form,length_m,notch_mm,deadrise_deg';
  await publish(steward, (await checked(steward, `${header}\nAlderwick,Rail,flat,4,100,3\n`)).id);
  const id = await uploaded(steward, `${header}\nAlderwick,Rail,flat,4,–,–\n`);
  const { mapping } = await sheetOf(steward, id);
  const columns = mapping.columns.map((column) => ({ ...column, erase: column.to === 'notch_mm' }));
  await save(steward, id, { ...mapping, columns }).expect(200);
  await check(steward, id);
  const rows = parsed(listOf(ImportRow), await steward.get(`/api/v1/imports/${id}/rows`).expect(200));
  expect(rows.data[0]).toMatchObject({ fate: 'changed', changes: [{ field: 'notchMm', before: 100, after: null }] });
  await publish(steward, id);
  const hull = (await steward.get('/api/v1/hulls').query({ q: 'alderwick rail' })).body.data[0];
  expect(hull.deadriseDeg).toBe(3);
  expect(hull).not.toHaveProperty('notchMm');
});

test('another header row can be tried without saving it, and chosen at the upload where none is found', async () => {
  const steward = await testApp().as('steward');
  const foreign = 'Liste\nHersteller;Modell;Rumpf;Laenge\nAlderwick;Skua;flat;4\n';
  expectProblem(await upload(steward, foreign), 'no-header');
  const { id } = (await upload(steward, foreign).field('headerRow', '2').expect(201)).body;
  const sheet = await sheetOf(steward, id);
  expect(sheet).toMatchObject({ header: ['Hersteller', 'Modell', 'Rumpf', 'Laenge'], missing: ['maker', 'model', 'form', 'length_m'] });
  const tried = parsed(MappingSheet, await steward.get(`/api/v1/imports/${id}/mapping?headerRow=3`).expect(200));
  expect(tried.header).toEqual(['Alderwick', 'Skua', 'flat', '4']);
  expect((await steward.get(`/api/v1/imports/${id}`)).body.headerRow).toBe(2);
  const columns = ['maker', 'model', 'form', 'length_m'].map((to, at) => ({ at, to }));
  await save(steward, id, { headerRow: 2, columns }).expect(200);
  expect((await check(steward, id)).counts).toMatchObject({ new: 1, error: 0 });
});

test('what cannot be right about a mapping is refused field by field', async () => {
  const steward = await testApp().as('steward');
  const id = await uploaded(steward, ownWords);
  const wrong = {
    headerRow: 3,
    columns: [
      { at: 0, to: 'model' },
      { at: 0, to: 'package' },
      { at: 1, to: 'model' },
      { at: 2, to: 'colour' },
      { at: 3, to: 'deadrise_deg', unit: 'kg' },
      { at: 77, to: 'form' },
    ],
    constants: { model: 'twice' },
  };
  const { issues } = expectProblem(await save(steward, id, wrong), 'invalid-input');
  expect(issues.map(({ code }) => code)).toEqual([
    'mapped-twice',
    'filled-twice',
    'unknown-column',
    'wrong-unit',
    'no-such-column',
    'filled-twice',
  ]);
  expect((await sheetOf(steward, id)).origin).toBe('suggested');
});

test.each(callers)('%s and mappings: stewards and admins only', async (caller) => {
  const app = testApp();
  const id = await uploaded(await app.as('steward'), ownWords);
  const answer = await (await app.as(caller)).get(`/api/v1/imports/${id}/mapping`);
  if (caller === 'steward' || caller === 'admin') expect(answer.status).toBe(200);
  else expectProblem(answer, caller === 'visitor' ? 'sign-in-needed' : 'not-allowed');
});
