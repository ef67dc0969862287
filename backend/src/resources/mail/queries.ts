import type { Mail, MailSheet } from '@tiltwright/shared/schemas/desk.ts';
import { and, desc, eq } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { type MailStatus, mailOutbox } from '../../db/schema/mail.ts';
import { ApiProblem } from '../../errors.ts';

type Row = typeof mailOutbox.$inferSelect;

export const toMail = ({ id, kind, toAddress, subject, status, attempts, dueAt, problem, createdAt, sentAt }: Row): Mail => ({
  id,
  kind,
  to: toAddress,
  subject,
  status,
  attempts,
  nextTryAt: status === 'queued' ? new Date(dueAt).toISOString() : null,
  problem,
  createdAt,
  sentAt,
});

/** @param leaves whether mails are really sent: then a link that opens something is nobody's but the receiver's */
export const toMailSheet = (row: Row, leaves: boolean): MailSheet => ({ ...toMail(row), text: row.secret && leaves ? null : row.text });

export const listMails = (db: Db, status: MailStatus | undefined, limit: number, offset: number): Row[] =>
  db
    .select()
    .from(mailOutbox)
    .where(status && eq(mailOutbox.status, status))
    .orderBy(desc(mailOutbox.id))
    .limit(limit + 1)
    .offset(offset)
    .all();

export const mailsTo = (db: Db, to: string, limit: number): Row[] =>
  db.select().from(mailOutbox).where(eq(mailOutbox.toAddress, to)).orderBy(desc(mailOutbox.id)).limit(limit).all();

/** @throws ApiProblem not-found */
export function mailOrProblem(db: Db, id: string): Row {
  const row = db.select().from(mailOutbox).where(eq(mailOutbox.id, id)).get();
  if (!row) throw new ApiProblem('not-found', `There is no mail ${id}.`);
  return row;
}

/** Puts a mail that failed or waits at the head of the queue. @throws ApiProblem wrong-state for one that was sent */
export function resendMail(db: Pick<Db, 'update'>, row: Row, now = Date.now()): void {
  const again = { status: 'queued', dueAt: now, attempts: 0 } as const;
  const waiting = row.status === 'failed' || row.status === 'queued';
  const { changes } = waiting
    ? db
        .update(mailOutbox)
        .set(again)
        .where(and(eq(mailOutbox.id, row.id), eq(mailOutbox.status, row.status)))
        .run()
    : { changes: 0 };
  if (changes === 0) throw new ApiProblem('wrong-state', 'This mail was sent or is on its way; nobody gets one twice.');
  if (row.text === null) throw new ApiProblem('wrong-state', 'The body of this mail is erased; have it written anew.');
}
