// The whole way of a table as it comes out of a yard's spreadsheet: title rows, own headers, mixed units, repetitions,
// cells that could mean two things; mended, published, and rolled back.
import { ImportRow } from '@tiltwright/shared/schemas/import.ts';
import { MappingSheet } from '@tiltwright/shared/schemas/mapping.ts';
import { expect, test } from 'vitest';
import { check, publish, uploaded } from '../../../../tests/support/import-steps.ts';
import { parsed, testApp } from '../../../../tests/support/test-app.ts';
import { listOf } from '../../http/cursor.ts';
import { currentEdition } from '../catalog/queries.ts';

const titles = ['Alderwick yard, price and size list;;;;;;;', 'printed in March;;;;;;;', ';;;;;;;'];
const header = 'Boat;Length overall;Beam (in);Dead rise;Production years;Hull shape;Dry weight (lb);Ask for';

// 30 sound boats, their lengths in four spellings.
const sound = Array.from({ length: 30 }, (_, i) => {
  const inches = 170 + 2 * i;
  const spellings = [
    `${Math.floor(inches / 12)}' ${inches % 12}"`,
    `${(inches * 0.0254).toFixed(3)} m`,
    `${inches} in`,
    `${(inches * 2.54).toFixed(1)} cm`,
  ];
  return `Moorhen ${40 + i};${spellings[i % 4]};${66 + (i % 20)};${12 + (i % 5)}°;${2010 + (i % 8)}-${18 + (i % 4)};mod vee;${700 + 10 * i};Jo`;
});
const trouble = [
  sound[0]!, // the same again
  sound[1]!.replace(';67;', ';71;'), // the same boat, another beam
  'Coot 1;16.5;70;14;2019+;mod vee;800;Jo', // feet, read as metres: far too light for that
  'Coot 2;15\' 2";70;14-16;2019+;mod vee;800;Jo', // a range
  'Coot 3;15\' 2";70;steep;2019+;mod vee;800;Jo',
  'Coot 4;15\' 2";70;14;19;mod vee;800;Jo', // no century
  'Coot 5;15\' 2";70;14;2019+;semi-v;800;Jo', // could be two forms
  'Coot 6;15\' 2";70;14;2019+;semi-v;800;Jo',
  'Coot 7;15\' 2";70;14;2019+;mod vee;=1+1;Jo',
  'Coot 8;15\' 2";170;14;2019+;mod vee;800;Jo', // nearly as wide as long
];
const messy = [...titles, header, ...sound, ...trouble].join('\r\n');

test('a messy table of forty rows, from its title rows to an edition and back', async () => {
  const app = testApp();
  const steward = await app.as('steward');
  const before = currentEdition(app.db);
  const exported = (await steward.get('/api/v1/exports/hulls.csv')).text;

  const id = await uploaded(steward, Buffer.from(messy, 'latin1'));
  const sheet = parsed(MappingSheet, await steward.get(`/api/v1/imports/${id}/mapping`).expect(200));
  expect(sheet).toMatchObject({ origin: 'suggested', missing: ['maker'], leftOut: ['Ask for'], mapping: { headerRow: 4 } });
  const constants = { maker: 'Alderwick', source: 'Alderwick list', source_date: '2024-03' };
  await steward
    .put(`/api/v1/imports/${id}/mapping`)
    .send({ ...sheet.mapping, constants })
    .expect(200);

  const first = await check(steward, id);
  expect(first).toMatchObject({ rows: 40, encoding: 'windows-1252', delimiter: ';' });
  expect(first.counts).toEqual({ new: 32, changed: 0, unchanged: 0, duplicate: 1, conflict: 0, error: 7 });
  const rows = async (fate: string) =>
    parsed(listOf(ImportRow), await steward.get(`/api/v1/imports/${id}/rows?fate=${fate}&limit=50`).expect(200)).data;
  expect((await rows('error')).map(({ n, errors }) => [n, errors[0]!.column, errors[0]!.code])).toEqual([
    [36, 'model', 'same-record-twice'],
    [38, 'deadrise_deg', 'range'],
    [39, 'deadrise_deg', 'not-a-number'],
    [40, 'years', 'bad-years'],
    [41, 'form', 'ambiguous-choice'],
    [42, 'form', 'ambiguous-choice'],
    [43, 'dry_mass_kg', 'not-a-number'],
  ]);
  const cautious = (await rows('new')).filter(({ cautions }) => cautions.length > 0);
  expect(cautious.map(({ n, cautions }) => [n, cautions[0]!.code])).toEqual([
    [37, 'mass-against-length'],
    [44, 'beam-against-length'],
  ]);

  const mended = (n: number, cells: Record<string, string>) => steward.patch(`/api/v1/imports/${id}/rows/${n}`).send({ cells }).expect(200);
  await steward.post(`/api/v1/imports/${id}/fixes`).send({ column: 'Hull shape', from: 'semi-v', to: 'modified-v' }).expect(200);
  await mended(37, { 'Length overall': '16.5 ft' });
  await mended(38, { deadrise_deg: '15' });
  await mended(39, { 'Dead rise': '15°' });
  await mended(40, { years: '2019+' });
  await mended(43, { dry_mass_kg: '800' });
  expect((await steward.get(`/api/v1/imports/${id}`)).body.counts).toMatchObject({ new: 38, duplicate: 1, error: 1 });

  const edition = await publish(steward, id, { why: 'Alderwick’s list of March', holdCautions: true });
  const hulls = (await steward.get('/api/v1/hulls?maker=Alderwick&limit=100')).body.data as {
    model: string;
    id: string;
    lengthM: number;
  }[];
  expect(hulls).toHaveLength(37);
  const find = (model: string) => hulls.find((hull) => hull.model === model);
  expect(find('Coot 8')).toBeUndefined();
  // 16.5 ft; 800 lb; 15 ft 2 in = 182 in.
  expect(find('Coot 1')).toMatchObject({ lengthM: 5.0292, dryMassKg: 362.873896, form: 'modified-v' });
  expect(find('Coot 5')).toMatchObject({ lengthM: 4.6228, yearFrom: 2019 });
  // 14 ft 2 in, and its 32nd row, which says the same once more, is no second boat.
  expect(find('Moorhen 40')).toMatchObject({ lengthM: 4.318, deadriseDeg: 12, yearFrom: 2010, yearTo: 2018 });
  const history = (await steward.get(`/api/v1/hulls/${find('Coot 1')!.id}/revisions`)).body.data;
  expect(history).toMatchObject([{ edition, why: 'Alderwick’s list of March', source: 'Alderwick list' }]);

  await steward.post(`/api/v1/editions/${edition}/rollback`).send({}).expect(200);
  expect((await steward.get('/api/v1/exports/hulls.csv')).text).toBe(exported);
  expect(currentEdition(app.db)).toBe(before + 2);
});
