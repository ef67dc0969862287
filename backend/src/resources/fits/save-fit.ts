// Saved fits keep the question and the answer it got, so that they read the same years later.
import type { FitChange, NewFit } from '@tiltwright/shared/schemas/boat.ts';
import type { FitAnswer, FitQuestion } from '@tiltwright/shared/schemas/fit.ts';
import { count, eq } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { savedFits } from '../../db/schema/saved-fits.ts';
import type { Deps } from '../../deps.ts';
import { ApiProblem } from '../../errors.ts';
import { newId } from '../../ids.ts';
import { boatOrProblem } from '../boats/queries.ts';
import { fitJob } from '../questions/answer-questions.ts';
import { type FitRow, fitOrProblem, ownFit } from './queries.ts';

type Tools = Pick<Deps, 'db' | 'parts' | 'pool'>;
/** A bound against a program gone wild; answers have some 10 KB each. */
const mostFits = 5000;

async function answerOf({ parts, pool }: Tools, question: FitQuestion): Promise<FitAnswer> {
  const [text] = await pool.answer([fitJob(parts, question)]);
  return JSON.parse(text!) as FitAnswer;
}

/** @throws ApiProblem unknown-part, not-found for a boat of someone else's, wrong-state at the bound on fits */
export async function createFit(tools: Tools, owner: string, { name, note, boat, question }: NewFit): Promise<FitRow> {
  const { db } = tools;
  demandBoat(db, owner, boat);
  const answer = await answerOf(tools, question);
  const now = new Date().toISOString();
  const { engineVersion, edition } = answer;
  const base = { id: newId('fit'), userId: owner, boatId: boat, name, note, question, answer, engineVersion, edition };
  const row: FitRow = { ...base, revision: 1, createdAt: now, updatedAt: now };
  db.transaction(
    (tx) => {
      const { n } = tx.select({ n: count() }).from(savedFits).where(eq(savedFits.userId, owner)).get()!;
      if (n >= mostFits) throw new ApiProblem('wrong-state', `An account keeps ${mostFits} fits at most.`);
      tx.insert(savedFits).values(row).run();
    },
    { behavior: 'immediate' },
  );
  return row;
}

/** A changed question is asked anew. `check` sees the row as it stands, inside the transaction that changes it. */
export async function changeFit(
  tools: Tools,
  owner: string,
  id: string,
  { name, note, boat, question }: FitChange,
  check: (row: FitRow) => void,
): Promise<FitRow> {
  const { db } = tools;
  check(fitOrProblem(db, owner, id));
  if (boat !== undefined) demandBoat(db, owner, boat);
  const answer = question && (await answerOf(tools, question));
  return db.transaction(
    (tx) => {
      const before = fitOrProblem(tx, owner, id);
      check(before);
      const after: FitRow = {
        ...before,
        ...(name !== undefined && { name }),
        ...(note !== undefined && { note }),
        ...(boat !== undefined && { boatId: boat }),
        ...(question && answer && { question, answer, engineVersion: answer.engineVersion, edition: answer.edition }),
        revision: before.revision + 1,
        updatedAt: new Date().toISOString(),
      };
      tx.update(savedFits).set(after).where(ownFit(owner, id)).run();
      return after;
    },
    { behavior: 'immediate' },
  );
}

/** Its links go with it. @throws ApiProblem not-found */
export function removeFit(db: Db, owner: string, id: string, check: (row: FitRow) => void): void {
  db.transaction(
    (tx) => {
      check(fitOrProblem(tx, owner, id));
      tx.delete(savedFits).where(ownFit(owner, id)).run();
    },
    { behavior: 'immediate' },
  );
}

function demandBoat(db: Db, owner: string, boat: string | null): void {
  if (boat !== null) boatOrProblem(db, owner, boat);
}
