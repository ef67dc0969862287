import type { Account, Session } from '@tiltwright/shared/schemas/account.ts';
import { and, eq, isNotNull } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { profiles, secondFactors } from '../../db/schema/access.ts';
import { users } from '../../db/schema/people.ts';
import type { Deps } from '../../deps.ts';
import { ApiProblem } from '../../errors.ts';

export type User = typeof users.$inferSelect;

export const findUserByEmail = (db: Db, email: string): User | undefined => db.select().from(users).where(eq(users.email, email)).get();
export const findUser = (db: Db, id: string): User | undefined => db.select().from(users).where(eq(users.id, id)).get();

/** The signed-in person's own row. @throws ApiProblem not-found where the account is gone meanwhile */
export function demandUser(db: Db, id: string): User {
  const user = findUser(db, id);
  if (!user) throw new ApiProblem('not-found', 'This account is gone.');
  return user;
}

export const isStaff = ({ roles }: Pick<User, 'roles'>) => roles.includes('steward') || roles.includes('admin');

/** Whether signing in needs a code: one that is begun but not confirmed does not count. */
export const hasSecondFactor = (db: Db, userId: string): boolean =>
  db
    .select({ userId: secondFactors.userId })
    .from(secondFactors)
    .where(and(eq(secondFactors.userId, userId), isNotNull(secondFactors.confirmedAt)))
    .get() !== undefined;

/** What the person sees of their own account. */
export function accountOf({ db, config }: Pick<Deps, 'db' | 'config'>, user: User): Account {
  const { id, email, name, roles, createdAt } = user;
  const profile = db.select().from(profiles).where(eq(profiles.userId, id)).get();
  return {
    id,
    email,
    name,
    roles,
    createdAt,
    units: profile?.units ?? null,
    secondFactor: hasSecondFactor(db, id),
    secondFactorDemanded: config.staffSecondFactor && isStaff(user),
  };
}

export const sessionOf = (deps: Pick<Deps, 'db' | 'config'>, user: User): Session => ({
  account: accountOf(deps, user),
  expiresAt: new Date(Date.now() + deps.config.sessionMs).toISOString(),
});
