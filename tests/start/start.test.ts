// The built server as a person starts it: from nothing, a second time, and when something is in the way.
import { type ChildProcess, spawn } from 'node:child_process';
import { existsSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import Database from 'better-sqlite3';
import { afterEach, beforeAll, describe, expect, test } from 'vitest';
import { databaseFile } from '../../backend/src/db/connect.ts';
import { topFolder } from '../../backend/src/paths.ts';

const bundle = path.join(topFolder, 'backend/dist/server.mjs');
const cleanUp: (() => void)[] = [];
afterEach(() => {
  for (const undo of cleanUp.splice(0)) undo();
});

beforeAll(() => expect(existsSync(bundle), 'build first: npm test does').toBe(true));

function newFolder(): string {
  const folder = mkdtempSync(path.join(tmpdir(), 'tiltwright-start-'));
  cleanUp.push(() => rmSync(folder, { recursive: true, force: true }));
  return folder;
}

interface Started {
  program: ChildProcess;
  out: () => string;
  err: () => string;
  ended: Promise<number | null>;
}

function start(settings: Record<string, string>): Started {
  const program = spawn(process.execPath, [bundle], { env: { PATH: process.env.PATH, PORT: '0', LOG_LEVEL: 'silent', ...settings } });
  let out = '';
  let err = '';
  program.stdout.on('data', (text) => {
    out += text;
  });
  program.stderr.on('data', (text) => {
    err += text;
  });
  const ended = new Promise<number | null>((resolve) => program.once('exit', (code) => resolve(code)));
  cleanUp.push(() => program.kill('SIGKILL'));
  return { program, out: () => out, err: () => err, ended };
}

async function address(server: Started): Promise<string> {
  for (let tries = 0; tries < 400; tries++) {
    const found = /ready on (http:\/\/\S+)/.exec(server.out());
    if (found) return found[1]!;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  throw new Error(`no address: ${server.out()} ${server.err()}`);
}

/** One plain sentence, no stack, exit code 1. */
async function refuses(server: Started, words: RegExp) {
  expect(await server.ended).toBe(1);
  expect(server.err().trim().split('\n')).toHaveLength(1);
  expect(server.err()).toMatch(words);
  expect(server.out()).toBe('');
}

test('from nothing to the demo world; SIGTERM ends it cleanly; the second start keeps the data', { timeout: 60_000 }, async () => {
  const DATA_DIR = path.join(newFolder(), 'made/where/missing');
  const first = start({ DATA_DIR });
  const at = await address(first);
  expect(first.out()).toContain('steward@tiltwright.example');
  const { data } = (await (await fetch(`${at}/api/v1/editions`)).json()) as { data: { edition: number }[] };
  expect(data[0]!.edition).toBeGreaterThan(5);
  first.program.kill('SIGTERM');
  expect(await first.ended).toBe(0);
  expect(existsSync(`${databaseFile(DATA_DIR)}-wal`), 'a clean end leaves no write-ahead log').toBe(false);

  const second = start({ DATA_DIR });
  const again = (await (await fetch(`${await address(second)}/api/v1/editions`)).json()) as { data: { edition: number }[] };
  expect(again.data).toEqual(data);
  second.program.kill('SIGTERM');
  expect(await second.ended).toBe(0);
});

test('the site is served on the same port, with a strict policy and no other origin', { timeout: 60_000 }, async () => {
  const at = await address(start({ DATA_DIR: newFolder() }));
  const page = await fetch(`${at}/fit`, { headers: { Accept: 'text/html' } });
  expect(page.status).toBe(200);
  expect(page.headers.get('content-security-policy')).toContain("default-src 'self'");
  expect(await page.text()).not.toMatch(/(src|href)="(https?:)?\/\//);
});

describe('what is in the way is said in one sentence, exit code 1', () => {
  test('a port that is taken', { timeout: 30_000 }, async () => {
    const other = createServer();
    await new Promise<void>((resolve) => other.listen(0, '127.0.0.1', resolve));
    cleanUp.push(() => other.close());
    const { port } = other.address() as AddressInfo;
    await refuses(start({ DATA_DIR: newFolder(), PORT: String(port) }), new RegExp(`Port ${port} is taken`));
  });

  test('a port that is no number', async () => {
    await refuses(start({ DATA_DIR: newFolder(), PORT: 'harbour' }), /setting PORT is not usable/);
  });

  test('a data folder that cannot be written', async () => {
    const folder = newFolder();
    writeFileSync(path.join(folder, 'file'), '');
    await refuses(start({ DATA_DIR: path.join(folder, 'file/below') }), /data folder .* cannot be written/);
    const locked = path.join('/proc', 'tiltwright');
    await refuses(start({ DATA_DIR: locked }), /data folder .* cannot be written/);
  });

  test('a database of newer code, left as it is', { timeout: 30_000 }, async () => {
    const DATA_DIR = newFolder();
    const first = start({ DATA_DIR });
    await address(first);
    first.program.kill('SIGTERM');
    await first.ended;
    const db = new Database(databaseFile(DATA_DIR));
    db.prepare("INSERT INTO __drizzle_migrations (hash, created_at) VALUES ('from the future', ?)").run(Date.now() + 1e11);
    db.close();
    await refuses(start({ DATA_DIR }), /written by a newer version/);
  });

  test('a file that is no database', async () => {
    const DATA_DIR = newFolder();
    writeFileSync(databaseFile(DATA_DIR), 'a shopping list, long enough to be no database header at all');
    await refuses(start({ DATA_DIR }), /cannot be opened/);
  });

  test('production without a session secret', async () => {
    await refuses(start({ DATA_DIR: newFolder(), NODE_ENV: 'production' }), /SESSION_SECRET has to be set/);
  });
});
