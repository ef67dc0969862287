// The built server as a program of its own, on a copy of the seeded database: to be killed, stopped and started again.
import { type ChildProcess, spawn } from 'node:child_process';
import { cpSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { inject, onTestFinished } from 'vitest';
import { databaseFile } from '../../backend/src/db/connect.ts';
import { demoPassword } from '../../backend/src/db/seed.ts';
import { topFolder } from '../../backend/src/paths.ts';

const bundle = path.join(topFolder, 'backend/dist/server.mjs');

export interface BuiltServer {
  at: string;
  pid: number;
  /** SIGKILL, at once. */
  kill(): Promise<void>;
  /** SIGTERM; the exit code. */
  stop(): Promise<number | null>;
}

/** A data folder that goes with the test. */
export function dataFolder(): string {
  const folder = mkdtempSync(path.join(tmpdir(), 'tiltwright-faults-'));
  cpSync(databaseFile(inject('seededDataFolder')), databaseFile(folder));
  onTestFinished(() => rmSync(folder, { recursive: true, force: true }));
  return folder;
}

export async function startServer(folder: string, settings: Record<string, string> = {}): Promise<BuiltServer> {
  const limits = { LIMIT_ANONYMOUS: '1000000', LIMIT_ACCOUNT: '1000000' };
  const env = { PATH: process.env.PATH, PORT: '0', LOG_LEVEL: 'silent', DATA_DIR: folder, ...limits, ...settings };
  const program: ChildProcess = spawn(process.execPath, [bundle], { env });
  let said = '';
  program.stdout?.on('data', (text) => {
    said += text;
  });
  program.stderr?.on('data', (text) => {
    said += text;
  });
  const ended = new Promise<number | null>((resolve) => program.once('exit', (code) => resolve(code)));
  onTestFinished(async () => {
    program.kill('SIGKILL');
    await ended;
  });
  for (let tries = 0; tries < 1200; tries++) {
    const found = /ready on (http:\/\/\S+)/.exec(said);
    if (found)
      return {
        at: found[1]!,
        pid: program.pid!,
        async kill() {
          program.kill('SIGKILL');
          await ended;
        },
        stop() {
          program.kill('SIGTERM');
          return ended;
        },
      };
    if (program.exitCode !== null) break;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  throw new Error(`the server did not start: ${said}`);
}

export interface Person {
  json<T>(method: string, address: string, body?: unknown): Promise<{ status: number; body: T }>;
  upload(table: string, text: string): Promise<{ id: string }>;
}

/** Someone signed in, by cookie. */
export async function signedIn(at: string, who: 'steward' | 'admin' = 'steward'): Promise<Person> {
  const signIn = await fetch(`${at}/api/v1/session`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json' },
    body: JSON.stringify({ email: `${who}@tiltwright.example`, password: demoPassword }),
  });
  if (!signIn.ok) throw new Error(`not signed in: ${signIn.status} ${await signIn.text()}`);
  const Cookie = signIn.headers
    .getSetCookie()
    .map((cookie) => cookie.split(';')[0])
    .join('; ');
  return {
    async json<T>(method: string, address: string, body?: unknown) {
      const sent = body === undefined ? {} : { body: JSON.stringify(body), headers: { 'Content-Type': 'application/json', Cookie } };
      const answer = await fetch(`${at}/api/v1${address}`, { method, headers: { Cookie }, ...sent });
      const text = await answer.text();
      return { status: answer.status, body: (text === '' ? undefined : JSON.parse(text)) as T };
    },
    async upload(table, text) {
      const form = new FormData();
      form.set('table', table);
      form.set('file', new Blob([text]), `${table}.csv`);
      const answer = await fetch(`${at}/api/v1/imports`, { method: 'POST', headers: { Cookie }, body: form });
      if (answer.status !== 201) throw new Error(`not uploaded: ${answer.status} ${await answer.text()}`);
      return (await answer.json()) as { id: string };
    },
  };
}
