import { eq } from 'drizzle-orm';
import type { Logger } from 'pino';
import { siteState } from '../../db/schema/mail.ts';
import type { Deps } from '../../deps.ts';
import { watchRoom } from '../../storage/watch-room.ts';
import { tidiedKey, tidy } from './tidy.ts';

const everyMs = 60_000;

/** True once the night's hour has come since the last run; a server that was off then catches up when it is started. */
export function isDue(lastRunAt: string | undefined, tidyHour: number, now: Date): boolean {
  const due = new Date(now);
  due.setHours(tidyHour, 0, 0, 0);
  if (due > now) due.setDate(due.getDate() - 1);
  return lastRunAt === undefined || new Date(lastRunAt) < due;
}

/** Looks every minute whether the night's work is due and whether there is room on the disk; keeps no process alive. */
export function startNightly(deps: Pick<Deps, 'db' | 'config' | 'jobs'>, logger: Pick<Logger, 'error'>): () => Promise<void> {
  let running: Promise<void> = Promise.resolve();
  let busy = false;
  const round = async () => {
    try {
      await watchRoom(deps);
      const last = deps.db.select().from(siteState).where(eq(siteState.key, tidiedKey)).get();
      if (isDue(last?.at, deps.config.tidyHour, new Date())) await tidy(deps);
    } catch (error) {
      logger.error({ err: error }, 'the nightly work failed');
    } finally {
      busy = false;
    }
  };
  const timer = setInterval(() => {
    // While an edition is written, a write of ours would hold up every request.
    if (busy || deps.jobs.isWriting()) return;
    busy = true;
    running = round();
  }, everyMs);
  timer.unref();
  return async () => {
    clearInterval(timer);
    await running;
  };
}
