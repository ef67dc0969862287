import type { SignUp } from '@tiltwright/shared/schemas/account.ts';
import { hashPassword } from '../../auth/passwords.ts';
import { hoursLater, newToken, tokenLink } from '../../auth/tokens.ts';
import { signUps } from '../../db/schema/access.ts';
import type { Deps } from '../../deps.ts';
import { enqueueMail } from '../../mail/enqueue-mail.ts';
import { accountExists, verifyAddress } from '../../mail/letters.ts';
import { hadEnoughMail } from '../../mail/recent-mail.ts';
import { findUserByEmail } from './queries.ts';

const hours = 24;

/**
 * Notes what was asked for and writes to the address: a link for a new one, a word for one that has an account.
 * Takes as long and answers the same either way; a disabled account is written nothing.
 */
export async function beginSignUp({ db, config }: Pick<Deps, 'db' | 'config'>, wish: SignUp, now = new Date()): Promise<void> {
  const passwordHash = await hashPassword(wish.password);
  db.transaction(
    (tx) => {
      const user = findUserByEmail(db, wish.email);
      if (user) {
        if (user.disabledAt || hadEnoughMail(tx, wish.email, 'account-exists', now)) return;
        enqueueMail(tx, wish.email, accountExists(`${config.siteUrl}/sign-in`), { now });
        return;
      }
      if (hadEnoughMail(tx, wish.email, 'verify-address', now)) return;
      const { token, tokenHash } = newToken();
      tx.insert(signUps)
        .values({
          tokenHash,
          email: wish.email,
          name: wish.name,
          passwordHash,
          roles: wish.integrator ? ['customer', 'integrator'] : ['customer'],
          createdAt: now.toISOString(),
          expiresAt: hoursLater(now, hours),
        })
        .run();
      enqueueMail(tx, wish.email, verifyAddress(tokenLink(config.siteUrl, 'verify', token), hours), { now });
    },
    { behavior: 'immediate' },
  );
}
