import type { Account } from '@tiltwright/shared/schemas/account.ts';
import { and, eq, isNotNull } from 'drizzle-orm';
import type { Config } from '../../config.ts';
import type { Db } from '../../db/connect.ts';
import { profiles, secondFactors } from '../../db/schema/access.ts';
import { users } from '../../db/schema/people.ts';

export type User = typeof users.$inferSelect;

export const findUserByEmail = (db: Db, email: string): User | undefined => db.select().from(users).where(eq(users.email, email)).get();
export const findUser = (db: Db, id: string): User | undefined => db.select().from(users).where(eq(users.id, id)).get();

export const isStaff = ({ roles }: Pick<User, 'roles'>) => roles.includes('steward') || roles.includes('admin');

/** Whether signing in needs a code: one that is begun but not confirmed does not count. */
export const hasSecondFactor = (db: Db, userId: string): boolean =>
  db
    .select({ userId: secondFactors.userId })
    .from(secondFactors)
    .where(and(eq(secondFactors.userId, userId), isNotNull(secondFactors.confirmedAt)))
    .get() !== undefined;

/** What the person sees of their own account. */
export function accountOf({ db, config }: { db: Db; config: Pick<Config, 'staffSecondFactor'> }, user: User): Account {
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
