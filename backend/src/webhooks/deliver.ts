// Sends what is due, again after growing waits for some three days, then gives up and says so.
import { and, asc, eq, inArray, isNull, lt, lte, or } from 'drizzle-orm';
import type { Db } from '../db/connect.ts';
import { users } from '../db/schema/people.ts';
import { deliveries, webhooks } from '../db/schema/webhooks.ts';
import { enqueueMail } from '../mail/enqueue-mail.ts';
import { webhookDisabled } from '../mail/letters.ts';
import type { TargetRules } from './safe-target.ts';
import { sendOnce, type Try } from './send.ts';
import { signedHeaders } from './sign.ts';

type Delivery = typeof deliveries.$inferSelect;
type Hook = typeof webhooks.$inferSelect;

const second = 1000;
const minute = 60 * second;
const hour = 60 * minute;
/** Waits after the first, second, … failed try, as the specification proposes them: some 76 hours in all. */
export const retryWaitsMs = [5 * second, 5 * minute, 30 * minute, 2 * hour, 5 * hour, 10 * hour, 14 * hour, 20 * hour, 24 * hour];
/** Many receivers failing at once shall not all be tried again at once. */
const jitterShare = 0.1;
/** A try takes five seconds at most; one that has not come back by then went down with its process. */
const claimMs = minute;
const atOnce = 16;
/** A slow receiver must not hold up the others. */
const atOnceForOne = 4;

export interface DeliverTools {
  rules: TargetRules;
  siteUrl: string;
  now?: () => number;
}

/** One round over what is due. @returns tries made */
export async function deliverDue(db: Db, { rules, siteUrl, now = Date.now }: DeliverTools): Promise<number> {
  const claimed = claimDue(db, now());
  await Promise.all(
    claimed.map(async ({ delivery, hook }) => {
      const at = now();
      const seconds = Math.floor(at / second);
      const headers = signedHeaders(secretsOf(hook, at), delivery.messageId, seconds, delivery.body);
      const outcome = await sendOnce(hook.url, headers, delivery.body, rules);
      settle(db, delivery, hook, outcome, siteUrl, now());
    }),
  );
  return claimed.length;
}

function secretsOf({ secret, previousSecret, previousUntil }: Hook, at: number): string[] {
  const overlap = previousSecret !== null && previousUntil !== null && Date.parse(previousUntil) > at;
  return overlap ? [secret, previousSecret] : [secret];
}

/** Takes due deliveries in hand: nobody else sends them while the claim lasts. */
function claimDue(db: Db, at: number): { delivery: Delivery; hook: Hook }[] {
  return db.transaction(
    (tx) => {
      const due = tx
        .select({ delivery: deliveries, hook: webhooks })
        .from(deliveries)
        .innerJoin(webhooks, eq(webhooks.id, deliveries.webhookId))
        .where(and(inArray(deliveries.status, ['waiting', 'sending']), lte(deliveries.dueAt, at), isNull(webhooks.disabledAt)))
        .orderBy(asc(deliveries.dueAt), asc(deliveries.id))
        .limit(4 * atOnce)
        .all();
      const taken = new Map<string, number>();
      const chosen = due
        .filter(({ hook }) => {
          const n = (taken.get(hook.id) ?? 0) + 1;
          taken.set(hook.id, n);
          return n <= atOnceForOne;
        })
        .slice(0, atOnce);
      for (const { delivery } of chosen)
        tx.update(deliveries)
          .set({ status: 'sending', dueAt: at + claimMs })
          .where(eq(deliveries.id, delivery.id))
          .run();
      return chosen;
    },
    { behavior: 'immediate' },
  );
}

function settle(db: Db, delivery: Delivery, hook: Hook, { status, error, ms }: Try, siteUrl: string, at: number): void {
  const tries = delivery.tries + 1;
  const noted = { tries, lastTryAt: new Date(at).toISOString(), lastStatus: status, lastError: error, lastMs: ms };
  const wait = retryWaitsMs[tries - 1];
  const mine = eq(deliveries.id, delivery.id);
  if (error === null) {
    db.update(deliveries)
      .set({ ...noted, status: 'delivered' })
      .where(mine)
      .run();
    return;
  }
  // 410 Gone: the receiver says it wants no more, by the specification.
  const gone = status === 410;
  if (wait !== undefined && !gone) {
    const dueAt = Math.round(at + wait * (1 + jitterShare * Math.random()));
    db.update(deliveries)
      .set({ ...noted, status: 'waiting', dueAt })
      .where(mine)
      .run();
    return;
  }
  const why = gone ? 'The receiver answered 410 Gone.' : `${tries} tries over three days failed; the last: ${error}.`;
  db.transaction(
    (tx) => {
      tx.update(deliveries)
        .set({ ...noted, status: 'failed' })
        .where(mine)
        .run();
      const { changes } = tx
        .update(webhooks)
        .set({ disabledAt: new Date(at).toISOString(), disabledWhy: why })
        .where(and(eq(webhooks.id, hook.id), isNull(webhooks.disabledAt)))
        .run();
      const owner = tx.select({ email: users.email }).from(users).where(eq(users.id, hook.userId)).get();
      if (changes === 1 && owner)
        enqueueMail(tx, owner.email, webhookDisabled(hook.name, why, `${siteUrl}/integrate`), { now: new Date(at) });
    },
    { behavior: 'immediate' },
  );
}

/** Deliveries that have ended, older than the time they are kept. */
export function removeOldDeliveries(db: Db, before: Date): number {
  return db
    .delete(deliveries)
    .where(and(or(eq(deliveries.status, 'delivered'), eq(deliveries.status, 'failed')), lt(deliveries.createdAt, before.toISOString())))
    .run().changes;
}
