// Every query is by owner: someone else's fit is not there.
import type { SavedFit } from '@tiltwright/shared/schemas/boat.ts';
import type { FitAnswer } from '@tiltwright/shared/schemas/fit.ts';
import { and, asc, eq, gt } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { savedFits } from '../../db/schema/saved-fits.ts';
import { ApiProblem } from '../../errors.ts';

export type FitRow = typeof savedFits.$inferSelect;

export const ownFit = (owner: string, id: string) => and(eq(savedFits.userId, owner), eq(savedFits.id, id));

export const listFits = (db: Db, owner: string, limit: number, after: string | undefined, boat: string | undefined): FitRow[] =>
  db
    .select()
    .from(savedFits)
    .where(
      and(
        eq(savedFits.userId, owner),
        ...(after === undefined ? [] : [gt(savedFits.id, after)]),
        ...(boat === undefined ? [] : [eq(savedFits.boatId, boat)]),
      ),
    )
    .orderBy(asc(savedFits.id))
    .limit(limit)
    .all();

/** @throws ApiProblem not-found */
export function fitOrProblem(db: Pick<Db, 'select'>, owner: string, id: string): FitRow {
  const row = db.select().from(savedFits).where(ownFit(owner, id)).get();
  if (!row) throw new ApiProblem('not-found', `You have no saved fit ${id}.`);
  return row;
}

export const toSavedFit = ({ id, name, note, boatId, question, answer, revision, createdAt, updatedAt }: FitRow): SavedFit => ({
  id,
  name,
  note,
  boat: boatId,
  question,
  answer: answer as FitAnswer,
  revision,
  createdAt,
  updatedAt,
});
export const fitTag = ({ id, revision }: FitRow) => `${id}.${revision}`;
