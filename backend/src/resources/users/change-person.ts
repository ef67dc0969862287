import type { PersonChange } from '@tiltwright/shared/schemas/desk.ts';
import { eq } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { sessions, users } from '../../db/schema/people.ts';
import { audit } from '../audit.ts';
import { demandAnotherAdmin, personOrProblem } from './queries.ts';

const immediate = { behavior: 'immediate' } as const;

/** Roles and whether the account may be used. @throws ApiProblem not-found, or wrong-state for the last admin */
export function changePerson(db: Db, admin: string, id: string, { roles, disabled }: PersonChange, now = new Date()): void {
  db.transaction((tx) => {
    const user = personOrProblem(db, id);
    const rolesChange = roles !== undefined && [...roles].sort().join() !== [...user.roles].sort().join();
    const disable = disabled === true && user.disabledAt === null;
    const enable = disabled === false && user.disabledAt !== null;
    if (disable || (rolesChange && !roles.includes('admin'))) demandAnotherAdmin(tx, user);
    if (rolesChange) {
      tx.update(users).set({ roles }).where(eq(users.id, id)).run();
      audit(tx, admin, 'account.roles', id, { before: user.roles, after: roles });
    }
    if (disable || enable) {
      tx.update(users)
        .set({ disabledAt: disable ? now.toISOString() : null })
        .where(eq(users.id, id))
        .run();
      audit(tx, admin, disable ? 'account.disable' : 'account.enable', id);
    }
    if (disable) tx.delete(sessions).where(eq(sessions.userId, id)).run();
  }, immediate);
}

/** Signs a person out everywhere. @throws ApiProblem not-found */
export function endSessions(db: Db, admin: string, id: string): void {
  db.transaction((tx) => {
    personOrProblem(db, id);
    const { changes } = tx.delete(sessions).where(eq(sessions.userId, id)).run();
    audit(tx, admin, 'sessions.end', id, { ended: changes });
  }, immediate);
}
