// Server and site with reloading; ends both when either ends or the terminal says so.
import { spawn } from 'node:child_process';
import path from 'node:path';

const top = path.resolve(import.meta.dirname, '..');
const environment = { ...process.env, NODE_ENV: process.env.NODE_ENV ?? 'development' };
const programs = [
  spawn(process.execPath, ['node_modules/tsx/dist/cli.mjs', 'watch', '--clear-screen=false', 'backend/src/server.ts'], {
    cwd: top,
    stdio: 'inherit',
    env: environment,
  }),
  spawn(process.execPath, [path.join(top, 'node_modules/vite/bin/vite.js')], {
    cwd: path.join(top, 'frontend'),
    stdio: 'inherit',
    env: environment,
  }),
];
const stop = () => {
  for (const program of programs) program.kill('SIGTERM');
};
for (const signal of ['SIGINT', 'SIGTERM']) process.once(signal, stop);
for (const program of programs) program.once('exit', stop);
