import { and, count, eq, gt } from 'drizzle-orm';
import type { Db } from '../db/connect.ts';
import { mailOutbox } from '../db/schema/mail.ts';
import type { MailKind } from './letters.ts';

const mostAnHour = 3;

/** Whether an address has had its share of such mails: nobody's mailbox is to be filled through a form of ours. */
export function hadEnoughMail(db: Pick<Db, 'select'>, to: string, kind: MailKind, now: Date): boolean {
  const hourAgo = new Date(now.getTime() - 3_600_000).toISOString();
  const recent = db
    .select({ n: count() })
    .from(mailOutbox)
    .where(and(eq(mailOutbox.toAddress, to), eq(mailOutbox.kind, kind), gt(mailOutbox.createdAt, hourAgo)))
    .get();
  return (recent?.n ?? 0) >= mostAnHour;
}
