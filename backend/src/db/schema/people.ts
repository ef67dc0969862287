import type { Role, Scope } from '@tiltwright/shared/schemas/account.ts';
import type { FitQuestion } from '@tiltwright/shared/schemas/fit.ts';
import { sql } from 'drizzle-orm';
import { check, index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';

export const users = sqliteTable('users', {
  id: text('id').primaryKey(),
  /** Lower case. */
  email: text('email').notNull().unique(),
  name: text('name').notNull(),
  /** argon2id, PHC string. */
  passwordHash: text('password_hash').notNull(),
  roles: text('roles', { mode: 'json' }).$type<Role[]>().notNull(),
  createdAt: text('created_at').notNull(),
  disabledAt: text('disabled_at'),
});

export const sessions = sqliteTable(
  'sessions',
  {
    /** SHA-256 of the session id: a copy of the table opens no session. */
    idHash: text('id_hash').primaryKey(),
    userId: text('user_id').references(() => users.id, { onDelete: 'cascade' }),
    data: text('data').notNull(),
    expiresAt: integer('expires_at').notNull(),
  },
  (table) => [index('sessions_user').on(table.userId), index('sessions_expires').on(table.expiresAt)],
);

export const apiKeys = sqliteTable(
  'api_keys',
  {
    id: text('id').primaryKey(),
    userId: text('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    name: text('name').notNull(),
    /** SHA-256 of the secret; 256 random bits need no slow hash. */
    secretHash: text('secret_hash').notNull(),
    scopes: text('scopes', { mode: 'json' }).$type<Scope[]>().notNull(),
    kind: text('kind').$type<'server' | 'browser'>().notNull().default('server'),
    /** Origins of the pages that may use a browser key. */
    origins: text('origins', { mode: 'json' }).$type<string[]>().notNull().default([]),
    /** The secret before the last rotation, good until `previousUntil`. */
    previousHash: text('previous_hash'),
    previousUntil: text('previous_until'),
    expiresAt: text('expires_at'),
    createdAt: text('created_at').notNull(),
    lastUsedAt: text('last_used_at'),
    revokedAt: text('revoked_at'),
  },
  (table) => [index('api_keys_user').on(table.userId)],
);

export const boats = sqliteTable(
  'boats',
  {
    id: text('id').primaryKey(),
    userId: text('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    name: text('name').notNull(),
    story: text('story'),
    hullId: text('hull_id'),
    /** The rig, as the question it asks. */
    question: text('question', { mode: 'json' }).$type<FitQuestion>().notNull(),
    /** Grows by one with each change; its ETag. */
    revision: integer('revision').notNull().default(1),
    createdAt: text('created_at').notNull(),
    /** Empty where it was never changed. */
    updatedAt: text('updated_at').notNull().default(''),
  },
  (table) => [index('boats_user').on(table.userId), check('boats_question', sql.raw('json_valid(question)'))],
);

/** Append-only, by trigger. Actors are opaque ids, so that forgetting a person leaves the history whole and nameless. */
export const auditLog = sqliteTable(
  'audit_log',
  {
    entry: integer('entry').primaryKey({ autoIncrement: true }),
    at: text('at').notNull(),
    actor: text('actor'),
    action: text('action').notNull(),
    subject: text('subject'),
    detail: text('detail', { mode: 'json' }).$type<Record<string, unknown>>(),
  },
  (table) => [index('audit_log_at').on(table.at)],
);
