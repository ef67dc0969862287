import type { Key } from '@tiltwright/shared/schemas/account.ts';
import { and, desc, eq } from 'drizzle-orm';
import { keyPrefix } from '../../auth/keys.ts';
import type { Db } from '../../db/connect.ts';
import { apiKeys } from '../../db/schema/people.ts';
import { ApiProblem } from '../../errors.ts';

export type KeyRow = typeof apiKeys.$inferSelect;

export const ownKey = (owner: string, id: string) => and(eq(apiKeys.userId, owner), eq(apiKeys.id, id));

export const listKeys = (db: Db, owner: string): KeyRow[] =>
  db.select().from(apiKeys).where(eq(apiKeys.userId, owner)).orderBy(desc(apiKeys.id)).all();

/** @throws ApiProblem not-found, also for a key of someone else's */
export function keyOrProblem(db: Db, owner: string, id: string): KeyRow {
  const key = db.select().from(apiKeys).where(ownKey(owner, id)).get();
  if (!key) throw new ApiProblem('not-found', `You have no key ${id}.`);
  return key;
}

export function toKey({ secretHash: _secret, previousHash: _previous, userId: _owner, ...row }: KeyRow): Key {
  const { id, name, scopes, kind, origins, expiresAt, previousUntil, createdAt, lastUsedAt, revokedAt } = row;
  const overlap = previousUntil !== null && previousUntil > new Date().toISOString() ? previousUntil : null;
  return { id, name, prefix: keyPrefix(id), scopes, kind, origins, expiresAt, previousUntil: overlap, createdAt, lastUsedAt, revokedAt };
}
