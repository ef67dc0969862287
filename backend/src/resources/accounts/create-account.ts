import type { Role } from '@tiltwright/shared/schemas/account.ts';
import { hashPassword } from '../../auth/passwords.ts';
import type { Db } from '../../db/connect.ts';
import { users } from '../../db/schema/people.ts';
import { ApiProblem } from '../../errors.ts';
import { newId } from '../../ids.ts';
import { audit } from '../audit.ts';
import type { User } from './queries.ts';

interface NewAccount {
  email: string;
  name: string;
  passwordHash: string;
  roles: Role[];
}

/** Inside a transaction, for an address that is proven. @throws ApiProblem email-taken */
export function insertAccount(tx: Pick<Db, 'insert'>, { email, name, passwordHash, roles }: NewAccount, now = new Date()): User {
  const row: User = { id: newId('usr'), email, name, passwordHash, roles, createdAt: now.toISOString(), disabledAt: null };
  const { changes } = tx.insert(users).values(row).onConflictDoNothing().run();
  if (changes === 0) throw emailTaken();
  audit(tx, row.id, 'account.create', row.id, { roles });
  return row;
}

/** Makes an account at once, without a mail: for the demo world alone. @throws ApiProblem email-taken */
export async function createAccount(db: Db, { password, ...rest }: Omit<NewAccount, 'passwordHash'> & { password: string }): Promise<User> {
  const passwordHash = await hashPassword(password);
  return db.transaction((tx) => insertAccount(tx, { ...rest, passwordHash }), { behavior: 'immediate' });
}

export const emailTaken = () =>
  new ApiProblem('email-taken', 'An account with this address exists; sign in instead.', [
    { path: '/email', code: 'email-taken', message: 'This address has an account.' },
  ]);
