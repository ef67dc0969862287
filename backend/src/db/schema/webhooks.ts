import { sql } from 'drizzle-orm';
import { check, index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { users } from './people.ts';

export const webhooks = sqliteTable(
  'webhooks',
  {
    id: text('id').primaryKey(),
    userId: text('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    url: text('url').notNull(),
    name: text('name').notNull(),
    topics: text('topics', { mode: 'json' }).$type<string[]>().notNull(),
    /** `whsec_` and base64; kept readable, since every delivery is signed with it. */
    secret: text('secret').notNull(),
    /** The secret before the last rotation; deliveries carry its signature too until `previousUntil`. */
    previousSecret: text('previous_secret'),
    previousUntil: text('previous_until'),
    disabledAt: text('disabled_at'),
    disabledWhy: text('disabled_why'),
    revision: integer('revision').notNull().default(1),
    createdAt: text('created_at').notNull(),
  },
  (table) => [index('webhooks_user').on(table.userId), check('webhooks_topics', sql.raw('json_valid(topics)'))],
);

export const deliveryStatuses = ['waiting', 'sending', 'delivered', 'failed'] as const;

/** One message to one webhook, from the event to its arrival or its being given up. */
export const deliveries = sqliteTable(
  'deliveries',
  {
    id: text('id').primaryKey(),
    webhookId: text('webhook_id')
      .notNull()
      .references(() => webhooks.id, { onDelete: 'cascade' }),
    /** The `webhook-id` header: the same for every try, so that a receiver knows a repeat. */
    messageId: text('message_id').notNull(),
    topic: text('topic').notNull(),
    body: text('body').notNull(),
    status: text('status').$type<(typeof deliveryStatuses)[number]>().notNull(),
    tries: integer('tries').notNull().default(0),
    /** When it is due, or when a try that has not come back counts as lost. */
    dueAt: integer('due_at').notNull(),
    lastTryAt: text('last_try_at'),
    lastStatus: integer('last_status'),
    lastError: text('last_error'),
    lastMs: integer('last_ms'),
    createdAt: text('created_at').notNull(),
  },
  (table) => [
    index('deliveries_due').on(table.status, table.dueAt),
    index('deliveries_webhook').on(table.webhookId, table.id),
    // One message an event and webhook, however often the spreading is begun anew.
    uniqueIndex('deliveries_message').on(table.webhookId, table.messageId),
    check('deliveries_status', sql.raw(`status IN (${deliveryStatuses.map((status) => `'${status}'`).join(', ')})`)),
  ],
);
