import type { Config } from './config.ts';
import type { Db } from './db/connect.ts';
import type { CatalogSearch } from './resources/search/search-catalog.ts';

/** What routes are given; there is no other way to reach the database or the settings. */
export interface Deps {
  db: Db;
  config: Config;
  search: CatalogSearch;
}
