// Making, changing and testing webhooks. A target is checked when it is given and again at every delivery.
import type { CreatedWebhook, NewWebhook, WebhookChange } from '@tiltwright/shared/schemas/webhook.ts';
import { count, eq } from 'drizzle-orm';
import type { Config } from '../../config.ts';
import type { Db } from '../../db/connect.ts';
import { deliveries, webhooks } from '../../db/schema/webhooks.ts';
import { ApiProblem } from '../../errors.ts';
import { newId } from '../../ids.ts';
import { readTarget, UnsafeTarget } from '../../webhooks/safe-target.ts';
import { newWebhookSecret } from '../../webhooks/sign.ts';
import { targetRules } from '../../webhooks/webhook-worker.ts';
import { audit } from '../audit.ts';
import { type DeliveryRow, type HookRow, hookOrProblem, ownHook, toWebhook } from './queries.ts';

const mostHooks = 50;

/** @throws ApiProblem invalid-input for a target that may not be, wrong-state at the bound on webhooks */
export function createWebhook(db: Db, config: Config, owner: string, { url, name, topics }: NewWebhook): CreatedWebhook {
  demandTarget(config, url);
  const row: HookRow = {
    id: newId('whk'),
    userId: owner,
    url,
    name,
    topics: [...new Set(topics)],
    secret: newWebhookSecret(),
    previousSecret: null,
    previousUntil: null,
    disabledAt: null,
    disabledWhy: null,
    revision: 1,
    createdAt: new Date().toISOString(),
  };
  db.transaction(
    (tx) => {
      const { n } = tx.select({ n: count() }).from(webhooks).where(eq(webhooks.userId, owner)).get()!;
      if (n >= mostHooks) throw new ApiProblem('wrong-state', `An account keeps ${mostHooks} webhooks at most.`);
      tx.insert(webhooks).values(row).run();
      audit(tx, owner, 'webhook.create', row.id, { host: new URL(url).host });
    },
    { behavior: 'immediate' },
  );
  return { ...toWebhook(row), secret: row.secret };
}

/** `check` sees the row as it stands, inside the transaction that changes it. */
export function changeWebhook(
  db: Db,
  config: Config,
  owner: string,
  id: string,
  { url, name, topics, enabled }: WebhookChange,
  check: (row: HookRow) => void,
): HookRow {
  if (url !== undefined) demandTarget(config, url);
  return db.transaction(
    (tx) => {
      const before = hookOrProblem(tx, owner, id);
      check(before);
      const ended = enabled === false && before.disabledAt === null;
      const after: HookRow = {
        ...before,
        ...(url !== undefined && { url }),
        ...(name !== undefined && { name }),
        ...(topics !== undefined && { topics: [...new Set(topics)] }),
        ...(enabled === true && { disabledAt: null, disabledWhy: null }),
        ...(ended && { disabledAt: new Date().toISOString(), disabledWhy: 'Disabled by its owner.' }),
        revision: before.revision + 1,
      };
      tx.update(webhooks).set(after).where(ownHook(owner, id)).run();
      return after;
    },
    { behavior: 'immediate' },
  );
}

/** A new secret; deliveries are signed with both for the overlap. @throws ApiProblem not-found */
export function rotateSecret(db: Db, owner: string, id: string, overlapHours: number): CreatedWebhook {
  return db.transaction(
    (tx) => {
      const before = hookOrProblem(tx, owner, id);
      const after: HookRow = {
        ...before,
        secret: newWebhookSecret(),
        previousSecret: overlapHours > 0 ? before.secret : null,
        previousUntil: overlapHours > 0 ? new Date(Date.now() + overlapHours * 3_600_000).toISOString() : null,
        revision: before.revision + 1,
      };
      tx.update(webhooks).set(after).where(ownHook(owner, id)).run();
      audit(tx, owner, 'webhook.rotate', id, { overlapHours });
      return { ...toWebhook(after), secret: after.secret };
    },
    { behavior: 'immediate' },
  );
}

/** Its delivery log goes with it. @throws ApiProblem not-found */
export function removeWebhook(db: Db, owner: string, id: string, check: (row: HookRow) => void): void {
  db.transaction(
    (tx) => {
      check(hookOrProblem(tx, owner, id));
      tx.delete(webhooks).where(ownHook(owner, id)).run();
      audit(tx, owner, 'webhook.delete', id);
    },
    { behavior: 'immediate' },
  );
}

/** A message to try a receiver with. @throws ApiProblem wrong-state for a disabled webhook */
export function sendTest(db: Db, hook: HookRow): DeliveryRow {
  const at = new Date().toISOString();
  const body = JSON.stringify({ type: 'webhook.test', timestamp: at, data: { webhook: hook.id } });
  return enqueue(db, hook, { messageId: newId('evt'), topic: 'webhook.test', body });
}

/** The same message once more, under its own id. @throws ApiProblem wrong-state for a disabled webhook or one still on its way */
export function replayDelivery(db: Db, hook: HookRow, delivery: DeliveryRow): DeliveryRow {
  demandEnabled(hook);
  if (delivery.status === 'waiting' || delivery.status === 'sending')
    throw new ApiProblem('wrong-state', 'This delivery is still on its way.');
  const again = { status: 'waiting' as const, tries: 0, dueAt: Date.now() };
  db.update(deliveries).set(again).where(eq(deliveries.id, delivery.id)).run();
  return { ...delivery, ...again };
}

function enqueue(db: Db, hook: HookRow, message: Pick<DeliveryRow, 'messageId' | 'topic' | 'body'>): DeliveryRow {
  demandEnabled(hook);
  const row: DeliveryRow = {
    id: newId('del'),
    webhookId: hook.id,
    ...message,
    status: 'waiting',
    tries: 0,
    dueAt: Date.now(),
    lastTryAt: null,
    lastStatus: null,
    lastError: null,
    lastMs: null,
    createdAt: new Date().toISOString(),
  };
  db.insert(deliveries).values(row).run();
  return row;
}

function demandEnabled({ disabledAt }: HookRow): void {
  if (disabledAt !== null) throw new ApiProblem('wrong-state', 'The webhook is disabled; take it up again first.');
}

function demandTarget(config: Config, url: string): void {
  try {
    readTarget(url, targetRules(config));
  } catch (error) {
    if (!(error instanceof UnsafeTarget)) throw error;
    throw new ApiProblem('invalid-input', `url: ${error.message}`, [{ path: '/url', code: 'unsafe-target', message: error.message }]);
  }
}
