// A line a question, in order: parsed here, worked out in the pool, one answer or one problem a line.
import { type BatchDone, mostBatchLines, SharedParts } from '@tiltwright/shared/schemas/batch.ts';
import { FitQuestion } from '@tiltwright/shared/schemas/fit.ts';
import type { Problem } from '@tiltwright/shared/schemas/problem.ts';
import type * as z from 'zod';
import { ApiProblem } from '../../errors.ts';
import type { FitJob } from '../../fit-pool/fit-job.ts';
import type { FitPool } from '../../fit-pool/fit-pool.ts';
import { fitJob } from '../questions/answer-questions.ts';
import type { PartLookup } from '../questions/part-lookup.ts';
import { inOrder } from './in-order.ts';
import type { InputLine } from './read-lines.ts';

/** What the batch needs of its surroundings. */
export interface BatchTools {
  parts: PartLookup;
  pool: FitPool;
  /** @throws ApiProblem invalid-input */
  parse<S extends z.ZodType>(schema: S, value: unknown): z.output<S>;
  /** The problem document of whatever was thrown. */
  problemOf(error: unknown): Problem;
  /** Charges the caller. */
  charge(units: number): Promise<void>;
}

export const plainUnits = 2;
export const sampledUnits = 20;
/** Questions a thread is handed at a time: enough to make the hand-over cheap, few enough for a first answer soon. */
const chunkLines = 16;

type Shared = z.output<typeof SharedParts>['shared'];
const nothingShared: Shared = { hulls: {}, lowerUnits: {}, transducers: {}, mounts: {} };

/**
 * Reads the shared parts, where the first line holds them, and then answers line by line.
 * @throws ApiProblem where the first line's shared parts are wrong: every later line would be too
 */
export async function answerBatch(groups: AsyncGenerator<InputLine[]>, tools: BatchTools): Promise<AsyncGenerator<string>> {
  const first = await groups.next();
  const head = first.done ? [] : first.value;
  const value = head[0]?.text ? fromJson(head[0].text) : undefined;
  const isShared = typeof value === 'object' && value !== null && Object.hasOwn(value, 'shared');
  const shared = isShared ? tools.parse(SharedParts, value).shared : nothingShared;
  return answers(isShared ? head.slice(1) : head, groups, shared, tools);
}

async function* answers(head: InputLine[], groups: AsyncGenerator<InputLine[]>, shared: Shared, tools: BatchTools): AsyncGenerator<string> {
  let count = 0;
  let problems = 0;
  async function* chunks() {
    for await (const lines of prepended(head, groups)) {
      // The very first question goes alone: its answer is what the caller waits for.
      for (let from = 0; from < lines.length; ) {
        const room = mostBatchLines - count;
        const chunk = lines.slice(from, from + Math.min(room, count === 0 ? 1 : chunkLines));
        from += chunk.length;
        count += chunk.length;
        if (chunk.length > 0) yield { lines: chunk, over: false };
        if (from < lines.length && count >= mostBatchLines) {
          yield { lines: lines.slice(from, from + 1), over: true };
          return;
        }
      }
    }
  }
  const work = async ({ lines, over }: { lines: InputLine[]; over: boolean }) => {
    if (over) return overLine(lines[0]!.n, tools);
    return answerChunk(lines, shared, tools);
  };
  for await (const { text, wrong } of inOrder(chunks(), work, Math.max(2, 2 * tools.pool.threads))) {
    problems += wrong;
    yield text;
  }
  yield `${JSON.stringify({ done: true, count, problems, edition: tools.parts.edition() } satisfies BatchDone)}\n`;
}

async function* prepended(head: InputLine[], groups: AsyncGenerator<InputLine[]>) {
  if (head.length > 0) yield head;
  yield* groups;
}

interface ChunkAnswer {
  text: string;
  wrong: number;
}

async function answerChunk(lines: readonly InputLine[], shared: Shared, tools: BatchTools): Promise<ChunkAnswer> {
  const out = new Array<string>(lines.length);
  const jobs: FitJob[] = [];
  const places: number[] = [];
  let wrong = 0;
  let units = 0;
  const fail = (index: number, ref: string | undefined, error: unknown) => {
    wrong += 1;
    out[index] = JSON.stringify({ ...(ref !== undefined && { ref }), line: lines[index]!.n, problem: tools.problemOf(error) });
  };
  for (const [index, line] of lines.entries()) {
    let ref: string | undefined;
    try {
      if (line.text === null) throw new ApiProblem('body-too-large', 'The line is longer than a question can be.');
      const value = fromJson(line.text);
      if (value === undefined) throw new ApiProblem('malformed-json', 'The line is not valid JSON.');
      ref = refOf(value);
      const question = tools.parse(FitQuestion, value);
      const asked = { ...question, uncertainty: question.uncertainty ?? ('none' as const) };
      units += asked.uncertainty === 'none' ? plainUnits : sampledUnits;
      jobs.push(fitJob(tools.parts, withShared(asked, shared)));
      places.push(index);
    } catch (error) {
      if (units === 0 || ref === undefined) units += plainUnits;
      fail(index, ref, error);
    }
  }
  await tools.charge(units);
  try {
    const answered = jobs.length > 0 ? await tools.pool.answer(jobs) : [];
    for (const [job, text] of answered.entries()) out[places[job]!] = text;
  } catch (error) {
    for (const [job, index] of places.entries()) fail(index, jobs[job]!.question.ref, error);
  }
  return { text: `${out.join('\n')}\n`, wrong };
}

function overLine(n: number, { problemOf }: BatchTools): ChunkAnswer {
  const problem = problemOf(
    new ApiProblem('body-too-large', `A batch has at most ${mostBatchLines} questions; what follows was not read.`),
  );
  return { text: `${JSON.stringify({ line: n, problem })}\n`, wrong: 1 };
}

/** `#name` stands for a part of the first line. @throws ApiProblem unknown-part */
function withShared(question: FitQuestion, shared: Shared): FitQuestion {
  const one = <T>(kind: keyof Shared, part: T | string, path: string): T | string => {
    if (typeof part !== 'string' || !part.startsWith('#')) return part;
    const named = shared[kind] as Record<string, unknown>;
    const name = part.slice(1);
    if (Object.hasOwn(named, name)) return named[name] as T;
    const message = `The first line names no ${kind} ${part}.`;
    throw new ApiProblem('unknown-part', message, [{ path, code: 'unknown-part', message }]);
  };
  return {
    ...question,
    hull: one('hulls', question.hull, '/hull'),
    transducer: one('transducers', question.transducer, '/transducer'),
    ...(question.mount !== undefined && { mount: one('mounts', question.mount, '/mount') }),
    lowerUnits: question.lowerUnits.map((engine, index) => ({
      ...engine,
      lowerUnit: one('lowerUnits', engine.lowerUnit, `/lowerUnits/${index}/lowerUnit`),
    })),
  };
}

function fromJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}

const refOf = (value: unknown): string | undefined => {
  const ref = typeof value === 'object' && value !== null ? (value as { ref?: unknown }).ref : undefined;
  return typeof ref === 'string' && ref.length <= 200 ? ref : undefined;
};
