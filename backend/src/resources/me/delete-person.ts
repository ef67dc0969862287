import { eq } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { invitations, signUps } from '../../db/schema/access.ts';
import { mailOutbox } from '../../db/schema/mail.ts';
import { users } from '../../db/schema/people.ts';
import { ApiProblem } from '../../errors.ts';
import type { User } from '../accounts/queries.ts';
import { audit } from '../audit.ts';
import { demandAnotherAdmin } from '../users/queries.ts';

/**
 * Forgets a person: the account and all that refers to it, their mails, invitations and sign-ups. History, editions and
 * audit keep the opaque id alone, which from then on names nobody.
 * @throws ApiProblem wrong-state for the last admin
 */
export function deletePerson(db: Db, user: User): void {
  db.transaction(
    (tx) => {
      demandAnotherAdmin(db, user);
      audit(tx, user.id, 'account.delete', user.id);
      tx.delete(mailOutbox).where(eq(mailOutbox.toAddress, user.email)).run();
      tx.delete(invitations).where(eq(invitations.email, user.email)).run();
      tx.delete(signUps).where(eq(signUps.email, user.email)).run();
      const { changes } = tx.delete(users).where(eq(users.id, user.id)).run();
      if (changes === 0) throw new ApiProblem('not-found', 'This account is gone.');
    },
    { behavior: 'immediate' },
  );
}
