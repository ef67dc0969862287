// A shop's nightly run: the names of its stock list become hulls of the catalog, every hull is asked with the shop's own
// packages in one batch, and only what has changed since last night is written down.
//
//   TILTWRIGHT_KEY=tiltwright.key_… npx tsx openapi/examples/nightly-stock.ts https://tiltwright.example stock.txt state.json
//
// stock.txt holds a boat's name a line; state.json is made at the first run and kept from night to night.
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { pathToFileURL } from 'node:url';

/** What the shop fits, in the words of the API; the hull is filled in. */
export interface Package {
  name: string;
  question: Record<string, unknown>;
}

/** Digest of the answer to each boat and package, by `<hull> <package>`. */
export type Digests = Record<string, string>;

export interface Night {
  digests: Digests;
  /** Answers that are new or say something else than last night. */
  changed: { name: string; package: string; answer: FitAnswer }[];
  unchanged: number;
  /** Names no hull was found for without doubt; someone has to look. */
  unresolved: { name: string; candidates: Candidate[] }[];
  problems: { ref: string | undefined; detail: string }[];
}

interface Candidate {
  id: string;
  maker: string;
  model: string;
  score: number;
  why: string[];
}
interface FitAnswer {
  ref?: string;
  verdict: string;
  answerDigest: string;
}
interface BatchLine extends Partial<FitAnswer> {
  problem?: { detail: string };
  done?: true;
  count?: number;
}

const namesAtOnce = 1000;

export async function nightlyRun(
  site: string,
  key: string,
  names: readonly string[],
  packages: readonly Package[],
  before: Digests,
): Promise<Night> {
  const night: Night = { digests: {}, changed: [], unchanged: 0, unresolved: [], problems: [] };
  const hulls = new Map<string, string>();
  for (let from = 0; from < names.length; from += namesAtOnce) {
    const { data } = await post(site, key, '/hulls/resolve', { names: names.slice(from, from + namesAtOnce) });
    for (const { name, best, candidates } of data as { name: string; best: string | null; candidates: Candidate[] }[]) {
      if (best) hulls.set(best, name);
      else night.unresolved.push({ name, candidates });
    }
  }

  const lines = [...hulls.keys()].flatMap((hull) =>
    packages.map(({ name, question }) => JSON.stringify({ ...question, ref: `${hull} ${name}`, hull })),
  );
  const response = await fetch(`${site}/api/v1/fits/batch`, {
    method: 'POST',
    headers: { authorization: `Bearer ${key}`, 'content-type': 'application/x-ndjson' },
    body: lines.join('\n'),
  });
  if (!response.ok || !response.body) throw new Error(`${response.status} ${await response.text()}`);
  let ended = false;
  for await (const line of linesOf(response.body)) {
    if (line.done) ended = line.count === lines.length;
    else if (line.problem) night.problems.push({ ref: line.ref, detail: line.problem.detail });
    else {
      const answer = line as FitAnswer;
      const ref = answer.ref ?? '';
      night.digests[ref] = answer.answerDigest;
      if (before[ref] === answer.answerDigest) night.unchanged += 1;
      else {
        const [hull = '', pack = ''] = ref.split(' ');
        night.changed.push({ name: hulls.get(hull) ?? hull, package: pack, answer });
      }
    }
  }
  // Without its last line an answer may have been cut off: keep yesterday's state and try again.
  if (!ended) throw new Error('The batch was cut off; nothing was kept.');
  return night;
}

async function post(site: string, key: string, path: string, body: unknown): Promise<{ data: unknown }> {
  const response = await fetch(`${site}/api/v1${path}`, {
    method: 'POST',
    headers: { authorization: `Bearer ${key}`, 'content-type': 'application/json' },
    body: JSON.stringify(body),
  });
  if (!response.ok) throw new Error(`${response.status} ${await response.text()}`);
  return (await response.json()) as { data: unknown };
}

async function* linesOf(body: ReadableStream<Uint8Array>): AsyncGenerator<BatchLine> {
  let rest = '';
  const decoder = new TextDecoder();
  for await (const piece of body as unknown as AsyncIterable<Uint8Array>) {
    const lines = (rest + decoder.decode(piece, { stream: true })).split('\n');
    rest = lines.pop() ?? '';
    for (const line of lines) yield JSON.parse(line) as BatchLine;
  }
}

/** The shop's packages: a side-looking transducer on a bracket, port of the keel, behind one of two motors. */
export const packages: Package[] = [
  { name: 'small', question: rig({ drive: 'outboard', powerHp: 30 }, 18) },
  { name: 'large', question: rig({ drive: 'outboard', powerHp: 115 }, 26) },
];

function rig(lowerUnit: object, cruiseKn: number): Record<string, unknown> {
  return {
    lowerUnits: [{ lowerUnit }],
    transducer: { kinds: ['side'], housingLengthMm: 220 },
    placement: { offsetMm: -380, dropMm: 5, standoffMm: 30 },
    running: { speedKn: 4, water: 'fresh' },
    alsoAt: [{ label: 'cruising', speedKn: cruiseKn }],
    target: { attitudeDeg: 0 },
  };
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) {
  const [site, stockFile, stateFile] = process.argv.slice(2);
  const key = process.env.TILTWRIGHT_KEY;
  if (!site || !stockFile || !stateFile || !key) {
    process.stderr.write('TILTWRIGHT_KEY=… npx tsx openapi/examples/nightly-stock.ts <site> <stock.txt> <state.json>\n');
    process.exit(1);
  }
  const names = readFileSync(stockFile, 'utf8')
    .split('\n')
    .filter((line) => line.trim() !== '');
  const before = existsSync(stateFile) ? (JSON.parse(readFileSync(stateFile, 'utf8')) as Digests) : {};
  const night = await nightlyRun(site, key, names, packages, before);
  writeFileSync(stateFile, JSON.stringify(night.digests, null, 1));
  for (const { name, package: pack, answer } of night.changed) process.stdout.write(`${name} · ${pack}: ${answer.verdict}\n`);
  for (const { name } of night.unresolved) process.stdout.write(`${name}: which hull is it?\n`);
  process.stdout.write(`${night.changed.length} changed, ${night.unchanged} as last night, ${night.problems.length} problems\n`);
}
