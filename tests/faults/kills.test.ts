// The built server, killed in the middle: what was committed stands, what was not did not happen, and work goes on.
import { existsSync } from 'node:fs';
import path from 'node:path';
import Database from 'better-sqlite3';
import { beforeAll, expect, test } from 'vitest';
import { databaseFile } from '../../backend/src/db/connect.ts';
import { topFolder } from '../../backend/src/paths.ts';
import type { Import } from '../../shared/src/schemas/import.ts';
import type { Problem } from '../../shared/src/schemas/problem.ts';
import { dataFolder, startServer } from '../support/built-server.ts';
import { manyHulls } from '../support/many-hulls.ts';
import { type Person, signedIn } from '../support/signed-in.ts';

const rows = 20_000;

beforeAll(() => {
  for (const file of ['server.mjs', 'import-worker.mjs'])
    expect(existsSync(path.join(topFolder, 'backend/dist', file)), 'build first: npm test does').toBe(true);
});

const importOf = async (person: Person, id: string) => (await person.json<Import>('GET', `/imports/${id}`)).body;

async function until(person: Person, id: string, wanted: (found: Import) => boolean): Promise<Import> {
  for (let tries = 0; tries < 6000; tries++) {
    const found = await importOf(person, id);
    if (wanted(found)) return found;
    await new Promise((resolve) => setTimeout(resolve, 15));
  }
  throw new Error(`never came: ${JSON.stringify(await importOf(person, id))}`);
}

function inspected(folder: string) {
  const db = new Database(databaseFile(folder), { readonly: false });
  try {
    return {
      integrity: db.pragma('integrity_check', { simple: true }),
      broken: db.pragma('foreign_key_check') as unknown[],
      edition: db.prepare('SELECT max(edition) FROM editions').pluck().get() as number,
      hulls: db.prepare("SELECT count(*) FROM hulls WHERE status = 'published'").pluck().get() as number,
      revisions: db.prepare('SELECT count(*) FROM revisions').pluck().get() as number,
      outbox: db.prepare('SELECT count(*) FROM outbox').pluck().get() as number,
    };
  } finally {
    db.close();
  }
}

test('kill -9 during a check: the catalog is whole, and the check goes on where it stopped', async () => {
  const folder = dataFolder();
  const before = inspected(folder);
  const first = await startServer(folder);
  const person = await signedIn(first.at);
  const { id } = await person.upload('hulls', manyHulls(rows));
  expect((await person.json('POST', `/imports/${id}/check`)).status).toBe(202);
  const { checkedRows: reached } = await until(person, id, ({ checkedRows }) => checkedRows >= 2000);
  await first.kill();
  expect(reached).toBeLessThan(rows);
  expect(inspected(folder)).toEqual({ ...before, integrity: 'ok', broken: [] });

  const second = await startServer(folder);
  const again = await signedIn(second.at);
  expect((await importOf(again, id)).checkedRows).toBeGreaterThanOrEqual(reached);
  const done = await until(again, id, ({ status }) => status !== 'checking');
  expect(done).toMatchObject({ status: 'checked', counts: { new: rows, changed: 0, unchanged: 0, duplicate: 0, conflict: 0, error: 0 } });
  expect(await second.stop()).toBe(0);
});

test('kill -9 during a publication: all of the edition or none, and it can be published afterwards', async () => {
  const folder = dataFolder();
  const before = inspected(folder);
  const first = await startServer(folder);
  const person = await signedIn(first.at);
  const { id } = await person.upload('hulls', manyHulls(rows));
  await person.json('POST', `/imports/${id}/check`);
  await until(person, id, ({ status }) => status === 'checked');
  const answer = person.json<Problem>('POST', `/imports/${id}/publish`, {}).catch(() => 'cut off' as const);
  await until(person, id, ({ status }) => status === 'publishing');
  await new Promise((resolve) => setTimeout(resolve, 150));
  await first.kill();
  expect(await answer).toBe('cut off');
  expect(inspected(folder)).toEqual({ ...before, integrity: 'ok', broken: [] });

  const second = await startServer(folder);
  const again = await signedIn(second.at);
  expect((await importOf(again, id)).status).toBe('checked');
  const published = await again.json<{ edition: number }>('POST', `/imports/${id}/publish`, {});
  expect(published).toEqual({ status: 200, body: { edition: before.edition + 1 } });
  expect(await second.stop()).toBe(0);
  const after = inspected(folder);
  expect(after).toMatchObject({ integrity: 'ok', edition: before.edition + 1, hulls: before.hulls + rows });
  expect(after.outbox).toBe(before.outbox + rows + 1);
});

test('SIGTERM during a check ends the server cleanly, and the check goes on at the next start', async () => {
  const folder = dataFolder();
  const first = await startServer(folder);
  const person = await signedIn(first.at);
  const { id } = await person.upload('hulls', manyHulls(rows));
  await person.json('POST', `/imports/${id}/check`);
  await until(person, id, ({ checkedRows }) => checkedRows >= 1000);
  expect(await first.stop()).toBe(0);
  const second = await startServer(folder);
  const again = await signedIn(second.at);
  expect((await until(again, id, ({ status }) => status !== 'checking')).counts).toMatchObject({ new: rows });
});

test('the worker checks, cancels, publishes and refuses in the very words of the code it runs', async () => {
  const folder = dataFolder();
  const server = await startServer(folder);
  const person = await signedIn(server.at);
  const { id } = await person.upload('hulls', manyHulls(rows));
  await person.json('POST', `/imports/${id}/check`);
  await until(person, id, ({ checkedRows }) => checkedRows > 0);
  expect((await person.json<Import>('POST', `/imports/${id}/cancel`)).body.status).toBe('uploaded');
  await person.json('POST', `/imports/${id}/check`);
  expect((await until(person, id, ({ status }) => status !== 'checking')).counts).toMatchObject({ new: rows, duplicate: 0 });

  const other = await person.upload('hulls', manyHulls(10));
  await person.json('POST', `/imports/${other.id}/check`);
  await until(person, other.id, ({ status }) => status === 'checked');
  expect((await person.json('POST', `/imports/${id}/publish`, {})).status).toBe(200);
  const late = await person.json<Problem>('POST', `/imports/${other.id}/publish`, {});
  expect(late.body).toMatchObject({ status: 409, code: 'stale-edition' });

  const edition = inspected(folder).edition;
  const back = await person.json<{ withdrawn: number }>('POST', `/editions/${edition}/rollback`, {});
  expect(back).toMatchObject({ status: 200, body: { withdrawn: rows } });
  const missing = await person.json<Problem>('POST', '/editions/9999/rollback', {});
  expect(missing.body).toMatchObject({ status: 404, code: 'not-found', detail: expect.stringContaining('9999') });
});
