import type { Db } from '../db/connect.ts';
import { mailOutbox } from '../db/schema/mail.ts';
import { newId } from '../ids.ts';
import { writeMail } from './compose.ts';
import type { Letter } from './letters.ts';

export interface EnqueueOptions {
  now?: Date;
  /** Told once only under this key, however often it is noticed. */
  onceKey?: string;
}

/**
 * Puts a mail into the outbox. Call it inside the transaction of what it tells of: both stand or fall together.
 * @returns false where the same `onceKey` was told before
 */
export function enqueueMail(
  db: Pick<Db, 'insert'>,
  to: string,
  letter: Letter,
  { now = new Date(), onceKey }: EnqueueOptions = {},
): boolean {
  const id = newId('mai');
  const { changes } = db
    .insert(mailOutbox)
    .values({
      id,
      kind: letter.kind,
      toAddress: to.toLowerCase(),
      ...writeMail(letter),
      secret: letter.secret,
      messageId: `<${id.toLowerCase()}@mail.tiltwright.example>`,
      onceKey: onceKey ?? null,
      status: 'queued',
      dueAt: now.getTime(),
      createdAt: now.toISOString(),
    })
    .onConflictDoNothing({ target: mailOutbox.onceKey })
    .run();
  return changes === 1;
}
