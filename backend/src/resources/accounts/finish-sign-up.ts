import type { Verification } from '@tiltwright/shared/schemas/access.ts';
import { and, eq, gt } from 'drizzle-orm';
import { hashSecret } from '../../auth/keys.ts';
import { checkPassword } from '../../auth/passwords.ts';
import type { Db } from '../../db/connect.ts';
import { signUps } from '../../db/schema/access.ts';
import { ApiProblem } from '../../errors.ts';
import { insertAccount } from './create-account.ts';
import type { User } from './queries.ts';

/**
 * Makes the account a mail's link stands for. The password is asked once more: someone else may have typed this
 * address, and a click of its owner must not open an account under a stranger's password.
 * @param beforeTry called with the address before the password is compared
 * @throws ApiProblem link-expired, wrong-credentials or email-taken
 */
export async function finishSignUp(
  db: Db,
  { token, password }: Verification,
  beforeTry: (email: string) => Promise<void>,
  now = new Date(),
): Promise<User> {
  const wanted = and(eq(signUps.tokenHash, hashSecret(token)), gt(signUps.expiresAt, now.toISOString()));
  const asked = db.select().from(signUps).where(wanted).get();
  if (!asked) throw linkExpired('Sign up once more to get a new one.');
  await beforeTry(asked.email);
  if (!(await checkPassword(asked.passwordHash, password)))
    throw new ApiProblem('wrong-credentials', 'This is not the password that was chosen when signing up.');
  return db.transaction(
    (tx) => {
      // Checking takes a while: the same link may have been used meanwhile.
      if (tx.delete(signUps).where(wanted).run().changes === 0) throw linkExpired('Sign in instead.');
      tx.delete(signUps).where(eq(signUps.email, asked.email)).run();
      return insertAccount(tx, asked, now);
    },
    { behavior: 'immediate' },
  );
}

export const linkExpired = (next: string) => new ApiProblem('link-expired', `This link has expired, was used or is not whole. ${next}`);
