// Builds site and server where their sources are newer than what was built last.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';

const top = path.resolve(import.meta.dirname, '..');
const stamp = path.join(top, 'backend/dist/.built-from');
const sources = [
  'shared/src',
  'backend/src',
  'backend/build.mjs',
  'frontend/src',
  'frontend/index.html',
  'frontend/vite.config.ts',
  'frontend/public',
  'package-lock.json',
];

function* files(at) {
  if (!existsSync(at)) return;
  if (statSync(at).isFile()) {
    yield at;
    return;
  }
  for (const entry of readdirSync(at, { withFileTypes: true }).sort((a, b) => (a.name < b.name ? -1 : 1))) {
    const inside = path.join(at, entry.name);
    if (entry.isDirectory()) yield* files(inside);
    else if (!/\.test\.tsx?$/.test(entry.name)) yield inside;
  }
}

const hash = createHash('sha256');
for (const source of sources)
  for (const file of files(path.join(top, source))) hash.update(file.slice(top.length)).update(readFileSync(file));
const wanted = hash.digest('hex');
const built = existsSync(stamp) && existsSync(path.join(top, 'frontend/dist/index.html')) && readFileSync(stamp, 'utf8') === wanted;
if (!built) {
  process.stdout.write('Building site and server …\n');
  const steps = [
    [process.execPath, ['backend/build.mjs'], top],
    [process.execPath, [path.join(top, 'node_modules/vite/bin/vite.js'), 'build', '--logLevel', 'warn'], path.join(top, 'frontend')],
  ];
  for (const [command, args, cwd] of steps) {
    const { status } = spawnSync(command, args, { cwd, stdio: 'inherit', env: { ...process.env, NODE_ENV: 'production' } });
    if (status !== 0) process.exit(status ?? 1);
  }
  writeFileSync(stamp, wanted);
}
