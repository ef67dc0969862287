import { existsSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { expect, test } from 'vitest';
import { testApp } from '../../../../tests/support/test-app.ts';
import { hashSecret } from '../../auth/keys.ts';
import { invitations, passwordResets, signUps } from '../../db/schema/access.ts';
import { importRows, imports } from '../../db/schema/imports.ts';
import { mailOutbox, siteState } from '../../db/schema/mail.ts';
import { auditLog, sessions, users } from '../../db/schema/people.ts';
import { enqueueMail } from '../../mail/enqueue-mail.ts';
import { accountExists } from '../../mail/letters.ts';
import { isDue } from './nightly.ts';
import { tidy } from './tidy.ts';

const day = 86_400_000;
const daysFromNow = (days: number) => new Date(Date.now() + days * day);
const known = accountExists('https://site.example/sign-in');

test('nothing goes before its time', async () => {
  const { db, config } = testApp();
  const rows = db.select().from(importRows).all().length;
  enqueueMail(db, 'owner@tiltwright.example', known);
  db.update(mailOutbox).set({ status: 'sent' }).run();
  const removed = await tidy({ db, config }, daysFromNow(29));
  expect(removed).toMatchObject({ uploads: 0, importRows: 0, mailBodies: 0, auditEntries: 0 });
  expect(db.select().from(importRows).all()).toHaveLength(rows);
  expect(rows).toBeGreaterThan(50);
});

test('uploads and their rows go 180 days after publishing, the upload’s own line stays', async () => {
  const { db, config } = testApp();
  const all = db.select().from(imports).all();
  for (const { storedAs } of all) writeFileSync(path.join(config.uploadsFolder, storedAs), 'maker\n');
  expect(await tidy({ db, config }, daysFromNow(179))).toMatchObject({ uploads: 0, importRows: 0 });
  const removed = await tidy({ db, config }, daysFromNow(181));
  expect(removed.uploads).toBe(all.length);
  expect(db.select().from(importRows).all()).toEqual([]);
  expect(
    db
      .select()
      .from(imports)
      .all()
      .map(({ status }) => status),
  ).toEqual(all.map(() => 'published'));
  expect(existsSync(path.join(config.uploadsFolder, all[0]!.storedAs))).toBe(false);
  expect(await tidy({ db, config }, daysFromNow(182))).toMatchObject({ uploads: 0, importRows: 0 });
});

test('an upload that was left lying is discarded', async () => {
  const { db, config } = testApp();
  db.update(imports).set({ status: 'checked', edition: null }).run();
  await tidy({ db, config }, daysFromNow(181));
  expect(
    new Set(
      db
        .select()
        .from(imports)
        .all()
        .map(({ status }) => status),
    ),
  ).toEqual(new Set(['discarded']));
});

test('bodies of mails that went out or failed go after 30 days with their files; one that waits stays whole', async () => {
  const { db, config } = testApp();
  for (const to of ['sent', 'failed', 'waiting']) enqueueMail(db, `${to}@tiltwright.example`, known);
  const [sent, failed, waiting] = db.select().from(mailOutbox).all();
  db.$client.prepare('UPDATE mail_outbox SET status = ? WHERE id = ?').run('sent', sent!.id);
  db.$client.prepare('UPDATE mail_outbox SET status = ? WHERE id = ?').run('failed', failed!.id);
  const file = path.join(config.outboxFolder, `${sent!.id}.eml`);
  writeFileSync(file, 'a mail');
  expect(await tidy({ db, config }, daysFromNow(31))).toMatchObject({ mailBodies: 2 });
  const texts = Object.fromEntries(
    db
      .select()
      .from(mailOutbox)
      .all()
      .map(({ id, text, html }) => [id, text !== null && html !== null]),
  );
  expect(texts).toEqual({ [sent!.id]: false, [failed!.id]: false, [waiting!.id]: true });
  expect(existsSync(file)).toBe(false);
});

test('links and sessions go once they have run out', async () => {
  const { db, config } = testApp();
  const now = new Date();
  const past = new Date(now.getTime() - 1000).toISOString();
  const common = { createdAt: past, expiresAt: past };
  const { id } = db.select().from(users).get()!;
  db.insert(signUps)
    .values({ tokenHash: hashSecret('a'), email: 'a@tiltwright.example', name: 'A', passwordHash: 'x', roles: ['customer'], ...common })
    .run();
  db.insert(passwordResets)
    .values({ tokenHash: hashSecret('b'), userId: id, ...common })
    .run();
  db.insert(invitations)
    .values({ id: 'inv_1', tokenHash: hashSecret('c'), email: 'c@tiltwright.example', roles: ['steward'], invitedBy: id, ...common })
    .run();
  db.insert(sessions)
    .values({ idHash: hashSecret('d'), userId: id, data: '{}', expiresAt: now.getTime() - 1 })
    .run();
  expect(await tidy({ db, config }, now)).toMatchObject({ signUps: 1, passwordResets: 1, invitations: 0, sessions: 1 });
  expect(await tidy({ db, config }, new Date(now.getTime() + 31 * day))).toMatchObject({ invitations: 1 });
});

test('the audit log loses only what is older than seven years, and stays append-only', async () => {
  const { db, config } = testApp();
  const before = db.select().from(auditLog).all().length;
  db.insert(auditLog)
    .values([
      { at: daysFromNow(-7 * 366).toISOString(), actor: null, action: 'session.begin', subject: 'too old', detail: {} },
      { at: daysFromNow(-7 * 365 + 3).toISOString(), actor: null, action: 'session.begin', subject: 'not yet', detail: {} },
    ])
    .run();
  expect(await tidy({ db, config })).toMatchObject({ auditEntries: 1 });
  const rows = db.select().from(auditLog).all();
  // One stays of the two, and the run is noted itself.
  expect(rows).toHaveLength(before + 2);
  expect(rows.map(({ subject }) => subject)).not.toContain('too old');
  expect(rows.at(-1)!.action).toBe('retention.run');
  expect(() => db.delete(auditLog).run()).toThrow(/append-only/);
});

test('the run is noted with what it removed', async () => {
  const { db, config } = testApp();
  const now = new Date();
  await tidy({ db, config }, now);
  const removed = await tidy({ db, config }, now);
  expect(db.select().from(siteState).all()).toEqual([{ key: 'retention.last', value: removed, at: now.toISOString() }]);
});

test('it is due once a night after its hour, and at the start of a server that slept through it', () => {
  const at = (text: string) => new Date(text);
  expect(isDue(undefined, 3, at('2026-05-02T10:00:00'))).toBe(true);
  expect(isDue(at('2026-05-01T03:00:30').toISOString(), 3, at('2026-05-02T02:59:00'))).toBe(false);
  expect(isDue(at('2026-05-01T03:00:30').toISOString(), 3, at('2026-05-02T03:00:00'))).toBe(true);
  expect(isDue(at('2026-05-02T03:00:30').toISOString(), 3, at('2026-05-02T23:00:00'))).toBe(false);
  expect(isDue(at('2026-04-20T03:00:30').toISOString(), 3, at('2026-05-02T01:00:00'))).toBe(true);
});
