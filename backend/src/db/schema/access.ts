// How people get in: sign-ups not yet proven, resets, invitations, second factors. Tokens are kept as SHA-256 alone.
import type { Role, Units } from '@tiltwright/shared/schemas/account.ts';
import { sql } from 'drizzle-orm';
import { check, index, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { users } from './people.ts';

/** What a person chose for themselves beyond name and address. */
export const profiles = sqliteTable(
  'profiles',
  {
    userId: text('user_id')
      .primaryKey()
      .references(() => users.id, { onDelete: 'cascade' }),
    units: text('units', { mode: 'json' }).$type<Units>(),
  },
  () => [check('profiles_units', sql.raw('units IS NULL OR json_valid(units)'))],
);

/** An account comes about once its address is proven; until then only this row stands. */
export const signUps = sqliteTable(
  'sign_ups',
  {
    tokenHash: text('token_hash').primaryKey(),
    /** Lower case. */
    email: text('email').notNull(),
    name: text('name').notNull(),
    /** argon2id, PHC string. */
    passwordHash: text('password_hash').notNull(),
    roles: text('roles', { mode: 'json' }).$type<Role[]>().notNull(),
    createdAt: text('created_at').notNull(),
    expiresAt: text('expires_at').notNull(),
  },
  (table) => [index('sign_ups_email').on(table.email)],
);

export const passwordResets = sqliteTable(
  'password_resets',
  {
    tokenHash: text('token_hash').primaryKey(),
    userId: text('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    createdAt: text('created_at').notNull(),
    expiresAt: text('expires_at').notNull(),
  },
  (table) => [index('password_resets_user').on(table.userId)],
);

export const invitations = sqliteTable(
  'invitations',
  {
    id: text('id').primaryKey(),
    tokenHash: text('token_hash').notNull().unique(),
    /** Lower case. */
    email: text('email').notNull(),
    roles: text('roles', { mode: 'json' }).$type<Role[]>().notNull(),
    /** Opaque id of the admin. */
    invitedBy: text('invited_by').notNull(),
    createdAt: text('created_at').notNull(),
    expiresAt: text('expires_at').notNull(),
    acceptedAt: text('accepted_at'),
    acceptedBy: text('accepted_by'),
    revokedAt: text('revoked_at'),
  },
  (table) => [index('invitations_email').on(table.email)],
);

export const secondFactors = sqliteTable('second_factors', {
  userId: text('user_id')
    .primaryKey()
    .references(() => users.id, { onDelete: 'cascade' }),
  /** The shared secret, sealed with a key that is not in the database. */
  sealedSecret: text('sealed_secret').notNull(),
  createdAt: text('created_at').notNull(),
  /** Null until a first code proved that the person's device has the secret. */
  confirmedAt: text('confirmed_at'),
  /** The newest 30-second step a code was taken for: a code works once. */
  lastStep: integer('last_step').notNull().default(0),
});

export const recoveryCodes = sqliteTable(
  'recovery_codes',
  {
    userId: text('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    /** SHA-256; 80 random bits need no slow hash. */
    codeHash: text('code_hash').notNull(),
    usedAt: text('used_at'),
  },
  (table) => [primaryKey({ columns: [table.userId, table.codeHash] })],
);
