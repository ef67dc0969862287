// Plain Node, before anything is installed: makes a fresh clone ready, and does nothing on a ready one.
// --browser also sees to Chromium for the browser tests.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';

const top = path.resolve(import.meta.dirname, '..');
const stamp = path.join(top, 'node_modules/.installed-for');
const wanted = createHash('sha256')
  .update(readFileSync(path.join(top, 'package-lock.json')))
  .update(process.version)
  .digest('hex');

const say = (line) => process.stdout.write(`${line}\n`);
const run = (command, args, options = {}) => spawnSync(command, args, { cwd: top, stdio: 'inherit', ...options });

function installPackages() {
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return;
  say('Installing packages (a minute or two, once) …');
  const npm = process.env.npm_execpath;
  const environment = { ...process.env, NODE_ENV: 'development', npm_config_loglevel: 'error' };
  const { status } = npm
    ? run(process.execPath, [npm, 'ci'], { env: environment })
    : run('npm', ['ci'], { env: environment, shell: process.platform === 'win32' });
  if (status !== 0) {
    process.stderr.write('The packages could not be installed; see npm’s words above.\n');
    process.exit(1);
  }
  writeFileSync(stamp, wanted);
}

/** Debian's Chromium, where this machine lets us; otherwise the browser tests say that they are skipped. */
function installBrowser() {
  if (existsSync(process.env.CHROMIUM ?? '/usr/bin/chromium')) return;
  const mayInstall = process.getuid?.() === 0 && existsSync('/usr/bin/apt-get');
  if (!mayInstall) {
    say('No Chromium here and no right to install it: the browser tests will be skipped.');
    return;
  }
  say('Installing Chromium from Debian’s packages for the browser tests …');
  const environment = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  const quiet = { env: environment, stdio: ['ignore', 'ignore', 'inherit'] };
  run('apt-get', ['update', '-qq'], quiet);
  const { status } = run('apt-get', ['install', '-y', '-qq', '--no-install-recommends', 'chromium'], quiet);
  if (status !== 0) say('Chromium could not be installed: the browser tests will be skipped.');
}

installPackages();
if (process.argv.includes('--browser')) installBrowser();
