import type { Logger } from 'pino';
import type { Deps } from '../deps.ts';
import { deliverDueMail } from './deliver-mail.ts';
import type { MailTransport } from './transport.ts';

/** How soon after an event its mail begins to leave. */
const everyMs = 1000;

/** Sends what is due, again and again, until stopped; it keeps no process alive. */
export function startMailWorker(
  { db, jobs }: Pick<Deps, 'db' | 'jobs'>,
  transport: MailTransport,
  logger: Pick<Logger, 'error' | 'warn'>,
): () => Promise<void> {
  let running: Promise<void> = Promise.resolve();
  let busy = false;
  const round = async () => {
    try {
      const { failed } = await deliverDueMail(db, transport);
      if (failed > 0) logger.warn({ failed }, 'mails could not be sent');
    } catch (error) {
      logger.error({ err: error }, 'sending mail failed');
    } finally {
      busy = false;
    }
  };
  const timer = setInterval(() => {
    // While an edition is written, a write of ours would hold up every request.
    if (busy || jobs.isWriting()) return;
    busy = true;
    running = round();
  }, everyMs);
  timer.unref();
  return async () => {
    clearInterval(timer);
    await running;
    transport.close();
  };
}
