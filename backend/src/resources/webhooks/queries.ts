// Every query is by owner: someone else's webhook is not there.
import type { Delivery, Webhook, WebhookTopic } from '@tiltwright/shared/schemas/webhook.ts';
import { and, asc, desc, eq, lt } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { deliveries, webhooks } from '../../db/schema/webhooks.ts';
import { ApiProblem } from '../../errors.ts';

export type HookRow = typeof webhooks.$inferSelect;
export type DeliveryRow = typeof deliveries.$inferSelect;

export const ownHook = (owner: string, id: string) => and(eq(webhooks.userId, owner), eq(webhooks.id, id));

export const listHooks = (db: Db, owner: string): HookRow[] =>
  db.select().from(webhooks).where(eq(webhooks.userId, owner)).orderBy(asc(webhooks.id)).all();

/** @throws ApiProblem not-found */
export function hookOrProblem(db: Pick<Db, 'select'>, owner: string, id: string): HookRow {
  const row = db.select().from(webhooks).where(ownHook(owner, id)).get();
  if (!row) throw new ApiProblem('not-found', `You have no webhook ${id}.`);
  return row;
}

/** Newest first. */
export const listDeliveries = (db: Db, hook: string, limit: number, before: string | undefined): DeliveryRow[] =>
  db
    .select()
    .from(deliveries)
    .where(and(eq(deliveries.webhookId, hook), ...(before === undefined ? [] : [lt(deliveries.id, before)])))
    .orderBy(desc(deliveries.id))
    .limit(limit)
    .all();

/** @throws ApiProblem not-found */
export function deliveryOrProblem(db: Db, hook: string, id: string): DeliveryRow {
  const row = db
    .select()
    .from(deliveries)
    .where(and(eq(deliveries.webhookId, hook), eq(deliveries.id, id)))
    .get();
  if (!row) throw new ApiProblem('not-found', `This webhook has no delivery ${id}.`);
  return row;
}

export function toWebhook({ id, url, name, topics, disabledAt, disabledWhy, previousUntil, revision, createdAt }: HookRow): Webhook {
  const overlap = previousUntil !== null && previousUntil > new Date().toISOString() ? previousUntil : null;
  return { id, url, name, topics: topics as WebhookTopic[], disabledAt, disabledWhy, previousUntil: overlap, revision, createdAt };
}

export function toDelivery(row: DeliveryRow): Delivery {
  const { id, messageId, topic, status, tries, dueAt, lastTryAt, lastStatus, lastError, lastMs, body, createdAt } = row;
  const nextTryAt = status === 'waiting' ? new Date(dueAt).toISOString() : null;
  return { id, messageId, topic, status, tries, nextTryAt, lastTryAt, lastStatus, lastError, lastMs, body, createdAt };
}

export const hookTag = ({ id, revision }: HookRow) => `${id}.${revision}`;
