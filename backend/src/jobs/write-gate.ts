import type { RequestHandler } from 'express';
import type { ImportJobs } from './import-jobs.ts';

/** Questions are POSTs that write nothing. */
const writesNothing = /^\/(tilt|clearance|fits|placements|levels|diagnoses|hulls\/resolve)(\/|$)/;

/** While an edition is being written, whoever writes waits here: in SQLite the waiting would hold up every other request. */
export function writeGate(jobs: ImportJobs): RequestHandler {
  return (req, _res, next) => {
    if (!jobs.isWriting() || req.method === 'GET' || req.method === 'HEAD' || writesNothing.test(req.path)) return next();
    jobs.untilWritable().then(() => next(), next);
  };
}
