// A thread that does nothing but work out fits.
import { parentPort } from 'node:worker_threads';
import { answerJob, type FitJob } from './fit-job.ts';
import type { WorkerReply } from './fit-pool.ts';

parentPort?.on('message', ({ id, jobs }: { id: number; jobs: FitJob[] }) => {
  let reply: WorkerReply;
  try {
    reply = { id, answers: jobs.map(answerJob) };
  } catch (error) {
    reply = { id, error: error instanceof Error ? (error.stack ?? error.message) : String(error) };
  }
  parentPort?.postMessage(reply);
});
