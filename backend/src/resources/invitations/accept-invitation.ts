import type { InvitationAnswer } from '@tiltwright/shared/schemas/desk.ts';
import { and, eq } from 'drizzle-orm';
import { hashPassword } from '../../auth/passwords.ts';
import type { Db } from '../../db/connect.ts';
import { invitations } from '../../db/schema/access.ts';
import { users } from '../../db/schema/people.ts';
import { ApiProblem } from '../../errors.ts';
import { insertAccount } from '../accounts/create-account.ts';
import { linkExpired } from '../accounts/finish-sign-up.ts';
import { demandUser, findUserByEmail, type User } from '../accounts/queries.ts';
import { audit } from '../audit.ts';
import { isOpen, openInvitation } from './queries.ts';

const immediate = { behavior: 'immediate' } as const;

/**
 * Makes the account with its roles, or adds the roles to the account that is signed in and has this address.
 * @param signedInAs id of the person who asks; undefined for a visitor
 * @throws ApiProblem link-expired, sign-in-needed where the address has an account, invalid-input where name or password lack
 */
export async function acceptInvitation(
  db: Db,
  token: string,
  { name, password }: InvitationAnswer,
  signedInAs: string | undefined,
  now = new Date(),
): Promise<User> {
  const { id, email, roles } = openInvitation(db, token, now);
  const use = (tx: Pick<Db, 'update' | 'insert'>, userId: string) => {
    const { changes } = tx
      .update(invitations)
      .set({ acceptedAt: now.toISOString(), acceptedBy: userId })
      .where(and(eq(invitations.id, id), isOpen(now)))
      .run();
    if (changes === 0) throw linkExpired('It may just have been accepted; sign in.');
    audit(tx, userId, 'invitation.accept', id, { roles });
  };

  const existing = findUserByEmail(db, email);
  if (existing) {
    if (existing.id !== signedInAs)
      throw new ApiProblem('sign-in-needed', 'The invited address has an account: sign in with it, then accept.');
    return db.transaction((tx) => {
      use(tx, existing.id);
      tx.update(users)
        .set({ roles: [...new Set([...existing.roles, ...roles])] })
        .where(eq(users.id, existing.id))
        .run();
      return demandUser(db, existing.id);
    }, immediate);
  }

  if (name === undefined || password === undefined) {
    const lacking = Object.entries({ name, password }).filter(([, value]) => value === undefined);
    throw new ApiProblem(
      'invalid-input',
      'A new account needs a name and a password.',
      lacking.map(([field]) => ({ path: `/${field}`, code: 'required', message: `Needed for the new account.` })),
    );
  }
  const passwordHash = await hashPassword(password);
  return db.transaction((tx) => {
    const user = insertAccount(tx, { email, name, passwordHash, roles }, now);
    use(tx, user.id);
    return user;
  }, immediate);
}
