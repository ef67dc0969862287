import type { Config } from '../config.ts';
import type { Db } from '../db/connect.ts';
import { rollBackEdition } from '../resources/editions/roll-back-edition.ts';
import { runCheck } from '../resources/imports/check-import.ts';
import { inspectFile } from '../resources/imports/inspect-file.ts';
import { abandonPublish, publishImport } from '../resources/imports/publish-import.ts';
import type { ImportOrder, OrderResults } from './import-jobs.ts';

interface OrderDeps {
  db: Db;
  config: Pick<Config, 'uploadsFolder'>;
}

/** Does one order on this connection. */
export async function runOrder(deps: OrderDeps, order: ImportOrder): Promise<OrderResults[ImportOrder['kind']]> {
  const { db, config } = deps;
  switch (order.kind) {
    case 'inspect':
      return inspectFile(config, order);
    case 'check':
      // Rows can be judged again: no need to wait for the disk at each batch.
      db.$client.pragma('synchronous = NORMAL');
      try {
        await runCheck(deps, order.id);
      } finally {
        if (db.$client.open) db.$client.pragma('synchronous = FULL');
      }
      return undefined;
    case 'publish':
      try {
        return publishImport(db, order.id, order.order, order.actor);
      } catch (error) {
        abandonPublish(db, order.id);
        throw error;
      }
    case 'rollback':
      return rollBackEdition(db, order.edition, order.why, order.actor);
    default:
      return order satisfies never;
  }
}

/** Orders that write an edition in one long transaction. */
export const writesEdition = ({ kind }: ImportOrder) => kind === 'publish' || kind === 'rollback';
