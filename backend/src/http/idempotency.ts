// A creation sent twice under one Idempotency-Key happens once; the second gets the first's answer. Kept for a day.
import { createHash } from 'node:crypto';
import { and, eq, lt } from 'drizzle-orm';
import type { Db } from '../db/connect.ts';
import { idempotencyKeys } from '../db/schema/limits.ts';
import { ApiProblem } from '../errors.ts';

const keptMs = 24 * 3_600_000;
/** A first request that has not ended after this long died with its process. */
const atWorkMs = 60_000;

export interface Creation {
  userId: string;
  operation: string;
  key: string;
  request: unknown;
}

export interface FirstTry {
  /** Keeps the answer for whoever asks again. */
  keep(answer: unknown): void;
  /** Nothing was made: the next try is a first one again. */
  forget(): void;
}

/**
 * The earlier answer under this key, or the right to make one.
 * @throws ApiProblem invalid-input, idempotency-mismatch where the key stood for another request, idempotency-at-work
 */
export function beginCreation(db: Db, { userId, operation, key, request }: Creation): { earlier: unknown } | FirstTry {
  if (!/^[\x21-\x7e]{1,200}$/.test(key)) {
    const message = '1 to 200 visible ASCII characters.';
    throw new ApiProblem('invalid-input', `Idempotency-Key: ${message}`, [{ path: 'Idempotency-Key', code: 'invalid-header', message }]);
  }
  const requestHash = createHash('sha256').update(JSON.stringify(request)).digest('hex');
  const place = and(eq(idempotencyKeys.userId, userId), eq(idempotencyKeys.operation, operation), eq(idempotencyKeys.key, key));
  const createdAt = Date.now();
  const earlier = db.transaction(
    (tx) => {
      tx.delete(idempotencyKeys)
        .where(lt(idempotencyKeys.createdAt, createdAt - keptMs))
        .run();
      const row = tx.select().from(idempotencyKeys).where(place).get();
      const died = row && row.answer === null && row.createdAt < createdAt - atWorkMs;
      if (row && !died) return row;
      const fresh = { userId, operation, key, requestHash, answer: null, createdAt };
      tx.insert(idempotencyKeys)
        .values(fresh)
        .onConflictDoUpdate({ target: [idempotencyKeys.userId, idempotencyKeys.operation, idempotencyKeys.key], set: fresh })
        .run();
      return undefined;
    },
    { behavior: 'immediate' },
  );
  if (earlier) {
    if (earlier.requestHash !== requestHash)
      throw new ApiProblem('idempotency-mismatch', 'This Idempotency-Key was used for another request; take a new one.');
    if (earlier.answer === null)
      throw new ApiProblem('idempotency-at-work', 'The first request under this Idempotency-Key is still at work; ask again in a moment.');
    return { earlier: JSON.parse(earlier.answer) };
  }
  return {
    keep: (answer) =>
      void db
        .update(idempotencyKeys)
        .set({ answer: JSON.stringify(answer) })
        .where(place)
        .run(),
    forget: () => void db.delete(idempotencyKeys).where(place).run(),
  };
}
