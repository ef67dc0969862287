// The built server on loopback beside a bare node:http one in the same run: reading, asking and batches, over as many hulls
// as a large catalog has. Printed beside the marks; never asserted: machines are shared and noisy, and the one who asks
// shares the cores with the one who answers.
import { type ChildProcess, spawn } from 'node:child_process';
import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import http from 'node:http';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { topFolder } from '../../backend/src/paths.ts';
import { fitExample } from '../../backend/src/resources/questions/examples.ts';
import { manyHulls } from '../support/many-hulls.ts';
import { signedIn } from '../support/signed-in.ts';

const short = process.env.BENCH === 'short';
const rows = short ? 5_000 : 100_000;
const batchLines = short ? 500 : 10_000;
const seconds = short ? 1 : 3;
const connections = 32;
const folder = mkdtempSync(path.join(tmpdir(), 'tiltwright-bench-'));
const say = (text: string) => process.stdout.write(`${text}\n`);

function started(args: string[], env: Record<string, string>, ready: RegExp): Promise<{ at: string; program: ChildProcess }> {
  const program = spawn(process.execPath, args, { env: { PATH: process.env.PATH, ...env }, stdio: ['ignore', 'pipe', 'inherit'] });
  let said = '';
  return new Promise((resolve, reject) => {
    program.stdout.on('data', (text) => {
      said += text;
      const found = ready.exec(said);
      if (found) resolve({ at: found[1]!, program });
    });
    program.once('exit', () => reject(new Error(`the server did not start: ${said}`)));
  });
}

/** Sends one fixed body of the size of a hull's sheet, nothing else. */
const bare = `require('http').createServer((q,s)=>{s.setHeader('content-type','application/json');s.end(${JSON.stringify(
  JSON.stringify({ filler: 'x'.repeat(1500) }),
)})}).listen(0,'127.0.0.1',function(){console.log('ready on http://127.0.0.1:'+this.address().port)})`;

interface Asked {
  path: string;
  method?: string;
  headers?: Record<string, string>;
  body?: string;
}

interface Load {
  perSecond: number;
  p50: number;
  p95: number;
  p99: number;
}

/** Asks over and over on kept connections; every answer has to have the status. */
async function load(at: string, next: (n: number) => Asked, status = 200, atOnce = connections): Promise<Load> {
  const agent = new http.Agent({ keepAlive: true, maxSockets: atOnce });
  const took: number[] = [];
  let n = 0;
  const until = performance.now() + seconds * 1000;
  const asker = async () => {
    while (performance.now() < until) {
      const from = performance.now();
      const got = await once(agent, at, next(n++));
      if (got !== status) throw new Error(`answered ${got}, not ${status}`);
      took.push(performance.now() - from);
    }
  };
  const from = performance.now();
  await Promise.all(Array.from({ length: atOnce }, asker));
  const elapsed = (performance.now() - from) / 1000;
  agent.destroy();
  took.sort((a, b) => a - b);
  const at100 = (share: number) => took[Math.floor(took.length * share)] ?? Number.NaN;
  return { perSecond: took.length / elapsed, p50: at100(0.5), p95: at100(0.95), p99: at100(0.99) };
}

function once(agent: http.Agent, at: string, { path: address, method = 'GET', headers = {}, body }: Asked): Promise<number> {
  return new Promise((resolve, reject) => {
    const request = http.request(`${at}${address}`, { agent, method, headers }, (response) => {
      response.resume();
      response.once('end', () => resolve(response.statusCode ?? 0));
    });
    request.once('error', reject);
    request.end(body);
  });
}

function report(what: string, { perSecond, p50, p95, p99 }: Load, limit: number, mark: string): void {
  const ratio = `${(perSecond / limit).toFixed(2)} of node:http`;
  say(
    `${what}: ${perSecond.toFixed(0)}/s (${ratio}), p50 ${p50.toFixed(2)} p95 ${p95.toFixed(2)} p99 ${p99.toFixed(2)} ms — mark: ${mark}`,
  );
}

async function fill(at: string): Promise<string[]> {
  const steward = await signedIn(at);
  const { id } = await steward.upload('hulls', manyHulls(rows));
  await steward.json('POST', `/imports/${id}/check`);
  while ((await steward.json<{ status: string }>('GET', `/imports/${id}`)).body.status === 'checking')
    await new Promise((resolve) => setTimeout(resolve, 50));
  const { status } = await steward.json('POST', `/imports/${id}/publish`, {});
  if (status !== 200) throw new Error(`not published: ${status}`);
  const ids: string[] = [];
  let cursor = '';
  while (ids.length < Math.min(rows, 6000)) {
    const { body } = await steward.json<{ data: { id: string }[]; next: string | null }>('GET', `/hulls?limit=200${cursor}`);
    ids.push(...body.data.map((hull) => hull.id));
    if (!body.next) break;
    cursor = `&cursor=${body.next}`;
  }
  return ids;
}

async function batch(at: string): Promise<void> {
  const cookie = await cookieOf(at);
  const { hull, transducer, lowerUnits, ref: _ref, alsoAt: _alsoAt, ...rest } = fitExample;
  const head = { shared: { hulls: { a: hull }, transducers: { a: transducer }, lowerUnits: { a: lowerUnits[0]!.lowerUnit } } };
  const line = (n: number) =>
    JSON.stringify({
      ref: String(n),
      hull: '#a',
      transducer: '#a',
      lowerUnits: [{ lowerUnit: '#a', motorTrimDeg: (n % 40) / 10 }],
      ...rest,
    });
  const body = [JSON.stringify(head), ...Array.from({ length: batchLines }, (_, n) => line(n))].join('\n');
  const from = performance.now();
  const response = await fetch(`${at}/api/v1/fits/batch`, {
    method: 'POST',
    headers: { cookie, 'content-type': 'application/x-ndjson' },
    body,
  });
  let first = Number.NaN;
  let last = '';
  for await (const piece of response.body as unknown as AsyncIterable<Uint8Array>) {
    if (Number.isNaN(first)) first = performance.now() - from;
    last = Buffer.from(piece).toString();
  }
  const total = performance.now() - from;
  if (!last.includes(`"done":true,"count":${batchLines},"problems":0`)) throw new Error(`the batch was not whole: ${last.slice(-200)}`);
  say(
    `batch of ${batchLines} unsampled fits: ${(total / 1000).toFixed(2)} s, ${((batchLines / total) * 1000).toFixed(0)}/s, first answer ${first.toFixed(0)} ms — mark: 10 000 in 3 s, first answer 30 ms`,
  );
}

async function cookieOf(at: string): Promise<string> {
  const answer = await fetch(`${at}/api/v1/session`, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify({ email: 'integrator@tiltwright.example', password: 'loft-floor-2026' }),
  });
  return answer.headers.getSetCookie().join('; ').split(';')[0]!;
}

const programs: ChildProcess[] = [];
try {
  const bundle = path.join(topFolder, 'backend/dist/server.mjs');
  if (!existsSync(bundle)) throw new Error('build first: node .ci/build.mjs');
  const limits = { LIMIT_ANONYMOUS: '1000000000', LIMIT_ACCOUNT: '1000000000' };
  const env = { PORT: '0', LOG_LEVEL: 'silent', DATA_DIR: folder, UPLOAD_MAX_MB: '100', ...limits };
  const plain = await started(['-e', bare], {}, /ready on (http:\/\/\S+)/);
  const site = await started([bundle], env, /ready on (http:\/\/\S+)/);
  programs.push(plain.program, site.program);
  const ids = await fill(site.at);
  say(`${rows} hulls, ${connections} connections, one process that asks`);
  const limit = (await load(plain.at, () => ({ path: '/' }))).perSecond;
  say(`node:http, one fixed body: ${limit.toFixed(0)}/s`);

  // More hulls than answers are kept, in turn: none of these comes from the kept ones.
  report(
    'GET /hulls/{id}, each another',
    await load(site.at, (n) => ({ path: `/api/v1/hulls/${ids[n % ids.length]}` })),
    limit,
    '0.3, p99 5 ms',
  );
  const one = `/api/v1/hulls/${ids[0]}`;
  report('the same again, kept', await load(site.at, () => ({ path: one })), limit, '0.8');
  const etag = (await fetch(`${site.at}${one}`)).headers.get('etag') ?? '';
  report('304', await load(site.at, () => ({ path: one, headers: { 'if-none-match': etag } }), 304), limit, '0.8');
  const words = ['balo yard 12', 'kido', 'reedcuter', 'hedle 14', 'coperplate 670', 'nesura 25'];
  const search = (n: number) => ({ path: `/api/v1/search?q=${encodeURIComponent(`${words[n % words.length]} ${n % 97}`)}` });
  report('GET /search with slips, 4 at a time', await load(site.at, search, 200, 4), limit, 'p95 5 ms');
  const tilt = (n: number) => ({ path: `/api/v1/tilt?hull=${ids[n % ids.length]}&speedKn=${5 + (n % 200) / 10}` });
  report('GET /tilt, 4 at a time', await load(site.at, tilt, 200, 4), limit, 'p95 4 ms');
  const fit = (n: number): Asked => ({
    path: '/api/v1/fits',
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify({ ...fitExample, alsoAt: undefined, uncertainty: 'none', ref: String(n), hull: ids[n % ids.length] }),
  });
  report('POST /fits unsampled', await load(site.at, fit), limit, '2 500/s with two threads');
  await batch(site.at);
} finally {
  for (const program of programs) program.kill('SIGKILL');
  rmSync(folder, { recursive: true, force: true });
}
