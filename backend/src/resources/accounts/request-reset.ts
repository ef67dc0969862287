import { eq } from 'drizzle-orm';
import { hoursLater, newToken, tokenLink } from '../../auth/tokens.ts';
import { passwordResets } from '../../db/schema/access.ts';
import type { Deps } from '../../deps.ts';
import { enqueueMail } from '../../mail/enqueue-mail.ts';
import { resetPassword } from '../../mail/letters.ts';
import { hadEnoughMail } from '../../mail/recent-mail.ts';
import { audit } from '../audit.ts';
import { findUserByEmail } from './queries.ts';

const hours = 1;

/** Sends a link to an account that is there and not disabled; one durable write either way. */
export function requestReset({ db, config }: Pick<Deps, 'db' | 'config'>, email: string, now = new Date()): void {
  db.transaction(
    (tx) => {
      const user = findUserByEmail(db, email);
      audit(tx, null, 'password.ask', user?.id ?? null);
      if (!user || user.disabledAt || hadEnoughMail(tx, email, 'reset-password', now)) return;
      const { token, tokenHash } = newToken();
      tx.delete(passwordResets).where(eq(passwordResets.userId, user.id)).run();
      tx.insert(passwordResets)
        .values({ tokenHash, userId: user.id, createdAt: now.toISOString(), expiresAt: hoursLater(now, hours) })
        .run();
      enqueueMail(tx, email, resetPassword(tokenLink(config.siteUrl, 'reset', token), hours), { now });
    },
    { behavior: 'immediate' },
  );
}
