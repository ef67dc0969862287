// Entry of the worker thread: a connection of its own, one order after another.
import { parentPort, workerData } from 'node:worker_threads';
import { connect, databaseFile } from '../db/connect.ts';
import { ApiProblem } from '../errors.ts';
import type { ImportOrder } from './import-jobs.ts';
import { runOrder } from './run-order.ts';
import type { WorkerAnswer, WorkerFolders } from './worker-jobs.ts';

const { dataFolder, uploadsFolder } = workerData as WorkerFolders;
const db = connect(databaseFile(dataFolder));
// Rows by the ten thousand: copying the log back after every 4 MB would write most pages twice.
db.$client.pragma('wal_autocheckpoint = 16000');
// 64 MB of pages: the indexes of 100 000 hulls are looked into all over.
db.$client.pragma('cache_size = -64000');
let last: Promise<void> = Promise.resolve();

async function answer(seq: number, order: ImportOrder): Promise<void> {
  const reply = (message: WorkerAnswer) => parentPort!.postMessage(message);
  try {
    reply({ seq, result: await runOrder({ db, config: { uploadsFolder } }, order) });
  } catch (error) {
    if (error instanceof ApiProblem) reply({ seq, problem: { code: error.code, message: error.message, issues: [...error.issues] } });
    else reply({ seq, failure: { message: String((error as Error).stack ?? error), code: (error as { code?: string }).code ?? null } });
  }
}

parentPort!.on('message', ({ seq, order }: { seq: number; order: ImportOrder }) => {
  last = last.then(() => answer(seq, order));
});
