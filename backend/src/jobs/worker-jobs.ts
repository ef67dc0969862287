// The server's side of the worker: starts it when there is something to do, ends it when idle, outlives its death.
import { Worker } from 'node:worker_threads';
import type { ProblemCode, ProblemIssue } from '@tiltwright/shared/schemas/problem.ts';
import { ApiProblem } from '../errors.ts';
import type { ImportJobs, ImportOrder } from './import-jobs.ts';
import { writesEdition } from './run-order.ts';

export interface WorkerFolders {
  dataFolder: string;
  uploadsFolder: string;
}

export interface WorkerAnswer {
  seq: number;
  result?: unknown;
  problem?: { code: ProblemCode; message: string; issues: ProblemIssue[] };
  failure?: { message: string; code: string | null };
}

interface Waiting {
  order: ImportOrder;
  resolve: (value: never) => void;
  reject: (error: Error) => void;
}

/** An idle worker gives its memory back after a minute. */
const idleMs = 60_000;

/** Rows live for one batch: with room for several, few are carried from one generation to the next. */
const youngMb = 48;

/** @param entry file of the worker's bundle */
export function workerJobs(entry: string, folders: WorkerFolders): ImportJobs {
  let worker: Worker | undefined;
  let idle: NodeJS.Timeout | undefined;
  let nextSeq = 0;
  const waiting = new Map<number, Waiting>();
  let writable: { promise: Promise<void>; open: () => void } | undefined;

  const settleGate = () => {
    if ([...waiting.values()].some(({ order }) => writesEdition(order))) return;
    writable?.open();
    writable = undefined;
  };

  const take = (seq: number): Waiting | undefined => {
    const found = waiting.get(seq);
    waiting.delete(seq);
    settleGate();
    if (waiting.size === 0) {
      idle = setTimeout(() => void stop(), idleMs).unref();
      worker?.unref();
    }
    return found;
  };

  const start = (): Worker => {
    const made = new Worker(entry, { workerData: folders, resourceLimits: { maxYoungGenerationSizeMb: youngMb } });
    made.on('message', ({ seq, result, problem, failure }: WorkerAnswer) => {
      const found = take(seq);
      if (!found) return;
      if (problem) found.reject(new ApiProblem(problem.code, problem.message, problem.issues));
      else if (failure) found.reject(Object.assign(new Error(failure.message), { code: failure.code ?? undefined }));
      else found.resolve(result as never);
    });
    const lost = (error: Error) => {
      if (worker !== made) return;
      worker = undefined;
      for (const [seq] of [...waiting]) take(seq)?.reject(error);
    };
    made.on('error', lost);
    made.on('exit', () => lost(new Error('the import worker ended')));
    return made;
  };

  async function stop(): Promise<void> {
    const ending = worker;
    worker = undefined;
    await ending?.terminate();
  }

  return {
    run(order) {
      clearTimeout(idle);
      worker ??= start();
      worker.ref();
      const seq = nextSeq++;
      if (writesEdition(order) && !writable) {
        let open = () => {};
        const promise = new Promise<void>((resolve) => {
          open = resolve;
        });
        writable = { promise, open };
      }
      const answer = new Promise<never>((resolve, reject) => waiting.set(seq, { order, resolve, reject }));
      worker.postMessage({ seq, order });
      return answer;
    },
    isWriting: () => writable !== undefined,
    untilWritable: () => writable?.promise ?? Promise.resolve(),
    async close() {
      clearTimeout(idle);
      await stop();
      for (const [seq] of [...waiting]) take(seq)?.reject(new Error('the server is stopping'));
    },
  };
}
