// Sending what the outbox holds. A mail is claimed before it is sent and marked right after: two workers never send
// the same one, and a claim left by a killed worker runs out, after which the mail is sent again under the same
// Message-ID, so that a receiver who took it just before the kill knows it again.
import { and, asc, eq, inArray, lte } from 'drizzle-orm';
import type { Db } from '../db/connect.ts';
import { mailOutbox } from '../db/schema/mail.ts';
import type { MailTransport } from './transport.ts';

type Mail = typeof mailOutbox.$inferSelect;

const minute = 60_000;
/** Waits before each further try; some three days in all, then the mail has failed. */
export const retryWaitsMs = [1, 5, 15, 60, 240, 720, 1440, 1440].map((minutes) => minutes * minute);
/** Longer than any exchange with a mail server may take. */
export const claimMs = 2 * minute;

export interface DeliveryCount {
  sent: number;
  failed: number;
  later: number;
}

/** Sends everything that is due, one after the other, and says what became of it. */
export async function deliverDueMail(db: Db, transport: MailTransport, clock: () => number = Date.now): Promise<DeliveryCount> {
  const count: DeliveryCount = { sent: 0, failed: 0, later: 0 };
  for (let mail = claimNext(db, clock()); mail; mail = claimNext(db, clock())) {
    count[await deliver(db, transport, mail, clock)] += 1;
  }
  return count;
}

function claimNext(db: Db, now: number): Mail | undefined {
  return db.transaction(
    (tx) => {
      const due = tx
        .select({ id: mailOutbox.id })
        .from(mailOutbox)
        .where(and(inArray(mailOutbox.status, ['queued', 'sending']), lte(mailOutbox.dueAt, now)))
        .orderBy(asc(mailOutbox.dueAt), asc(mailOutbox.id))
        .limit(1)
        .get();
      return (
        due &&
        tx
          .update(mailOutbox)
          .set({ status: 'sending', dueAt: now + claimMs })
          .where(eq(mailOutbox.id, due.id))
          .returning()
          .get()
      );
    },
    { behavior: 'immediate' },
  );
}

async function deliver(db: Db, transport: MailTransport, mail: Mail, clock: () => number): Promise<keyof DeliveryCount> {
  const attempts = mail.attempts + 1;
  const set = (values: Partial<Mail>) =>
    db
      .update(mailOutbox)
      .set({ attempts, ...values })
      .where(and(eq(mailOutbox.id, mail.id), eq(mailOutbox.status, 'sending')))
      .run();
  try {
    await transport.send({ ...mail, to: mail.toAddress, text: mail.text ?? '', html: mail.html ?? '' });
  } catch (error) {
    const problem = wordsOf(error);
    const wait = retryWaitsMs[attempts - 1];
    if (isFinal(error) || wait === undefined) {
      set({ status: 'failed', problem });
      return 'failed';
    }
    set({ status: 'queued', problem, dueAt: clock() + wait });
    return 'later';
  }
  // A link that opens something does not stay readable here once it has gone out.
  const erased = mail.secret && transport.leaves ? { text: null, html: null } : {};
  set({ status: 'sent', sentAt: new Date(clock()).toISOString(), problem: null, ...erased });
  return 'sent';
}

/** 5xx answers of a mail server are final (RFC 5321, 4.2.1); everything else may pass. */
const isFinal = (error: unknown) => Number((error as { responseCode?: number }).responseCode ?? 0) >= 500;

const wordsOf = (error: unknown) => (error instanceof Error ? error.message : String(error)).replace(/\s+/g, ' ').slice(0, 500);
