import type { Config } from './config.ts';
import type { Db } from './db/connect.ts';
import { type FitPool, fitPool } from './fit-pool/fit-pool.ts';
import { createLimits, type Limits } from './http/limits.ts';
import type { ImportJobs } from './jobs/import-jobs.ts';
import { inProcessJobs } from './jobs/in-process-jobs.ts';
import { type PartLookup, partLookup } from './resources/questions/part-lookup.ts';
import { type CatalogSearch, catalogSearch } from './resources/search/search-catalog.ts';
import { type UsageCounter, usageCounter } from './resources/usage/usage-counter.ts';

/** What routes are given; there is no other way to reach the database or the settings. */
export interface Deps {
  db: Db;
  config: Config;
  search: CatalogSearch;
  usage: UsageCounter;
  limits: Limits;
  jobs: ImportJobs;
  parts: PartLookup;
  pool: FitPool;
}

/** What runs beside the thread that answers requests; in this one where nothing is given. */
interface Hands {
  jobs?: ImportJobs;
  pool?: FitPool;
}

/** Everything the server is made of; starts no timer. */
export function createDeps(db: Db, config: Config, { jobs = inProcessJobs({ db, config }), pool = fitPool(0) }: Hands = {}): Deps {
  const usage = usageCounter(db);
  return { db, config, search: catalogSearch(db), usage, limits: createLimits(db, config, usage), jobs, parts: partLookup(db), pool };
}
