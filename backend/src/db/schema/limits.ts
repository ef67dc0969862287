import { sql } from 'drizzle-orm';
import { check, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { apiKeys, users } from './people.ts';

/** Limits an admin has changed; a kind of caller without a row has the configured ones. */
export const limits = sqliteTable(
  'limits',
  {
    caller: text('caller').$type<'anonymous' | 'page' | 'account' | 'key'>().primaryKey(),
    unitsPerMinute: integer('units_per_minute').notNull(),
    /** Null: no limit by day. */
    unitsPerDay: integer('units_per_day'),
    changedAt: text('changed_at').notNull(),
    changedBy: text('changed_by').notNull(),
  },
  () => [
    check('limits_caller', sql.raw("caller IN ('anonymous', 'page', 'account', 'key')")),
    check('limits_minute', sql.raw('units_per_minute BETWEEN 1 AND 1000000000')),
    check('limits_day', sql.raw('units_per_day IS NULL OR units_per_day BETWEEN 1 AND 1000000000')),
  ],
);

/** What each key asked for on each day (UTC). */
export const usage = sqliteTable(
  'usage',
  {
    keyId: text('key_id')
      .notNull()
      .references(() => apiKeys.id, { onDelete: 'cascade' }),
    /** 2026-05-31 */
    day: text('day').notNull(),
    requests: integer('requests').notNull(),
    units: integer('units').notNull(),
    /** Of the requests, those answered 429. */
    refused: integer('refused').notNull(),
  },
  (table) => [primaryKey({ columns: [table.keyId, table.day] })],
);

/** Answers kept for a day, so that a creation sent twice under one Idempotency-Key happens once. */
export const idempotencyKeys = sqliteTable(
  'idempotency_keys',
  {
    userId: text('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    operation: text('operation').notNull(),
    key: text('key').notNull(),
    /** SHA-256 of parameters and body. */
    requestHash: text('request_hash').notNull(),
    /** Null while the first request is still at work. */
    answer: text('answer'),
    createdAt: integer('created_at').notNull(),
  },
  (table) => [primaryKey({ columns: [table.userId, table.operation, table.key] })],
);
