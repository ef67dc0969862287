import type { Role } from '@tiltwright/shared/schemas/account.ts';
import type { Person, PersonSession } from '@tiltwright/shared/schemas/desk.ts';
import { and, asc, count, eq, gt, isNotNull, isNull, ne, or, type SQL, sql } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { secondFactors } from '../../db/schema/access.ts';
import { sessions, users } from '../../db/schema/people.ts';
import { ApiProblem } from '../../errors.ts';
import { findUser, hasSecondFactor, type User } from '../accounts/queries.ts';

export interface PeopleFilter {
  q?: string | undefined;
  role?: Role | undefined;
  state?: 'active' | 'disabled' | undefined;
}

const hasRole = (role: Role) => sql`EXISTS (SELECT 1 FROM json_each(${users.roles}) WHERE value = ${role})`;

/** % and _ are letters here, not wildcards. */
const contains = (text: string) => `%${text.replace(/[\\%_]/g, '\\$&')}%`;
const holds = (column: SQL, text: string) => sql`${column} LIKE ${contains(text)} ESCAPE '\\'`;

export function listPeople(db: Db, { q, role, state }: PeopleFilter, limit: number, offset: number): Person[] {
  const now = Date.now();
  const rows = db
    .select({
      user: users,
      secondFactor: sql<number>`${secondFactors.confirmedAt} IS NOT NULL`,
      sessions: sql<number>`(SELECT count(*) FROM ${sessions} WHERE ${sessions.userId} = ${users.id} AND ${sessions.expiresAt} > ${now})`,
    })
    .from(users)
    .leftJoin(secondFactors, eq(secondFactors.userId, users.id))
    .where(
      and(
        q === undefined ? undefined : or(holds(sql`${users.email}`, q), holds(sql`${users.name}`, q)),
        role && hasRole(role),
        state && (state === 'disabled' ? isNotNull(users.disabledAt) : isNull(users.disabledAt)),
      ),
    )
    .orderBy(asc(users.email))
    .limit(limit + 1)
    .offset(offset)
    .all();
  return rows.map(({ user, secondFactor, sessions: signedIn }) => toPerson(user, secondFactor === 1, signedIn));
}

const toPerson = ({ id, email, name, roles, createdAt, disabledAt }: User, secondFactor: boolean, signedIn: number): Person => ({
  id,
  email,
  name,
  roles,
  createdAt,
  disabledAt,
  secondFactor,
  sessions: signedIn,
});

/** @throws ApiProblem not-found */
export function personOrProblem(db: Db, id: string): User {
  const user = findUser(db, id);
  if (!user) throw new ApiProblem('not-found', `There is no account ${id}.`);
  return user;
}

export const readPerson = (db: Db, user: User): Person => toPerson(user, hasSecondFactor(db, user.id), listSessions(db, user.id).length);

export function listSessions(db: Db, userId: string): PersonSession[] {
  return db
    .select()
    .from(sessions)
    .where(and(eq(sessions.userId, userId), gt(sessions.expiresAt, Date.now())))
    .orderBy(asc(sessions.expiresAt))
    .all()
    .map(({ idHash, data, expiresAt }) => ({
      id: idHash,
      startedAt: (JSON.parse(data) as { startedAt?: string }).startedAt ?? null,
      expiresAt: new Date(expiresAt).toISOString(),
    }));
}

/** A site without an admin has nobody who could make one. @throws ApiProblem wrong-state */
export function demandAnotherAdmin(db: Pick<Db, 'select'>, user: User): void {
  if (!user.roles.includes('admin') || user.disabledAt) return;
  const others = db
    .select({ n: count() })
    .from(users)
    .where(and(hasRole('admin'), isNull(users.disabledAt), ne(users.id, user.id)))
    .get();
  if (!others?.n) throw new ApiProblem('wrong-state', 'This is the last admin; make someone else an admin first.');
}
