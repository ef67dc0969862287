import { once } from 'node:events';
import { guardFormula } from '@tiltwright/shared/csv/words.ts';
import { writeRow } from '@tiltwright/shared/csv/write-table.ts';
import { Job, MatchOrder, MatchResult } from '@tiltwright/shared/schemas/match.ts';
import { eq } from 'drizzle-orm';
import * as z from 'zod';
import { actorId } from '../../auth/actor.ts';
import { jobs } from '../../db/schema/jobs.ts';
import type { Deps } from '../../deps.ts';
import { listOf } from '../../http/cursor.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { countHulls } from '../catalog/queries.ts';
import { fitExample } from '../questions/examples.ts';
import { jobOrProblem, listJobs, resultPages, toJob } from './queries.ts';
import { jobRunner, orderMatches, unitsPerHull } from './run-matches.ts';

const tag = 'Jobs';
const may = 'batch.compute';
const jobParams = z.strictObject({ id: z.string().min(1).max(80) });
const { hull: _hull, ref: _ref, alsoAt: _alsoAt, ...rigExample } = fitExample;
const csvHeader = ['hull', 'maker', 'model', 'package', 'year_from', 'year_to', 'verdict', 'reasons'];

export function matchRoutes(deps: Deps): Route[] {
  const { db, limits } = deps;
  const runner = jobRunner(deps);
  const wake = () => void runner.wake();
  // What a restart has cut off goes on; not at once, since describing the routes must start no work.
  setImmediate(() => db.$client.open && wake()).unref();
  return [
    route(
      {
        id: 'orderMatches',
        method: 'post',
        path: '/matches',
        tag,
        summary: 'Put one rig to every hull of a filter',
        description:
          'A job: each hull gets the verdict of the whole check without sampling, with reason codes. Its results can be read while it runs.',
        may,
        body: MatchOrder,
        bodyExample: { rig: rigExample, hulls: { form: 'shallow-v', lengthMaxM: 5 } },
        reply: { status: 202, description: 'The job.', schema: Job },
        problems: ['unknown-part', 'wrong-state'],
        moreCost: { of: () => 0, words: `${unitsPerHull} for each hull` },
        cache: noStore,
      },
      async ({ actor, body, req, res }) => {
        const row = orderMatches(deps, actorId(actor), body);
        await limits.chargeMore(req, actor, unitsPerHull * countHulls(db, body.hulls));
        wake();
        res.setHeader('Location', `/api/v1/jobs/${row.id}`);
        return toJob(db, row);
      },
    ),
    route(
      {
        id: 'listJobs',
        method: 'get',
        path: '/jobs',
        tag,
        summary: 'The account’s jobs, newest first',
        may,
        reply: { status: 200, description: 'The last twenty and those still open.', schema: listOf(Job) },
        cache: noStore,
      },
      ({ actor }) => ({ data: listJobs(db, actorId(actor)).map((row) => toJob(db, row)), next: null }),
    ),
    route(
      {
        id: 'getJob',
        method: 'get',
        path: '/jobs/{id}',
        tag,
        summary: 'How far a job is',
        may,
        params: jobParams,
        reply: { status: 200, description: 'The job.', schema: Job },
        problems: ['not-found'],
        cache: noStore,
      },
      ({ actor, params }) => toJob(db, jobOrProblem(db, actorId(actor), params.id)),
    ),
    route(
      {
        id: 'getJobResults',
        method: 'get',
        path: '/jobs/{id}/results',
        tag,
        summary: 'What a job has found so far',
        description: 'A line a hull, in the order of ids: NDJSON, or CSV with `format=csv`.',
        may,
        params: jobParams,
        query: z.strictObject({ format: z.enum(['ndjson', 'csv']).default('ndjson') }),
        reply: { status: 200, description: 'A line a hull.', schema: MatchResult, contentType: 'application/x-ndjson' },
        problems: ['not-found'],
        cache: noStore,
      },
      async ({ actor, params, query, res }) => {
        const { id } = jobOrProblem(db, actorId(actor), params.id);
        const csv = query.format === 'csv';
        res.type(csv ? 'text/csv; charset=utf-8' : 'application/x-ndjson');
        if (csv) res.attachment(`${id}.csv`).write(writeRow(csvHeader));
        for (const page of resultPages(db, id)) {
          if (res.destroyed) return;
          const text = page.map(csv ? toCsv : (row) => `${JSON.stringify(row)}\n`).join('');
          if (!res.write(text)) await Promise.race([once(res, 'drain'), once(res, 'close')]);
        }
        res.end();
      },
    ),
    route(
      {
        id: 'deleteJob',
        method: 'delete',
        path: '/jobs/{id}',
        tag,
        summary: 'Cancel an open job, or delete an ended one with its results',
        description: 'A cancelled job keeps what it has found; deleting it again removes it.',
        may,
        params: jobParams,
        reply: { status: 204, description: 'Cancelled or gone.' },
        problems: ['not-found'],
        cache: noStore,
      },
      ({ actor, params }) => {
        const { id, status } = jobOrProblem(db, actorId(actor), params.id);
        if (status === 'waiting' || status === 'running')
          db.update(jobs).set({ status: 'cancelled', endedAt: new Date().toISOString() }).where(eq(jobs.id, id)).run();
        else db.delete(jobs).where(eq(jobs.id, id)).run();
      },
    ),
  ];
}

function toCsv({ hull, maker, model, package: pack, yearFrom, yearTo, verdict, reasons }: MatchResult): string {
  const years = [yearFrom, yearTo].map((year) => (year === null ? '' : String(year)));
  return writeRow([hull, guardFormula(maker), guardFormula(model), guardFormula(pack ?? ''), ...years, verdict, reasons.join('|')]);
}
