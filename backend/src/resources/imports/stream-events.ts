// Progress as server-sent events (WHATWG HTML, server-sent events).
import { once } from 'node:events';
import { setTimeout as wait } from 'node:timers/promises';
import type { Response } from 'express';
import type { Db } from '../../db/connect.ts';
import { importOrProblem, toImport } from './queries.ts';

/** The row is read this often: the worker writes it a few times a second. */
const everyMs = 200;
/** A comment now and then keeps proxies from closing a quiet stream. */
const aliveEveryMs = 15_000;

/** Sends the import whenever it changed, until nothing is under way or the reader leaves. @throws ApiProblem not-found */
export async function streamEvents(db: Db, id: string, res: Response): Promise<void> {
  importOrProblem(db, id);
  res.status(200).type('text/event-stream').setHeader('X-Accel-Buffering', 'no');
  const left = new AbortController();
  res.once('close', () => left.abort());
  let sent = '';
  let quietMs = 0;
  while (!left.signal.aborted && db.$client.open) {
    const shown = toImport(db, importOrProblem(db, id));
    const data = JSON.stringify(shown);
    if (data !== sent) quietMs = 0;
    const text = data !== sent ? `event: import\ndata: ${data}\n\n` : quietMs >= aliveEveryMs ? ': still here\n\n' : '';
    if (quietMs >= aliveEveryMs) quietMs = 0;
    sent = data;
    if (text !== '' && !res.write(text)) await Promise.race([once(res, 'drain'), once(res, 'close')]);
    if (shown.status !== 'checking' && shown.status !== 'publishing') break;
    await wait(everyMs, undefined, { ref: false, signal: left.signal }).catch(() => undefined);
    quietMs += everyMs;
  }
  res.end();
}
