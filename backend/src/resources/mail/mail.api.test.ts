import { Mail, MailSheet } from '@tiltwright/shared/schemas/desk.ts';
import { expect, test } from 'vitest';
import { expectProblem, parsed, testApp } from '../../../../tests/support/test-app.ts';
import { mailOutbox } from '../../db/schema/mail.ts';
import { listOf } from '../../http/cursor.ts';

const ask = { email: 'customer@tiltwright.example' };

test('the admin sees the queue and, on a trial, the text of a mail', async () => {
  const app = testApp();
  await (await app.as('visitor')).post('/api/v1/password-resets').send(ask).expect(202);
  const admin = await app.as('admin');
  const list = parsed(listOf(Mail), await admin.get('/api/v1/mail?status=queued').expect(200));
  expect(list.data).toMatchObject([{ kind: 'reset-password', to: ask.email, status: 'queued', attempts: 0 }]);
  expect(JSON.stringify(list)).not.toContain('token');
  expect(parsed(MailSheet, await admin.get(`/api/v1/mail/${list.data[0]!.id}`)).text).toContain('#token=');
  expect(parsed(listOf(Mail), await admin.get('/api/v1/mail?status=failed')).data).toEqual([]);
  expectProblem(await admin.get('/api/v1/mail/mai_none'), 'not-found');
});

test('where mails are really sent, a link that opens something is shown to nobody', async () => {
  const app = testApp({ SMTP_URL: 'smtp://127.0.0.1:9' });
  const visitor = await app.as('visitor');
  expect((await visitor.post('/api/v1/password-resets').send(ask).expect(202)).body.outbox).toBeNull();
  const admin = await app.as('admin');
  const [mail] = parsed(listOf(Mail), await admin.get('/api/v1/mail')).data;
  expect(parsed(MailSheet, await admin.get(`/api/v1/mail/${mail!.id}`)).text).toBeNull();
  expectProblem(await visitor.get(`/api/v1/outbox?to=${ask.email}`), 'not-found');
});

test('a trial’s mails are read by address; in production there is no such page', async () => {
  const app = testApp();
  const visitor = await app.as('visitor');
  const { outbox } = (await visitor.post('/api/v1/password-resets').send(ask).expect(202)).body;
  expect(outbox).toBe('/outbox?to=customer%40tiltwright.example');
  expect(parsed(listOf(MailSheet), await visitor.get(`/api/v1${outbox}`).expect(200)).data).toHaveLength(1);
  expect((await visitor.get('/api/v1/outbox?to=steward@tiltwright.example').expect(200)).body.data).toEqual([]);
  expectProblem(await visitor.get('/api/v1/outbox'), 'invalid-input');
  const production = testApp({ NODE_ENV: 'production', SESSION_SECRET: 'x'.repeat(32) });
  expectProblem(await (await production.as('visitor')).get(`/api/v1${outbox}`), 'not-found');
});

test('a mail that failed is tried again; one that was sent is not', async () => {
  const app = testApp();
  await (await app.as('visitor')).post('/api/v1/password-resets').send(ask).expect(202);
  const admin = await app.as('admin');
  const { id } = app.db.select().from(mailOutbox).get()!;
  app.db.update(mailOutbox).set({ status: 'failed', attempts: 9, problem: '550 no such mailbox' }).run();
  const again = parsed(Mail, await admin.post(`/api/v1/mail/${id}/resend`).expect(202));
  expect(again).toMatchObject({ status: 'queued', attempts: 0 });
  app.db.update(mailOutbox).set({ status: 'sent' }).run();
  expectProblem(await admin.post(`/api/v1/mail/${id}/resend`), 'wrong-state');
  app.db.update(mailOutbox).set({ status: 'failed', text: null, html: null }).run();
  expectProblem(await admin.post(`/api/v1/mail/${id}/resend`), 'wrong-state');
  expect(app.db.select().from(mailOutbox).get()!.status).toBe('failed');
});
