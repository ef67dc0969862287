import { and, eq, gt, ne } from 'drizzle-orm';
import { hashSecret } from '../../auth/keys.ts';
import { checkPassword, hashPassword } from '../../auth/passwords.ts';
import type { Db } from '../../db/connect.ts';
import { passwordResets } from '../../db/schema/access.ts';
import { sessions, users } from '../../db/schema/people.ts';
import type { Deps } from '../../deps.ts';
import { ApiProblem } from '../../errors.ts';
import { enqueueMail } from '../../mail/enqueue-mail.ts';
import { passwordChanged } from '../../mail/letters.ts';
import { audit } from '../audit.ts';
import { linkExpired } from './finish-sign-up.ts';
import { findUser, type User } from './queries.ts';

type Needs = Pick<Deps, 'db' | 'config'>;

/** A new password by a mail's link; every session of the account ends. @throws ApiProblem link-expired */
export async function resetByLink(deps: Needs, token: string, password: string, now = new Date()): Promise<void> {
  const { db } = deps;
  const wanted = and(eq(passwordResets.tokenHash, hashSecret(token)), gt(passwordResets.expiresAt, now.toISOString()));
  const asked = db.select().from(passwordResets).where(wanted).get();
  const user = asked && findUser(db, asked.userId);
  if (!user || user.disabledAt) throw linkExpired('Ask for a new one.');
  const passwordHash = await hashPassword(password);
  db.transaction(
    (tx) => {
      if (tx.delete(passwordResets).where(wanted).run().changes === 0) throw linkExpired('Ask for a new one.');
      setPassword(tx, deps.config.siteUrl, user, passwordHash, null, now);
    },
    { behavior: 'immediate' },
  );
}

/** A new password by the old one; the other sessions end, the one that asks goes on. @throws ApiProblem wrong-credentials */
export async function changePassword(deps: Needs, user: User, current: string, password: string, sessionId: string): Promise<void> {
  await demandPassword(user, current);
  const passwordHash = await hashPassword(password);
  deps.db.transaction((tx) => setPassword(tx, deps.config.siteUrl, user, passwordHash, sessionId), { behavior: 'immediate' });
}

/** @throws ApiProblem wrong-credentials */
export async function demandPassword(user: User, password: string): Promise<void> {
  if (!(await checkPassword(user.passwordHash, password))) throw new ApiProblem('wrong-credentials', 'This is not the account’s password.');
}

type Writer = Pick<Db, 'insert' | 'update' | 'delete'>;

function setPassword(tx: Writer, siteUrl: string, user: User, passwordHash: string, keepSession: string | null, now = new Date()): void {
  tx.update(users).set({ passwordHash }).where(eq(users.id, user.id)).run();
  tx.delete(passwordResets).where(eq(passwordResets.userId, user.id)).run();
  const all = eq(sessions.userId, user.id);
  tx.delete(sessions)
    .where(keepSession === null ? all : and(all, ne(sessions.idHash, hashSecret(keepSession))))
    .run();
  audit(tx, user.id, 'password.change', user.id, { by: keepSession === null ? 'link' : 'password' });
  enqueueMail(tx, user.email, passwordChanged(`${siteUrl}/reset`), { now });
}
