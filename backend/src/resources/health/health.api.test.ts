import { statSync } from 'node:fs';
import { Health } from '@tiltwright/shared/schemas/desk.ts';
import { expect, test } from 'vitest';
import { expectProblem, parsed, testApp } from '../../../../tests/support/test-app.ts';
import { databaseFile } from '../../db/connect.ts';
import { mailOutbox, siteState } from '../../db/schema/mail.ts';
import { watchRoom } from '../../storage/watch-room.ts';

test('bytes by kind add up to the database, and every demo part of it is named', async () => {
  const app = testApp();
  app.db.$client.pragma('wal_checkpoint(TRUNCATE)');
  const size = statSync(databaseFile(app.config.dataFolder)).size;
  const health = parsed(Health, await (await app.as('admin')).get('/api/v1/health').expect(200));
  const inDatabase = health.bytes.filter(({ kind }) => !kind.endsWith('files')).reduce((sum, { bytes }) => sum + bytes, 0);
  expect(inDatabase / size).toBeGreaterThan(0.95);
  expect(inDatabase / size).toBeLessThan(1.05);
  expect(health.bytes.find(({ kind }) => kind === 'catalog')!.bytes).toBeGreaterThan(20_000);
  expect(health.bytes.find(({ kind }) => kind === 'other')?.bytes ?? 0).toBeLessThan(size / 20);
  expect(health).toMatchObject({
    status: 'good',
    remarks: [],
    people: { accounts: 4, disabled: 0 },
    mails: { queued: 0, failed: 0, leaves: false },
  });
  expect(health.edition).toBeGreaterThan(0);
});

test('below the reserve uploads are refused with 507; reading, fits and signing in go on', async () => {
  const app = testApp({ FREE_SPACE_RESERVE_MB: '1000000000' });
  const steward = await app.as('steward');
  const upload = steward.post('/api/v1/imports').field('table', 'hulls').attach('file', Buffer.from('maker,model\n'), 'hulls.csv');
  expectProblem(await upload, 'storage-full');
  await steward.get('/api/v1/hulls?limit=1').expect(200);
  await app.as('customer');
  const health = parsed(Health, await (await app.as('admin')).get('/api/v1/health'));
  expect(health.status).toBe('bad');
  expect(health.disk.belowReserve).toBe(true);
  expect(health.remarks[0]).toContain('uploads and imports are refused');
});

test('the admins are told once when the reserve is touched, and again only after there was room', async () => {
  const { db, config } = testApp();
  const room = (freeMb: number) => async () => ({
    freeBytes: freeMb * 1024 * 1024,
    totalBytes: 1e12,
    belowReserve: freeMb * 1024 * 1024 < config.freeSpaceReserveBytes,
  });
  const told = async (freeMb: number) => {
    await watchRoom({ db, config }, new Date(), room(freeMb));
    return db.select().from(mailOutbox).all().length;
  };
  expect(await told(5000)).toBe(0);
  expect(await told(100)).toBe(1);
  expect(await told(90)).toBe(1);
  // Just above the reserve of 256 MB: not room enough to begin anew.
  expect(await told(260)).toBe(1);
  expect(await told(90)).toBe(1);
  expect(await told(5000)).toBe(1);
  expect(db.select().from(siteState).all()).toEqual([]);
  expect(await told(90)).toBe(2);
  expect(db.select().from(mailOutbox).get()).toMatchObject({ kind: 'storage-low', toAddress: 'admin@tiltwright.example' });
});

test('a mail that failed is a matter for the admin', async () => {
  const app = testApp();
  await (await app.as('visitor')).post('/api/v1/password-resets').send({ email: 'customer@tiltwright.example' }).expect(202);
  app.db.update(mailOutbox).set({ status: 'failed' }).run();
  expect(parsed(Health, await (await app.as('admin')).get('/api/v1/health'))).toMatchObject({
    status: 'bad',
    remarks: ['1 mail could not be sent.'],
  });
});
