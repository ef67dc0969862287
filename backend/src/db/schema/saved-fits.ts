import type { FitAnswer, FitQuestion } from '@tiltwright/shared/schemas/fit.ts';
import { sql } from 'drizzle-orm';
import { check, index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { boats, users } from './people.ts';

/** A question with the answer it got, by which engine and edition. */
export const savedFits = sqliteTable(
  'saved_fits',
  {
    id: text('id').primaryKey(),
    userId: text('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    boatId: text('boat_id').references(() => boats.id, { onDelete: 'set null' }),
    name: text('name').notNull(),
    note: text('note'),
    question: text('question', { mode: 'json' }).$type<FitQuestion>().notNull(),
    answer: text('answer', { mode: 'json' }).$type<FitAnswer>().notNull(),
    engineVersion: text('engine_version').notNull(),
    edition: integer('edition').notNull(),
    revision: integer('revision').notNull().default(1),
    createdAt: text('created_at').notNull(),
    updatedAt: text('updated_at').notNull(),
  },
  (table) => [
    index('saved_fits_user').on(table.userId),
    check('saved_fits_question', sql.raw('json_valid(question)')),
    check('saved_fits_answer', sql.raw('json_valid(answer)')),
    check('saved_fits_revision', sql.raw('revision >= 1')),
  ],
);

/** Links that open one saved fit to whoever has them. The token is kept readable: its owner copies the link again and again. */
export const shares = sqliteTable(
  'shares',
  {
    id: text('id').primaryKey(),
    token: text('token').notNull().unique(),
    userId: text('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    fitId: text('fit_id')
      .notNull()
      .references(() => savedFits.id, { onDelete: 'cascade' }),
    createdAt: text('created_at').notNull(),
    revokedAt: text('revoked_at'),
  },
  (table) => [index('shares_user').on(table.userId)],
);
