// One rig against the hulls of a filter, chunk by chunk in the pool; results are written as they come.
import type { FitAnswer } from '@tiltwright/shared/schemas/fit.ts';
import { FitQuestion } from '@tiltwright/shared/schemas/fit.ts';
import type { MatchOrder } from '@tiltwright/shared/schemas/match.ts';
import { and, asc, desc, eq, inArray, notInArray } from 'drizzle-orm';
import { jobResults, jobs } from '../../db/schema/jobs.ts';
import type { Deps } from '../../deps.ts';
import { ApiProblem } from '../../errors.ts';
import { newId } from '../../ids.ts';
import { countHulls, hullIdsAfter } from '../catalog/queries.ts';
import { fitJob } from '../questions/answer-questions.ts';
import type { JobRow } from './queries.ts';

type Tools = Pick<Deps, 'db' | 'parts' | 'pool'>;

export const unitsPerHull = 2;
const hullsAtOnce = 32;
/** Ended jobs an account keeps; the oldest go first. */
const keptJobs = 20;
const openJobs = 5;

/** Puts the job down; `runJobs` works it off. @throws ApiProblem unknown-part, wrong-state at the bound on open jobs */
export function orderMatches({ db, parts }: Tools, owner: string, order: MatchOrder): JobRow {
  // A part that is not known would fail every line: look at each once, now.
  const { rig } = order;
  if (rig.mount !== undefined) parts.part('mounts', rig.mount, '/rig/mount');
  parts.part('transducers', rig.transducer, '/rig/transducer');
  for (const [index, { lowerUnit }] of rig.lowerUnits.entries()) parts.part('lower-units', lowerUnit, `/rig/lowerUnits/${index}/lowerUnit`);
  const row: JobRow = {
    id: newId('job'),
    userId: owner,
    order: order as unknown as Record<string, unknown>,
    status: 'waiting',
    done: 0,
    total: countHulls(db, order.hulls),
    edition: parts.edition(),
    error: null,
    createdAt: new Date().toISOString(),
    endedAt: null,
  };
  db.transaction(
    (tx) => {
      const open = tx
        .select({ id: jobs.id })
        .from(jobs)
        .where(and(eq(jobs.userId, owner), inArray(jobs.status, ['waiting', 'running'])))
        .all();
      if (open.length >= openJobs)
        throw new ApiProblem('wrong-state', `${openJobs} jobs of yours are open; wait for one to end or delete it.`);
      const kept = tx.select({ id: jobs.id }).from(jobs).where(eq(jobs.userId, owner)).orderBy(desc(jobs.id)).limit(keptJobs).all();
      const keep = [...kept, ...open].map(({ id }) => id);
      tx.delete(jobs)
        .where(and(eq(jobs.userId, owner), notInArray(jobs.id, keep)))
        .run();
      tx.insert(jobs).values(row).run();
    },
    { behavior: 'immediate' },
  );
  return row;
}

export interface JobRunner {
  /** Works off what is open, one job after the other; a second call while it works does nothing. */
  wake(): Promise<void>;
}

/** Also takes up jobs that a restart has cut off, after their last written hull. */
export function jobRunner(tools: Tools): JobRunner {
  let running: Promise<void> | undefined;
  const nextJob = () =>
    tools.db
      .select()
      .from(jobs)
      .where(inArray(jobs.status, ['waiting', 'running']))
      .orderBy(asc(jobs.id))
      .get();
  const work = async () => {
    for (let job = nextJob(); job; job = nextJob()) await runJob(tools, job);
  };
  return {
    wake() {
      // What fails here is the database itself (full, or closed at the end): the job stays open for the next call.
      running ??= work()
        .catch(() => {})
        .finally(() => {
          running = undefined;
        });
      return running;
    },
  };
}

async function runJob(tools: Tools, job: JobRow): Promise<void> {
  const { db } = tools;
  const mine = eq(jobs.id, job.id);
  const order = job.order as unknown as MatchOrder;
  try {
    db.update(jobs).set({ status: 'running' }).where(mine).run();
    let after = db
      .select({ hull: jobResults.hullId })
      .from(jobResults)
      .where(eq(jobResults.jobId, job.id))
      .orderBy(desc(jobResults.hullId))
      .get()?.hull;
    for (;;) {
      const hulls = hullIdsAfter(db, order.hulls, after, hullsAtOnce);
      if (hulls.length === 0) break;
      const results = await matchHulls(tools, order, hulls);
      // A job that was cancelled or deleted meanwhile takes no more results.
      if (!keepResults(tools, job.id, results)) return;
      after = hulls.at(-1);
    }
    db.update(jobs).set({ status: 'done', endedAt: new Date().toISOString() }).where(mine).run();
  } catch (error) {
    const words = error instanceof ApiProblem ? error.message : 'Something went wrong on our side.';
    db.update(jobs).set({ status: 'failed', error: words, endedAt: new Date().toISOString() }).where(mine).run();
  }
}

interface Result {
  hullId: string;
  verdict: string;
  reasons: string[];
}

async function matchHulls({ parts, pool }: Tools, { rig }: MatchOrder, hulls: readonly string[]): Promise<Result[]> {
  const asked = hulls.map((hull) => fitJob(parts, FitQuestion.parse({ ...rig, hull, uncertainty: 'none' })));
  const answers = await pool.answer(asked);
  return answers.map((text, index) => {
    const { verdict, reasons, compatibility } = JSON.parse(text) as FitAnswer;
    const forbids = compatibility.filter(({ outcome }) => outcome === 'no').map(({ rule }) => rule);
    return { hullId: hulls[index]!, verdict, reasons: [...new Set([...reasons.map(({ code }) => code), ...forbids])] };
  });
}

function keepResults({ db }: Tools, jobId: string, results: readonly Result[]): boolean {
  return db.transaction(
    (tx) => {
      const job = tx.select({ status: jobs.status, done: jobs.done }).from(jobs).where(eq(jobs.id, jobId)).get();
      if (job?.status !== 'running') return false;
      tx.insert(jobResults)
        .values(results.map((result) => ({ jobId, ...result })))
        .run();
      tx.update(jobs)
        .set({ done: job.done + results.length })
        .where(eq(jobs.id, jobId))
        .run();
      return true;
    },
    { behavior: 'immediate' },
  );
}
