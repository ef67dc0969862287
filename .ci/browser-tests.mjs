// Runs the browser tests where there is a Chromium, and says so clearly where there is none.
import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import path from 'node:path';

const chromium = process.env.CHROMIUM ?? '/usr/bin/chromium';
if (!existsSync(chromium)) {
  process.stdout.write(`\nBROWSER TESTS SKIPPED: no Chromium at ${chromium}. Install Debian's package chromium, or set CHROMIUM.\n`);
  process.exit(process.env.CI ? 1 : 0);
}
const top = path.resolve(import.meta.dirname, '..');
const cli = path.join(top, 'node_modules/@playwright/test/cli.js');
const { status } = spawnSync(process.execPath, [cli, 'test', ...process.argv.slice(2)], {
  cwd: top,
  stdio: 'inherit',
  env: { ...process.env, CHROMIUM: chromium },
});
process.exit(status ?? 1);
