import { and, eq, isNotNull, isNull } from 'drizzle-orm';
import { hashRecoveryCode, openSecret, stepOfCode } from '../../auth/second-factor.ts';
import { recoveryCodes, secondFactors } from '../../db/schema/access.ts';
import type { Deps } from '../../deps.ts';
import type { User } from '../accounts/queries.ts';
import { audit } from '../audit.ts';

/** Takes an authenticator's code, or uses up a recovery code; false where it is neither. */
export function takeCode({ db, config }: Pick<Deps, 'db' | 'config'>, user: User, code: string, now = new Date()): boolean {
  return db.transaction(
    (tx) => {
      const mine = and(eq(secondFactors.userId, user.id), isNotNull(secondFactors.confirmedAt));
      const factor = tx.select().from(secondFactors).where(mine).get();
      const secret = factor && openSecret(factor.sealedSecret, config.sessionSecret);
      const step = secret ? stepOfCode(secret, code, factor.lastStep, now.getTime()) : null;
      if (step !== null) {
        tx.update(secondFactors).set({ lastStep: step }).where(mine).run();
        return true;
      }
      const unused = and(
        eq(recoveryCodes.userId, user.id),
        eq(recoveryCodes.codeHash, hashRecoveryCode(code)),
        isNull(recoveryCodes.usedAt),
      );
      const { changes } = tx.update(recoveryCodes).set({ usedAt: now.toISOString() }).where(unused).run();
      if (changes === 1) audit(tx, user.id, 'second-factor.recovery', user.id);
      return changes === 1;
    },
    { behavior: 'immediate' },
  );
}
