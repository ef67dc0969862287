// A hulls file against a catalog of as many hulls: check with differences and publication by the built server, its memory,
// and how the site answers meanwhile. Printed beside the marks and as ratios to `sqlite3 .import` of the same file in the
// same run; never asserted: machines are shared and noisy.
import { type ChildProcess, execFile, spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import { topFolder } from '../../backend/src/paths.ts';
import type { Import } from '../../shared/src/schemas/import.ts';
import { manyHulls } from '../support/many-hulls.ts';
import { type Person, signedIn } from '../support/signed-in.ts';

const rows = process.env.BENCH === 'short' ? 10_000 : 100_000;
const folder = mkdtempSync(path.join(tmpdir(), 'tiltwright-bench-'));
const say = (text: string) => process.stdout.write(`${text}\n`);

async function startServer(): Promise<{ at: string; program: ChildProcess }> {
  const bundle = path.join(topFolder, 'backend/dist/server.mjs');
  if (!existsSync(bundle)) throw new Error('build first: node .ci/build.mjs');
  const limits = { LIMIT_ANONYMOUS: '100000000', LIMIT_ACCOUNT: '100000000' };
  const program = spawn(process.execPath, [bundle], {
    env: { PATH: process.env.PATH, PORT: '0', LOG_LEVEL: 'silent', DATA_DIR: folder, UPLOAD_MAX_MB: '100', ...limits },
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  let said = '';
  const at = await new Promise<string>((resolve, reject) => {
    program.stdout.on('data', (text) => {
      said += text;
      const found = /ready on (http:\/\/\S+)/.exec(said);
      if (found) resolve(found[1]!);
    });
    program.once('exit', () => reject(new Error(`the server did not start: ${said}`)));
  });
  return { at, program };
}

/** Processor seconds the server has used, all threads, and its peak memory; where the system tells. */
function usageOf(pid: number): { seconds: number; peakMb: number } {
  try {
    const fields = readFileSync(`/proc/${pid}/stat`, 'utf8').split(') ')[1]!.split(' ');
    const peak = /VmHWM:\s+(\d+) kB/.exec(readFileSync(`/proc/${pid}/status`, 'utf8'));
    // Clock ticks are hundredths of a second on every Linux that Node runs on.
    return { seconds: (Number(fields[11]) + Number(fields[12])) / 100, peakMb: Number(peak?.[1] ?? Number.NaN) / 1024 };
  } catch {
    return { seconds: Number.NaN, peakMb: Number.NaN };
  }
}

/** Rows a second of the plainest way into SQLite, by the clock and by processor time; undefined where its program is missing. */
async function sqliteImport(file: string): Promise<{ wall: number; processor: number } | undefined> {
  const database = path.join(folder, 'plain.sqlite');
  rmSync(database, { force: true });
  const command = `TIMEFORMAT='%R %U %S'; time sqlite3 ${database} '.mode csv' '.import ${file} hulls'`;
  const { stderr } = await promisify(execFile)('bash', ['-c', command]);
  const [wall = Number.NaN, user = Number.NaN, system = Number.NaN] = stderr.trim().split(/\s+/).map(Number);
  return Number.isNaN(wall) ? undefined : { wall: rows / wall, processor: rows / (user + system) };
}

/** Asks for one hull after another until told to stop; the 99th percentile of the answers in milliseconds. */
function askMeanwhile(at: string, id: string): () => Promise<{ p99: number; worst: number; asked: number }> {
  let going = true;
  const took: number[] = [];
  const asking = (async () => {
    while (going) {
      const from = performance.now();
      await (await fetch(`${at}/api/v1/hulls/${id}`)).arrayBuffer();
      took.push(performance.now() - from);
      await new Promise((resolve) => setTimeout(resolve, 2));
    }
  })();
  return async () => {
    going = false;
    await asking;
    took.sort((a, b) => a - b);
    return { p99: took[Math.floor(took.length * 0.99)] ?? Number.NaN, worst: took.at(-1) ?? Number.NaN, asked: took.length };
  };
}

interface Step {
  seconds: number;
  processorSeconds: number;
  meanwhile: { p99: number; worst: number; asked: number };
}

async function timed(pid: number, at: string, id: string, work: () => Promise<unknown>): Promise<Step> {
  const stop = askMeanwhile(at, id);
  const before = usageOf(pid).seconds;
  const from = performance.now();
  await work();
  const seconds = (performance.now() - from) / 1000;
  const processorSeconds = usageOf(pid).seconds - before;
  return { seconds, processorSeconds, meanwhile: await stop() };
}

async function ended(person: Person, id: string): Promise<Import> {
  while (true) {
    const { body } = await person.json<Import>('GET', `/imports/${id}`);
    if (body.status !== 'checking') return body;
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
}

async function run(): Promise<void> {
  const { at, program } = await startServer();
  try {
    const person = await signedIn(at);
    const hull = (await person.json<{ data: { id: string }[] }>('GET', '/hulls?limit=1')).body.data[0]!.id;
    for (const round of [0, 1] as const) {
      const file = path.join(folder, `hulls-${round}.csv`);
      const text = manyHulls(rows, round);
      writeFileSync(file, text);
      const plain = await sqliteImport(file);
      const { id } = await person.upload('hulls', text);
      const check = await timed(program.pid!, at, hull, async () => {
        await person.json('POST', `/imports/${id}/check`);
        await ended(person, id);
      });
      const { counts } = await ended(person, id);
      const publish = await timed(program.pid!, at, hull, async () => {
        const { status } = await person.json('POST', `/imports/${id}/publish`, {});
        if (status !== 200) throw new Error(`not published: ${status}`);
      });
      report(round === 0 ? `${rows} new hulls` : `${rows} hulls, each with two or three differences`, { check, publish, plain, counts });
    }
    say(`peak memory of the server, worker included: ${usageOf(program.pid!).peakMb.toFixed(0)} MB (mark: under 400 MB)`);
  } finally {
    program.kill('SIGKILL');
    rmSync(folder, { recursive: true, force: true });
  }
}

const marks = { check: 40_000, publish: 60_000 };

function report(
  what: string,
  {
    check,
    publish,
    plain,
    counts,
  }: { check: Step; publish: Step; plain: Awaited<ReturnType<typeof sqliteImport>>; counts: Import['counts'] },
): void {
  say(`${what}: ${JSON.stringify(counts)}`);
  if (plain) say(`  sqlite3 .import of the same file: ${rate(plain.wall)}, ${rate(plain.processor)} of processor time`);
  else say('  sqlite3 is not installed: no ratio');
  for (const [name, step] of Object.entries({ check, publish })) {
    const wall = rows / step.seconds;
    const ratio = plain ? `, ${(wall / plain.wall).toFixed(3)} of .import` : '';
    const processor = rows / step.processorSeconds;
    const ratioOfTime = plain ? ` (${(processor / plain.processor).toFixed(3)} of .import)` : '';
    say(
      `  ${name}: ${rate(wall)}${ratio}; of the server's processor time ${rate(processor)}${ratioOfTime}; mark ${rate(marks[name as keyof typeof marks])}`,
    );
    const { p99, worst, asked } = step.meanwhile;
    say(`    meanwhile ${asked} × GET /hulls/{id}: p99 ${p99.toFixed(1)} ms, worst ${worst.toFixed(1)} ms (mark: p99 under 50 ms)`);
  }
}

const rate = (value: number) => `${Math.round(value).toLocaleString('en')} rows/s`;

await run();
