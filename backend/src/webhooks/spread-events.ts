// From events of the outbox to deliveries, one a webhook that asked for the topic.
import { and, asc, eq, gt, isNull } from 'drizzle-orm';
import type { Db } from '../db/connect.ts';
import { siteState } from '../db/schema/mail.ts';
import { outbox } from '../db/schema/outbox.ts';
import { deliveries, webhooks } from '../db/schema/webhooks.ts';
import { newId } from '../ids.ts';

const stateKey = 'webhooks.spread';
const eventsATurn = 500;
/** Where an edition changes more hulls than this, its receivers read the change feed instead of as many messages. */
export const mostHullsToldSingly = 500;

interface Event {
  id: number;
  edition: number | null;
  topic: string;
  payload: Record<string, unknown>;
  createdAt: string;
}

/** Works through what the outbox has gained; all in one transaction, so that an event is spread once. @returns events dealt with */
export function spreadEvents(db: Db, now: () => number = Date.now): number {
  return db.transaction(
    (tx) => {
      const state = tx.select().from(siteState).where(eq(siteState.key, stateKey)).get();
      const after = Number(state?.value.outbox ?? 0);
      const events: Event[] = tx.select().from(outbox).where(gt(outbox.id, after)).orderBy(asc(outbox.id)).limit(eventsATurn).all();
      if (events.length === 0) return 0;
      const hooks = tx.select().from(webhooks).where(isNull(webhooks.disabledAt)).all();
      const hullsOf = hullCounts(tx);
      for (const event of events) {
        const told = hooks.filter((hook) => hook.topics.includes(event.topic) && hook.createdAt <= event.createdAt);
        if (told.length === 0) continue;
        const hulls = event.edition === null ? 0 : hullsOf(event.edition);
        if (event.topic.startsWith('hull.') && hulls > mostHullsToldSingly) continue;
        for (const hook of told) {
          const data = dataFor(event, hook.userId, hulls);
          if (!data) continue;
          tx.insert(deliveries)
            .values({
              id: newId('del'),
              webhookId: hook.id,
              messageId: `evt_${event.id}`,
              topic: event.topic,
              body: JSON.stringify({ type: event.topic, timestamp: event.createdAt, data }),
              status: 'waiting',
              dueAt: now(),
              createdAt: new Date(now()).toISOString(),
            })
            .onConflictDoNothing()
            .run();
        }
      }
      const row = { value: { outbox: events.at(-1)!.id }, at: new Date(now()).toISOString() };
      tx.insert(siteState)
        .values({ key: stateKey, ...row })
        .onConflictDoUpdate({ target: siteState.key, set: row })
        .run();
      return events.length;
    },
    { behavior: 'immediate' },
  );
}

/** What a receiver is told; undefined where the event is none of its business. */
function dataFor({ topic, payload }: Event, owner: string, hulls: number): Record<string, unknown> | undefined {
  if (topic === 'edition.published') return { ...payload, hullsChanged: hulls, hullsToldSingly: hulls <= mostHullsToldSingly };
  if (topic !== 'correction.decided') return payload;
  const { author, ...rest } = payload;
  return author === owner ? rest : undefined;
}

function hullCounts(db: Pick<Db, 'select' | '$count'>) {
  const known = new Map<number, number>();
  return (edition: number): number => {
    let count = known.get(edition);
    if (count === undefined) {
      count = db
        .select({ id: outbox.id })
        .from(outbox)
        .where(and(eq(outbox.edition, edition), eq(outbox.topic, 'hull.changed')))
        .limit(mostHullsToldSingly + 1)
        .all().length;
      known.set(edition, count);
    }
    return count;
  };
}
