import { randomBytes } from 'node:crypto';
import type { Share, SharedFit } from '@tiltwright/shared/schemas/boat.ts';
import { and, desc, eq, isNull } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { savedFits, shares } from '../../db/schema/saved-fits.ts';
import { ApiProblem } from '../../errors.ts';
import { newId } from '../../ids.ts';
import { fitOrProblem } from '../fits/queries.ts';

type ShareRow = typeof shares.$inferSelect;

export const toShare = ({ id, fitId, token, createdAt, revokedAt }: ShareRow): Share => ({ id, fit: fitId, token, createdAt, revokedAt });

export const listShares = (db: Db, owner: string): ShareRow[] =>
  db.select().from(shares).where(eq(shares.userId, owner)).orderBy(desc(shares.id)).limit(1000).all();

/** 192 random bits: nobody finds a link by trying. @throws ApiProblem not-found for a fit of someone else's */
export function createShare(db: Db, owner: string, fit: string): ShareRow {
  const { id } = fitOrProblem(db, owner, fit);
  const row: ShareRow = {
    id: newId('shr'),
    token: randomBytes(24).toString('base64url'),
    userId: owner,
    fitId: id,
    createdAt: new Date().toISOString(),
    revokedAt: null,
  };
  db.insert(shares).values(row).run();
  return row;
}

/** @throws ApiProblem not-found */
export function revokeShare(db: Db, owner: string, id: string): void {
  const mine = and(eq(shares.userId, owner), eq(shares.id, id));
  if (!db.select({ id: shares.id }).from(shares).where(mine).get()) throw new ApiProblem('not-found', `You have no link ${id}.`);
  db.update(shares)
    .set({ revokedAt: new Date().toISOString() })
    .where(and(mine, isNull(shares.revokedAt)))
    .run();
}

/** What a link shows. @throws ApiProblem not-found, the same for a revoked link as for one that never was */
export function sharedFit(db: Db, token: string): SharedFit {
  const row = db
    .select({ name: savedFits.name, question: savedFits.question, answer: savedFits.answer, updatedAt: savedFits.updatedAt })
    .from(shares)
    .innerJoin(savedFits, eq(savedFits.id, shares.fitId))
    .where(and(eq(shares.token, token), isNull(shares.revokedAt)))
    .get();
  if (!row) throw new ApiProblem('not-found', 'There is nothing under this link; it may have been withdrawn.');
  return row;
}
