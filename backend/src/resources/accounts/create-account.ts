import type { Role } from '@tiltwright/shared/schemas/account.ts';
import { hashPassword } from '../../auth/passwords.ts';
import type { Db } from '../../db/connect.ts';
import { users } from '../../db/schema/people.ts';
import { ApiProblem } from '../../errors.ts';
import { newId } from '../../ids.ts';
import { audit } from '../audit.ts';
import { findUserByEmail, type User } from './queries.ts';

interface NewAccount {
  email: string;
  name: string;
  password: string;
  roles: Role[];
}

/** @throws ApiProblem email-taken */
export async function createAccount(db: Db, { email, name, password, roles }: NewAccount): Promise<User> {
  if (findUserByEmail(db, email)) throw taken();
  const row: User = {
    id: newId('usr'),
    email,
    name,
    passwordHash: await hashPassword(password),
    roles,
    createdAt: new Date().toISOString(),
    disabledAt: null,
  };
  // Hashing takes a while: someone else may have taken the address meanwhile.
  const written = db.transaction(
    (tx) => {
      const { changes } = tx.insert(users).values(row).onConflictDoNothing().run();
      if (changes === 1) audit(tx, row.id, 'account.create', row.id, { roles });
      return changes === 1;
    },
    { behavior: 'immediate' },
  );
  if (!written) throw taken();
  return row;
}

const taken = () =>
  new ApiProblem('email-taken', 'An account with this address exists; sign in instead.', [
    { path: '/email', code: 'email-taken', message: 'This address has an account.' },
  ]);
