import { sql } from 'drizzle-orm';
import { check, index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core';

export type MailStatus = 'queued' | 'sending' | 'sent' | 'failed';

/** Mails to send, written in the same transaction as what they tell of; a worker claims them one by one. */
export const mailOutbox = sqliteTable(
  'mail_outbox',
  {
    id: text('id').primaryKey(),
    kind: text('kind').notNull(),
    /** Lower case. */
    toAddress: text('to_address').notNull(),
    subject: text('subject').notNull(),
    /** Null once erased: thirty days after sending, or at once where it held a secret and has left this machine. */
    text: text('text'),
    html: text('html'),
    /** The body holds a link that opens something. */
    secret: integer('secret', { mode: 'boolean' }).notNull(),
    /** Same at every try, so that a receiver who had it before a kill knows it again. */
    messageId: text('message_id').notNull().unique(),
    /** What must be told once only, however often it is noticed. */
    onceKey: text('once_key').unique(),
    status: text('status').$type<MailStatus>().notNull(),
    attempts: integer('attempts').notNull().default(0),
    /** Milliseconds since 1970: not before this; while sending, when the claim runs out. */
    dueAt: integer('due_at').notNull(),
    problem: text('problem'),
    createdAt: text('created_at').notNull(),
    sentAt: text('sent_at'),
  },
  (table) => [
    index('mail_outbox_due').on(table.status, table.dueAt),
    index('mail_outbox_address').on(table.toAddress, table.kind, table.createdAt),
    check('mail_outbox_status', sql.raw("status IN ('queued', 'sending', 'sent', 'failed')")),
  ],
);

/** Small facts the site keeps about itself, e.g. when it last tidied up. */
export const siteState = sqliteTable(
  'site_state',
  {
    key: text('key').primaryKey(),
    value: text('value', { mode: 'json' }).$type<Record<string, unknown>>().notNull(),
    at: text('at').notNull(),
  },
  () => [check('site_state_value', sql.raw('json_valid(value)'))],
);
