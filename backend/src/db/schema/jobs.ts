import { sql } from 'drizzle-orm';
import { check, index, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { users } from './people.ts';

export const jobStatuses = ['waiting', 'running', 'done', 'cancelled', 'failed'] as const;

/** Work that takes longer than a request; its results are kept a line each. */
export const jobs = sqliteTable(
  'jobs',
  {
    id: text('id').primaryKey(),
    userId: text('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    order: text('order_json', { mode: 'json' }).$type<Record<string, unknown>>().notNull(),
    status: text('status').$type<(typeof jobStatuses)[number]>().notNull(),
    done: integer('done').notNull().default(0),
    total: integer('total').notNull(),
    edition: integer('edition').notNull(),
    error: text('error'),
    createdAt: text('created_at').notNull(),
    endedAt: text('ended_at'),
  },
  (table) => [
    index('jobs_user').on(table.userId),
    check('jobs_status', sql.raw(`status IN (${jobStatuses.map((status) => `'${status}'`).join(', ')})`)),
    check('jobs_order', sql.raw('json_valid(order_json)')),
  ],
);

/** In the order of hull ids, which is also the order of the work: the last one says where to go on after a restart. */
export const jobResults = sqliteTable(
  'job_results',
  {
    jobId: text('job_id')
      .notNull()
      .references(() => jobs.id, { onDelete: 'cascade' }),
    hullId: text('hull_id').notNull(),
    verdict: text('verdict').notNull(),
    reasons: text('reasons', { mode: 'json' }).$type<string[]>().notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.jobId, table.hullId] }),
    check('job_results_verdict', sql.raw("verdict IN ('fits', 'fits-with-care', 'does-not-fit', 'cannot-tell')")),
  ],
);
