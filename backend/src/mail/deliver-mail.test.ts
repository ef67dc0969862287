import { spawn } from 'node:child_process';
import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { expect, onTestFinished, test } from 'vitest';
import { mailServer } from '../../../tests/support/mail-server.ts';
import { connect, type Db, databaseFile } from '../db/connect.ts';
import { migrateDatabase } from '../db/migrate.ts';
import { mailOutbox } from '../db/schema/mail.ts';
import { migrationsFolder, topFolder } from '../paths.ts';
import { claimMs, deliverDueMail, retryWaitsMs } from './deliver-mail.ts';
import { enqueueMail } from './enqueue-mail.ts';
import { accountExists, resetPassword, storageLow } from './letters.ts';
import { mailTransport } from './transport.ts';

const reset = resetPassword('https://site.example/reset#token=abc', 1);
const known = accountExists('https://site.example/sign-in');

function outbox() {
  const folder = mkdtempSync(path.join(tmpdir(), 'tiltwright-mail-'));
  const db = connect(databaseFile(folder));
  migrateDatabase(db, migrationsFolder);
  onTestFinished(() => {
    db.$client.close();
    rmSync(folder, { recursive: true, force: true });
  });
  return { db, folder };
}

function transportTo(smtpUrl: string | null, outboxFolder = '/nowhere') {
  const transport = mailTransport({ smtpUrl, mailFrom: 'Tiltwright <no-reply@tiltwright.example>', outboxFolder });
  onTestFinished(() => transport.close());
  return transport;
}

const rows = (db: Db) => db.select().from(mailOutbox).all();

test('a mail goes over a real exchange as text and HTML, once', async () => {
  const { db } = outbox();
  const server = await mailServer();
  const transport = transportTo(server.url);
  enqueueMail(db, 'Owner@Tiltwright.Example', known);
  expect(await deliverDueMail(db, transport)).toEqual({ sent: 1, failed: 0, later: 0 });
  expect(await deliverDueMail(db, transport)).toEqual({ sent: 0, failed: 0, later: 0 });
  expect(server.received).toHaveLength(1);
  const [mail] = server.received;
  expect(mail!.to).toEqual(['owner@tiltwright.example']);
  expect(mail!.raw).toMatch(/^From: Tiltwright <no-reply@tiltwright\.example>/m);
  expect(mail!.raw).toMatch(/^Content-Type: multipart\/alternative/m);
  expect(mail!.raw).toMatch(/^Content-Type: text\/plain/m);
  expect(mail!.raw).toMatch(/^Content-Type: text\/html/m);
  expect(mail!.raw).toMatch(/^Auto-Submitted: auto-generated/m);
  expect(mail!.messageId).toBe(rows(db)[0]!.messageId);
});

test('once it has left, a link that opens something is not readable here any more', async () => {
  const { db } = outbox();
  const server = await mailServer();
  enqueueMail(db, 'owner@tiltwright.example', reset);
  enqueueMail(db, 'owner@tiltwright.example', known);
  await deliverDueMail(db, transportTo(server.url));
  expect(server.received[0]!.raw).toContain('https://site.example/reset#token');
  expect(rows(db).map(({ status, text }) => [status, text === null])).toEqual([
    ['sent', true],
    ['sent', false],
  ]);
});

test('a busy server is asked again after growing waits, for some three days, then the mail has failed', async () => {
  const { db } = outbox();
  const server = await mailServer();
  const transport = transportTo(server.url);
  server.refuse(451);
  const start = Date.now();
  let now = start;
  enqueueMail(db, 'owner@tiltwright.example', known);
  for (const wait of retryWaitsMs) {
    expect(await deliverDueMail(db, transport, () => now)).toEqual({ sent: 0, failed: 0, later: 1 });
    expect(await deliverDueMail(db, transport, () => now + wait - 1)).toEqual({ sent: 0, failed: 0, later: 0 });
    now += wait;
  }
  expect((now - start) / 86_400_000).toBeGreaterThan(2.5);
  expect(await deliverDueMail(db, transport, () => now)).toEqual({ sent: 0, failed: 1, later: 0 });
  expect(rows(db)[0]).toMatchObject({ status: 'failed', attempts: retryWaitsMs.length + 1 });
  expect(rows(db)[0]!.problem).toContain('451');
});

test('an address that the server refuses for good is not tried again', async () => {
  const { db } = outbox();
  const server = await mailServer();
  server.refuse(550);
  enqueueMail(db, 'gone@tiltwright.example', known);
  expect(await deliverDueMail(db, transportTo(server.url))).toEqual({ sent: 0, failed: 1, later: 0 });
});

test('a server that is away loses nothing', async () => {
  const { db } = outbox();
  enqueueMail(db, 'owner@tiltwright.example', known);
  expect(await deliverDueMail(db, transportTo('smtp://127.0.0.1:9'))).toEqual({ sent: 0, failed: 0, later: 1 });
  const server = await mailServer();
  expect(await deliverDueMail(db, transportTo(server.url), () => Date.now() + retryWaitsMs[0]!)).toMatchObject({ sent: 1 });
});

test('two workers on one outbox send each of forty mails once', async () => {
  const { db, folder } = outbox();
  const second = connect(databaseFile(folder));
  onTestFinished(() => void second.$client.close());
  const server = await mailServer();
  for (let n = 0; n < 40; n++) enqueueMail(db, `owner${n}@tiltwright.example`, known);
  const counts = await Promise.all([deliverDueMail(db, transportTo(server.url)), deliverDueMail(second, transportTo(server.url))]);
  expect(counts[0].sent + counts[1].sent).toBe(40);
  expect(counts.every(({ sent }) => sent > 0)).toBe(true);
  expect(new Set(server.received.map(({ messageId }) => messageId)).size).toBe(40);
  expect(server.received).toHaveLength(40);
});

test('what stands under one key is told once', () => {
  const { db } = outbox();
  const low = storageLow(10, 256, 'https://site.example/admin/health');
  expect(enqueueMail(db, 'admin@tiltwright.example', low, { onceKey: 'low 1' })).toBe(true);
  expect(enqueueMail(db, 'admin@tiltwright.example', low, { onceKey: 'low 1' })).toBe(false);
  expect(rows(db)).toHaveLength(1);
});

test('in the local outbox a mail is one whole file, also when it is sent again after a kill', async () => {
  const { db, folder } = outbox();
  const transport = transportTo(null, folder);
  enqueueMail(db, 'owner@tiltwright.example', reset);
  await deliverDueMail(db, transport);
  // As a kill between the file and the mark would leave it.
  db.update(mailOutbox).set({ status: 'sending', dueAt: Date.now() }).run();
  await deliverDueMail(db, transport);
  const files = readdirSync(folder).filter((name) => !name.startsWith('tiltwright.sqlite'));
  expect(files).toEqual([`${rows(db)[0]!.id}.eml`]);
  expect(readFileSync(path.join(folder, files[0]!), 'utf8')).toContain('Subject: Choose a new Tiltwright password');
  expect(rows(db)[0]!.text).toContain('token=abc');
});

/** Runs the sender as a process of its own, kills it while the server holds a mail, and says when it is gone. */
async function killWhileSending(folder: string, server: Awaited<ReturnType<typeof mailServer>>): Promise<void> {
  const sender = spawn(
    process.execPath,
    ['--import', 'tsx', path.join(topFolder, 'tests/support/send-outbox.ts'), databaseFile(folder), server.url, folder],
    { stdio: 'ignore', cwd: topFolder },
  );
  const gone = new Promise<void>((resolve) => sender.once('exit', () => resolve()));
  server.beforeAnswer(async () => {
    server.beforeAnswer(null);
    sender.kill('SIGKILL');
    await gone;
  });
  await gone;
}

test('a worker killed in the middle of an exchange loses no mail, and the receiver can tell that it is the same one', async () => {
  const { db, folder } = outbox();
  const server = await mailServer();
  enqueueMail(db, 'owner@tiltwright.example', known);
  await killWhileSending(folder, server);
  expect(rows(db)[0]).toMatchObject({ status: 'sending' });
  const transport = transportTo(server.url);
  // The claim still stands: nobody else sends it yet.
  expect(await deliverDueMail(db, transport)).toMatchObject({ sent: 0 });
  expect(await deliverDueMail(db, transport, () => Date.now() + claimMs + 1000)).toMatchObject({ sent: 1 });
  // The killed one had handed it over whole but never heard so: it arrives twice, under one Message-ID.
  const { messageId } = rows(db)[0]!;
  expect(server.received.map((mail) => mail.messageId)).toEqual([messageId, messageId]);
}, 60_000);
