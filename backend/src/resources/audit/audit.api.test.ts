import { AuditEntry } from '@tiltwright/shared/schemas/desk.ts';
import { parse } from 'csv-parse/sync';
import { expect, test } from 'vitest';
import { expectProblem, parsed, testApp } from '../../../../tests/support/test-app.ts';
import { auditLog, users } from '../../db/schema/people.ts';
import { listOf } from '../../http/cursor.ts';

test('entries are read newest first, page by page without gap or repeat, while others are added', async () => {
  const app = testApp();
  const admin = await app.as('admin');
  const seen: number[] = [];
  let cursor = '';
  do {
    const page = parsed(listOf(AuditEntry), await admin.get(`/api/v1/audit?limit=7${cursor}`).expect(200));
    seen.push(...page.data.map(({ entry }) => entry));
    cursor = page.next === null ? '' : `&cursor=${page.next}`;
    await (await app.as('visitor')).post('/api/v1/password-resets').send({ email: 'nobody@tiltwright.example' });
  } while (cursor !== '');
  expect(seen).toEqual(Array.from({ length: seen[0]! }, (_, n) => seen[0]! - n));
});

test('filters by action, its first word, actor and day', async () => {
  const app = testApp();
  const admin = await app.as('admin');
  const read = async (query: string) => parsed(listOf(AuditEntry), await admin.get(`/api/v1/audit?limit=200&${query}`).expect(200)).data;
  const publishes = await read('action=edition.publish');
  expect(publishes.length).toBeGreaterThan(5);
  expect(new Set(publishes.map(({ action }) => action))).toEqual(new Set(['edition.publish']));
  expect(new Set((await read('action=session')).map(({ action }) => action.split('.')[0]))).toEqual(new Set(['session']));
  expect(await read('action=sess')).toEqual([]);
  const me = app.db
    .select()
    .from(users)
    .all()
    .find(({ email }) => email.startsWith('admin'))!;
  const mine = await read(`actor=${me.id}`);
  expect(mine.length).toBeGreaterThan(0);
  expect(new Set(mine.map(({ actorName }) => actorName))).toEqual(new Set(['Demo admin']));
  expect(await read('from=2100-01-01')).toEqual([]);
  expect((await read('to=2100-01-01')).length).toBeGreaterThan(0);
  expectProblem(await admin.get('/api/v1/audit?from=yesterday'), 'invalid-input');
});

test('the export is the whole filtered log as CSV, safe to open in a spreadsheet, and is itself noted', async () => {
  const app = testApp();
  app.db.update(users).set({ name: '=HYPERLINK("x")' }).run();
  const admin = await app.as('admin');
  const many = Array.from({ length: 4500 }, (_, n) => ({
    at: new Date(n).toISOString(),
    actor: null,
    action: 'import.fix',
    subject: `imp_${n}`,
    detail: {},
  }));
  for (let at = 0; at < many.length; at += 500)
    app.db
      .insert(auditLog)
      .values(many.slice(at, at + 500))
      .run();
  const answer = await admin.get('/api/v1/audit.csv?action=import.fix').expect(200);
  expect(answer.headers['content-type']).toContain('text/csv');
  const rows = parse(answer.text, { columns: true }) as Record<string, string>[];
  expect(new Set(rows.map(({ subject }) => subject)).size).toBe(4500);
  const all = parse((await admin.get('/api/v1/audit.csv').expect(200)).text, { columns: true }) as Record<string, string>[];
  expect(all.some(({ name }) => name!.includes('HYPERLINK'))).toBe(true);
  expect(all.some(({ name }) => name!.startsWith('='))).toBe(false);
  expect(all.filter(({ action }) => action === 'audit.export')).toHaveLength(2);
});
