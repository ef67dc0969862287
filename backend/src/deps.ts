import type { Config } from './config.ts';
import type { Db } from './db/connect.ts';
import { createLimits, type Limits } from './http/limits.ts';
import type { ImportJobs } from './jobs/import-jobs.ts';
import { inProcessJobs } from './jobs/in-process-jobs.ts';
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
}

/** Everything the server is made of; starts no timer. Imports run in this process where no worker is given. */
export function createDeps(db: Db, config: Config, jobs: ImportJobs = inProcessJobs({ db, config })): Deps {
  const usage = usageCounter(db);
  return { db, config, search: catalogSearch(db), usage, limits: createLimits(db, config, usage), jobs };
}
