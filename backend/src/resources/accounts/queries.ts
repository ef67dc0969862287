import type { Account } from '@tiltwright/shared/schemas/account.ts';
import { eq } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { users } from '../../db/schema/people.ts';

export type User = typeof users.$inferSelect;

export const findUserByEmail = (db: Db, email: string): User | undefined => db.select().from(users).where(eq(users.email, email)).get();
export const findUser = (db: Db, id: string): User | undefined => db.select().from(users).where(eq(users.id, id)).get();

export const toAccount = ({ id, email, name, roles, createdAt }: User): Account => ({ id, email, name, roles, createdAt });
