// The built server as a program of its own, on a copy of the seeded database: to be killed, stopped and started again.
import { type ChildProcess, spawn } from 'node:child_process';
import { cpSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { inject, onTestFinished } from 'vitest';
import { databaseFile } from '../../backend/src/db/connect.ts';
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
