// No room left: SQLite is told that its file may not grow, which ends in the same SQLITE_FULL as a full disk.
import { expect, test } from 'vitest';
import { currentEdition } from '../../backend/src/resources/catalog/queries.ts';
import { check, checked, publish, settled, upload, uploaded } from '../support/import-steps.ts';
import { manyHulls } from '../support/many-hulls.ts';
import { expectProblem, type TestApp, testApp } from '../support/test-app.ts';

function allow(app: TestApp, morePages: number): void {
  const pages = app.db.$client.pragma('page_count', { simple: true }) as number;
  app.db.$client.pragma(`max_page_count = ${pages + morePages}`);
}
const makeRoom = (app: TestApp) => app.db.$client.pragma('max_page_count = 1000000');

function whole(app: TestApp): void {
  expect(app.db.$client.pragma('integrity_check', { simple: true })).toBe('ok');
  expect(app.db.$client.pragma('foreign_key_check')).toEqual([]);
}

test('the disk fills during a check: it says so, the catalog answers, and with room the check goes through', async () => {
  const app = testApp();
  const steward = await app.as('steward');
  const edition = currentEdition(app.db);
  const id = await uploaded(steward, manyHulls(3000));
  allow(app, 40);
  await steward.post(`/api/v1/imports/${id}/check`).expect(202);
  const failed = await settled(steward, id);
  expect(failed).toMatchObject({
    status: 'failed',
    problem: { code: 'storage-full', message: expect.stringMatching(/disk is full; make room/) },
  });
  await steward.get('/api/v1/hulls?limit=1').expect(200);
  whole(app);
  makeRoom(app);
  expect((await check(steward, id)).counts).toMatchObject({ new: 3000 });
  expect(currentEdition(app.db)).toBe(edition);
});

test('the disk fills during a publication: 507, nothing of it stands, and with room it can be published', async () => {
  const app = testApp();
  const steward = await app.as('steward');
  const edition = currentEdition(app.db);
  const hulls = (await steward.get('/api/v1/exports/hulls.csv')).text;
  const { id } = await checked(steward, manyHulls(3000));
  allow(app, 60);
  const problem = expectProblem(await steward.post(`/api/v1/imports/${id}/publish`), 'storage-full');
  expect(problem.detail).toMatch(/nothing was changed/);
  expect(currentEdition(app.db)).toBe(edition);
  expect((await steward.get('/api/v1/exports/hulls.csv')).text).toBe(hulls);
  expect((await settled(steward, id)).status).toBe('checked');
  whole(app);
  makeRoom(app);
  expect(await publish(steward, id)).toBe(edition + 1);
});

test('the disk fills during a rollback: the edition stands as it was', async () => {
  const app = testApp();
  const steward = await app.as('steward');
  const edition = await publish(steward, (await checked(steward, manyHulls(3000))).id);
  allow(app, 20);
  expectProblem(await steward.post(`/api/v1/editions/${edition}/rollback`).send({}), 'storage-full');
  expect(currentEdition(app.db)).toBe(edition);
  whole(app);
});

test('no room to keep even the upload: refused, and nothing stays', async () => {
  const app = testApp();
  const steward = await app.as('steward');
  const before = (await steward.get('/api/v1/imports')).body.data.length;
  allow(app, 0);
  const wide = `maker,model,form,length_m,${Array.from({ length: 400 }, (_, i) => `remark of the yard number ${i}`).join(',')}\nAlderwick,Smew,flat,4\n`;
  expectProblem(await upload(steward, wide), 'storage-full');
  makeRoom(app);
  expect((await steward.get('/api/v1/imports')).body.data).toHaveLength(before);
});
