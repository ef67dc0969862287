import type { Config } from '../config.ts';
import type { Db } from '../db/connect.ts';
import type { ImportJobs } from './import-jobs.ts';
import { runOrder } from './run-order.ts';

/** Orders on the connection of the server itself: for tests, seeds and running from source. */
export function inProcessJobs(deps: { db: Db; config: Pick<Config, 'uploadsFolder'> }): ImportJobs {
  let last: Promise<unknown> = Promise.resolve();
  return {
    run(order) {
      const turn = last.then(() => runOrder(deps, order));
      last = turn.catch(() => undefined);
      return turn as Promise<never>;
    },
    untilWritable: () => Promise.resolve(),
    // A transaction on the one connection ends before anything else gets its turn.
    isWriting: () => false,
    close: async () => {
      await last;
    },
  };
}
