// Every query is by owner: someone else's boat is not there.
import type { Boat, BoatChange, NewBoat } from '@tiltwright/shared/schemas/boat.ts';
import { and, asc, count, eq, gt } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { boats } from '../../db/schema/people.ts';
import { ApiProblem } from '../../errors.ts';
import { newId } from '../../ids.ts';

export type BoatRow = typeof boats.$inferSelect;
/** More than any shop has; a bound against a program gone wild. */
const mostBoats = 5000;

const own = (owner: string, id: string) => and(eq(boats.userId, owner), eq(boats.id, id));

export const listBoats = (db: Db, owner: string, limit: number, after: string | undefined): BoatRow[] =>
  db
    .select()
    .from(boats)
    .where(and(eq(boats.userId, owner), ...(after === undefined ? [] : [gt(boats.id, after)])))
    .orderBy(asc(boats.id))
    .limit(limit)
    .all();

/** @throws ApiProblem not-found */
export function boatOrProblem(db: Db, owner: string, id: string): BoatRow {
  const row = db.select().from(boats).where(own(owner, id)).get();
  if (!row) throw new ApiProblem('not-found', `You have no boat ${id}.`);
  return row;
}

/** @throws ApiProblem wrong-state at the bound on boats */
export function createBoat(db: Db, owner: string, { name, story, question }: NewBoat): BoatRow {
  const now = new Date().toISOString();
  const row: BoatRow = {
    id: newId('boa'),
    userId: owner,
    name,
    story,
    hullId: hullOf(question),
    question,
    revision: 1,
    createdAt: now,
    updatedAt: now,
  };
  db.transaction(
    (tx) => {
      const { n } = tx.select({ n: count() }).from(boats).where(eq(boats.userId, owner)).get()!;
      if (n >= mostBoats) throw new ApiProblem('wrong-state', `An account keeps ${mostBoats} boats at most.`);
      tx.insert(boats).values(row).run();
    },
    { behavior: 'immediate' },
  );
  return row;
}

/** `check` sees the row as it stands, inside the transaction that changes it. @throws ApiProblem not-found */
export function changeBoat(db: Db, owner: string, id: string, change: BoatChange, check: (row: BoatRow) => void): BoatRow {
  return db.transaction(
    (tx) => {
      const before = tx.select().from(boats).where(own(owner, id)).get();
      if (!before) throw new ApiProblem('not-found', `You have no boat ${id}.`);
      check(before);
      const stated = Object.fromEntries(Object.entries(change).filter(([, value]) => value !== undefined)) as Partial<BoatRow>;
      const hullId = change.question ? hullOf(change.question) : before.hullId;
      const after = { ...before, ...stated, hullId, revision: before.revision + 1, updatedAt: new Date().toISOString() };
      tx.update(boats).set(after).where(own(owner, id)).run();
      return after;
    },
    { behavior: 'immediate' },
  );
}

/** @throws ApiProblem not-found */
export function removeBoat(db: Db, owner: string, id: string, check: (row: BoatRow) => void): void {
  db.transaction(
    (tx) => {
      const row = tx.select().from(boats).where(own(owner, id)).get();
      if (!row) throw new ApiProblem('not-found', `You have no boat ${id}.`);
      check(row);
      tx.delete(boats).where(own(owner, id)).run();
    },
    { behavior: 'immediate' },
  );
}

export const toBoat = ({ id, name, story, hullId, question, revision, createdAt, updatedAt }: BoatRow): Boat => ({
  id,
  name,
  story,
  hull: hullId,
  question,
  revision,
  createdAt,
  updatedAt: updatedAt || createdAt,
});
export const boatTag = ({ id, revision }: BoatRow) => `${id}.${revision}`;
const hullOf = ({ hull }: Boat['question']) => (typeof hull === 'string' ? hull : null);
