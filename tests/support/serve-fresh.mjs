// The built server on a new, empty data folder that goes when the server does.
import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

const folder = mkdtempSync(path.join(tmpdir(), 'tiltwright-e2e-'));
const server = spawn(process.execPath, ['--enable-source-maps', path.resolve(import.meta.dirname, '../../backend/dist/server.mjs')], {
  stdio: 'inherit',
  env: { ...process.env, DATA_DIR: folder },
});
for (const signal of ['SIGTERM', 'SIGINT']) process.once(signal, () => server.kill('SIGTERM'));
server.once('exit', (code) => {
  rmSync(folder, { recursive: true, force: true });
  process.exit(code ?? 1);
});
