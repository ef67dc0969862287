// Every query is by owner: someone else's job is not there.

import type { Verdict } from '@tiltwright/shared/schemas/fit.ts';
import type { Job, MatchResult } from '@tiltwright/shared/schemas/match.ts';
import { and, asc, count, desc, eq, gt } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { hulls } from '../../db/schema/catalog.ts';
import { jobResults, jobs } from '../../db/schema/jobs.ts';
import { ApiProblem } from '../../errors.ts';

export type JobRow = typeof jobs.$inferSelect;

export const listJobs = (db: Db, owner: string): JobRow[] =>
  db.select().from(jobs).where(eq(jobs.userId, owner)).orderBy(desc(jobs.id)).all();

/** @throws ApiProblem not-found */
export function jobOrProblem(db: Db, owner: string, id: string): JobRow {
  const row = db
    .select()
    .from(jobs)
    .where(and(eq(jobs.userId, owner), eq(jobs.id, id)))
    .get();
  if (!row) throw new ApiProblem('not-found', `You have no job ${id}.`);
  return row;
}

export function toJob(db: Db, { id, status, done, total, edition, error, createdAt, endedAt }: JobRow): Job {
  const counts: Job['counts'] = { fits: 0, 'fits-with-care': 0, 'does-not-fit': 0, 'cannot-tell': 0 };
  const rows = db
    .select({ verdict: jobResults.verdict, n: count() })
    .from(jobResults)
    .where(eq(jobResults.jobId, id))
    .groupBy(jobResults.verdict)
    .all();
  for (const { verdict, n } of rows) counts[verdict as Verdict] = n;
  return { id, status, done, total, counts, edition, error, createdAt, endedAt };
}

const resultsAtOnce = 500;

/** Results so far, page by page, so that a reader may be slow and nothing is held. */
export function* resultPages(db: Db, job: string): Generator<MatchResult[]> {
  let after = '';
  for (;;) {
    const rows = db
      .select({
        hull: jobResults.hullId,
        maker: hulls.maker,
        model: hulls.model,
        package: hulls.package,
        yearFrom: hulls.yearFrom,
        yearTo: hulls.yearTo,
        verdict: jobResults.verdict,
        reasons: jobResults.reasons,
      })
      .from(jobResults)
      .innerJoin(hulls, eq(hulls.id, jobResults.hullId))
      .where(and(eq(jobResults.jobId, job), gt(jobResults.hullId, after)))
      .orderBy(asc(jobResults.hullId))
      .limit(resultsAtOnce)
      .all();
    if (rows.length === 0) return;
    yield rows as MatchResult[];
    after = rows.at(-1)!.hull;
  }
}
