import type { Logger } from 'pino';
import type { Config } from '../config.ts';
import type { Db } from '../db/connect.ts';
import { deliverDue, removeOldDeliveries } from './deliver.ts';
import type { TargetRules } from './safe-target.ts';
import { spreadEvents } from './spread-events.ts';

const everyMs = 1000;
const tidyEveryMs = 3_600_000;

export const targetRules = ({ mode, webhookPrivateTargets }: Config): TargetRules => ({
  httpsOnly: mode === 'production',
  privateToo: webhookPrivateTargets,
});

/** Spreads and delivers, again and again, until stopped; it keeps no process alive. `mayWrite` false puts a round off. */
export function startWebhookWorker(db: Db, config: Config, logger: Pick<Logger, 'error'>, mayWrite: () => boolean): () => Promise<void> {
  let running: Promise<void> = Promise.resolve();
  let busy = false;
  let tidiedAt = 0;
  const round = async () => {
    try {
      while (spreadEvents(db) > 0) await new Promise((resolve) => setImmediate(resolve));
      await deliverDue(db, { rules: targetRules(config), siteUrl: config.siteUrl });
      if (Date.now() - tidiedAt > tidyEveryMs) {
        tidiedAt = Date.now();
        removeOldDeliveries(db, new Date(tidiedAt - config.keepDeliveriesDays * 86_400_000));
      }
    } catch (error) {
      logger.error({ err: error }, 'delivering webhooks failed');
    } finally {
      busy = false;
    }
  };
  const timer = setInterval(() => {
    if (busy || !mayWrite()) return;
    busy = true;
    running = round();
  }, everyMs);
  timer.unref();
  return async () => {
    clearInterval(timer);
    await running;
  };
}
