// Tables that are broken, hostile or merely odd: each ends in a clear message, and the catalog stays as it was.
import { readdirSync } from 'node:fs';
import type supertest from 'supertest';
import { expect, test } from 'vitest';
import { currentEdition } from '../../backend/src/resources/catalog/queries.ts';
import { Import } from '../../shared/src/schemas/import.ts';
import type { ProblemCode } from '../../shared/src/schemas/problem.ts';
import { type Agent, check, checked, publish, upload, uploaded } from '../support/import-steps.ts';
import { expectProblem, parsed, type TestApp, testApp } from '../support/test-app.ts';

const header = 'maker,model,form,length_m,deadrise_deg,notes';

/** Every record and its values, and the edition's number. */
async function wholeCatalog(app: TestApp, agent: Agent): Promise<string> {
  const { text } = await agent.get('/api/v1/exports/hulls.csv').expect(200);
  return `${currentEdition(app.db)} ${text}`;
}

async function unharmed(work: (agent: Agent, app: TestApp) => Promise<void>): Promise<void> {
  const app = testApp({ UPLOAD_MAX_MB: '20' });
  const steward = await app.as('steward');
  const before = await wholeCatalog(app, steward);
  await work(steward, app);
  expect(await wholeCatalog(app, steward)).toBe(before);
}

const row = (model: string, rest = 'flat,4,1,') => `Alderwick,${model},${rest}`;
const latin = Buffer.from(`${header}\n${row('Ré', 'flat,4,1,caf\u00e9')}\n`, 'latin1');
const utf8 = Buffer.from(`${row('Élan', 'flat,4,1,naïve')}\n`);
const nulInside = Buffer.from(`${header}\n${row('Sm\u0000ew')}\n`);
const utf16With = (rows: string) => Buffer.concat([Buffer.from([0xff, 0xfe]), Buffer.from(`${header}\n${rows}\n`, 'utf16le')]);

const refused: [what: string, file: () => Buffer | string, code: ProblemCode, words: RegExp][] = [
  [
    'a file that ends inside a quoted cell',
    () => `${header}\n${row('Smew', 'flat,4,1,"a long no')}`,
    'bad-table',
    /quote mark opens a cell in row 2/,
  ],
  ['a quote mark that opens and never closes', () => `${header}\n"Alderwick,Smew,flat,4,1,\n${row('Teal')}\n`, 'bad-table', /row 2/],
  ['a million columns', () => `maker,model,${'x,'.repeat(1_000_000)}\nAlderwick,Smew\n`, 'bad-table', /at most 500/],
  ['a million columns in one row', () => `${header}\nAlderwick,Smew${','.repeat(1_000_000)}\n`, 'bad-table', /at most 500|quote mark/],
  ['more than the site takes', () => Buffer.alloc(21 * 1024 * 1024, 'maker,model\n'), 'body-too-large', /larger than this site takes/],
  ['NULs in the text', () => nulInside, 'binary-file', /not a CSV file/],
  ['an old spreadsheet', () => Buffer.from([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1, 0, 0, 0, 0]), 'binary-file', /save it as CSV/],
  [
    'a new spreadsheet',
    () => Buffer.from('PK\u0003\u0004\u0014\u0000\u0006\u0000xl/workbook.xml', 'latin1'),
    'binary-file',
    /save it as CSV/,
  ],
  [
    'UTF-16 that is cut in half a character',
    () => Buffer.concat([utf16With(row('Smew')), Buffer.from([0x00, 0xd8])]),
    'wrong-encoding',
    /UTF-16/,
  ],
  ['the same header twice', () => `maker,model,form,length_m,model\nAlderwick,Smew,flat,4,Teal\n`, 'bad-table', /model stands twice/],
  [
    'a canonical header and a row of other units',
    () => `maker,model,form,length_m\n,,,ft\nAlderwick,Smew,flat,14\n`,
    'bad-table',
    /ft below length_m/,
  ],
  ['more rows than are read', () => `${header}\n${'Alderwick,Smew,flat,4,1,\n'.repeat(250_001)}`, 'bad-table', /250000 rows/],
];

test.each(refused)('%s: refused at the upload and not kept', async (_what, file, code, words) => {
  await unharmed(async (steward, app) => {
    const problem = expectProblem(await upload(steward, file() as string), code);
    expect(problem.detail).toMatch(words);
    expect(readdirSync(app.config.uploadsFolder)).toEqual([]);
  });
});

async function errorsOf(agent: Agent, id: string): Promise<[number, string, string][]> {
  const { data } = (await agent.get(`/api/v1/imports/${id}/rows?fate=error`).expect(200)).body as {
    data: { n: number; errors: { column: string; code: string }[] }[];
  };
  return data.map(({ n, errors }) => [n, errors[0]!.column, errors[0]!.code]);
}

test('a file cut off in the middle of a row: that row is wrong, the others can be published', async () => {
  await unharmed(async (steward) => {
    const { id, counts } = await checked(steward, `${header}\n${row('Smew')}\nAlderwick,Tea`);
    expect(counts).toMatchObject({ new: 1, error: 1 });
    expect(await errorsOf(steward, id)).toEqual([[3, 'form', 'required']]);
  });
});

test('mixed encodings: read as one of them and shown, never half of each', async () => {
  await unharmed(async (steward) => {
    const mixed = parsed(Import, await steward.get(`/api/v1/imports/${await uploaded(steward, Buffer.concat([latin, utf8]))}`));
    expect(mixed.encoding).toBe('windows-1252');
    const marked = Buffer.concat([Buffer.from([0xef, 0xbb, 0xbf]), Buffer.from(`${header}\n`), utf8, latin.subarray(header.length + 1)]);
    expect(expectProblem(await upload(steward, marked as never), 'wrong-encoding').detail).toMatch(/UTF-8, but has bytes that are not/);
  });
});

test('UTF-16 is read like any other text', async () => {
  await unharmed(async (steward) => {
    const { counts, encoding } = await checked(steward, utf16With(row('Émeraude')));
    expect(encoding).toBe('utf-16le');
    expect(counts).toMatchObject({ new: 1, error: 0 });
  });
});

test('cells that a spreadsheet would run are wrong, each with its place', async () => {
  await unharmed(async (steward) => {
    const cells = ['=1+1', '+cmd|calc', '@SUM(A1)', '-2+3'];
    const { id } = await checked(steward, [header, ...cells.map((cell, i) => row(`Smew ${i}`, `flat,4,1,"${cell}"`))].join('\n'));
    expect(await errorsOf(steward, id)).toEqual([2, 3, 4, 5].map((n) => [n, 'notes', 'formula']));
    const { text } = await steward.get(`/api/v1/imports/${id}/errors.csv`).expect(200);
    for (const cell of cells) expect(text).toContain(`'${cell}`);
  });
});

test('rows that say different things of one record: the first stands, the other is told of it', async () => {
  await unharmed(async (steward) => {
    const { id, counts } = await checked(steward, [header, row('Smew'), row('smew', 'flat,4.2,1,'), row('Smew')].join('\n'));
    expect(counts).toMatchObject({ new: 1, error: 1, duplicate: 1 });
    expect(await errorsOf(steward, id)).toEqual([[3, 'model', 'same-record-twice']]);
  });
});

test('a mapping that leaves a required column: kept, named, and not checked', async () => {
  await unharmed(async (steward) => {
    const id = await uploaded(steward, 'Boat model,Length (ft)\nSmew,14\n');
    const mapping = { headerRow: 1, columns: [{ at: 0, to: 'model' }] };
    const sheet = await steward.put(`/api/v1/imports/${id}/mapping`).send(mapping).expect(200);
    expect(sheet.body.missing).toEqual(['maker', 'form', 'length_m']);
    const problem = expectProblem(await steward.post(`/api/v1/imports/${id}/check`), 'incomplete-mapping');
    expect(problem.issues.map(({ message }) => message)).toEqual(
      ['maker', 'form', 'length_m'].map((name) => expect.stringContaining(name)),
    );
    expectProblem(await steward.post(`/api/v1/imports/${id}/publish`), 'wrong-state');
  });
});

test('one import published twice at the same moment becomes one edition', async () => {
  const app = testApp();
  const steward = await app.as('steward');
  const edition = currentEdition(app.db);
  const { id } = await checked(steward, [header, row('Smew')].join('\n'));
  const answers = await Promise.all([1, 2, 3].map(() => steward.post(`/api/v1/imports/${id}/publish`)));
  expect(answers.map(({ status }: supertest.Response) => status).sort()).toEqual([200, 409, 409]);
  expect(currentEdition(app.db)).toBe(edition + 1);
  expect((await steward.get('/api/v1/hulls?maker=Alderwick')).body.data).toHaveLength(1);
});

test('two imports published at the same moment: one edition, and the other is to be checked again', async () => {
  const app = testApp();
  const [one, other] = [await app.as('steward'), await app.as('admin')];
  const edition = currentEdition(app.db);
  const ids = [(await checked(one, [header, row('Smew')].join('\n'))).id, (await checked(other, [header, row('Teal')].join('\n'))).id];
  const answers = await Promise.all([one.post(`/api/v1/imports/${ids[0]}/publish`), other.post(`/api/v1/imports/${ids[1]}/publish`)]);
  expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
  const late = answers.findIndex(({ status }) => status === 409);
  expectProblem(answers[late]!, 'stale-edition');
  expect(currentEdition(app.db)).toBe(edition + 1);
  await check([one, other][late]!, ids[late]!);
  expect(await publish([one, other][late]!, ids[late]!)).toBe(edition + 2);
});
