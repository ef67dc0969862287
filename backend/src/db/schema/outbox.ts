// What the world is to be told: written in the very transaction that makes it true, delivered afterwards.
import { sql } from 'drizzle-orm';
import { check, index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';

export const outboxTopics = ['edition.published', 'hull.changed', 'hull.superseded', 'correction.decided'] as const;
export type OutboxTopic = (typeof outboxTopics)[number];

/** Grows only at its end: whoever delivers keeps the last id it has dealt with. */
export const outbox = sqliteTable(
  'outbox',
  {
    id: integer('id').primaryKey({ autoIncrement: true }),
    edition: integer('edition'),
    topic: text('topic').$type<OutboxTopic>().notNull(),
    payload: text('payload', { mode: 'json' }).$type<Record<string, unknown>>().notNull(),
    createdAt: text('created_at').notNull(),
  },
  (table) => [
    index('outbox_edition').on(table.edition),
    check('outbox_topic', sql.raw(`topic IN (${outboxTopics.map((topic) => `'${topic}'`).join(', ')})`)),
  ],
);
