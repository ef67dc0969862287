// Fits are the dear part of the product: they are worked out beside the thread that answers requests.
import { existsSync } from 'node:fs';
import path from 'node:path';
import { Worker } from 'node:worker_threads';
import { answerJob, type FitJob } from './fit-job.ts';

export type WorkerReply = { id: number; answers: string[]; error?: undefined } | { id: number; error: string };

export interface FitPool {
  /** Answers in the order of the jobs, each as JSON text. */
  answer(jobs: readonly FitJob[]): Promise<string[]>;
  /** Threads at work; 0 where fits are worked out in this one. */
  readonly threads: number;
  close(): Promise<void>;
}

interface Waiting {
  resolve: (answers: string[]) => void;
  reject: (error: Error) => void;
}

interface Hand {
  worker: Worker;
  waiting: Map<number, Waiting>;
}

/** The bundle holds the worker beside the server; run from source there is none. */
const workerFile = path.join(import.meta.dirname, 'fit-worker.mjs');

export function fitPool(threads: number): FitPool {
  return threads > 0 && existsSync(workerFile) ? threadedPool(threads) : ownThread();
}

function ownThread(): FitPool {
  return {
    threads: 0,
    async answer(jobs) {
      const answers: string[] = [];
      for (const job of jobs) {
        answers.push(answerJob(job));
        // Other requests get their turn between two fits.
        await new Promise((resolve) => setImmediate(resolve));
      }
      return answers;
    },
    close: async () => {},
  };
}

function threadedPool(threads: number): FitPool {
  let nextId = 0;
  let closed = false;
  const hands: Hand[] = [];

  const hire = (place: number) => {
    const hand: Hand = { worker: new Worker(workerFile), waiting: new Map() };
    hand.worker.unref();
    hand.worker.on('message', (reply: WorkerReply) => {
      const waiting = hand.waiting.get(reply.id);
      hand.waiting.delete(reply.id);
      if (reply.error !== undefined) waiting?.reject(new Error(`A fit could not be worked out: ${reply.error}`));
      else waiting?.resolve(reply.answers);
    });
    hand.worker.on('error', (error) => {
      for (const waiting of hand.waiting.values()) waiting.reject(error as Error);
      hand.waiting.clear();
    });
    hand.worker.on('exit', () => {
      for (const waiting of hand.waiting.values()) waiting.reject(new Error('The thread that worked out fits has ended.'));
      hand.waiting.clear();
      if (!closed) hire(place);
    });
    hands[place] = hand;
  };
  for (let place = 0; place < threads; place++) hire(place);

  return {
    threads,
    answer(jobs) {
      const hand = hands.reduce((least, other) => (other.waiting.size < least.waiting.size ? other : least));
      const id = nextId++;
      return new Promise((resolve, reject) => {
        hand.waiting.set(id, { resolve, reject });
        hand.worker.postMessage({ id, jobs });
      });
    },
    async close() {
      closed = true;
      await Promise.all(hands.map(({ worker }) => worker.terminate()));
    },
  };
}
