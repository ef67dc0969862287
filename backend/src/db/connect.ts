// The one place that opens the database; every pragma stands here with its why.
import path from 'node:path';
import Database from 'better-sqlite3';
import { type BetterSQLite3Database, drizzle } from 'drizzle-orm/better-sqlite3';
import * as access from './schema/access.ts';
import * as catalog from './schema/catalog.ts';
import * as importWork from './schema/import-work.ts';
import * as imports from './schema/imports.ts';
import * as jobs from './schema/jobs.ts';
import * as limits from './schema/limits.ts';
import * as mail from './schema/mail.ts';
import * as outbox from './schema/outbox.ts';
import * as people from './schema/people.ts';
import * as savedFits from './schema/saved-fits.ts';
import * as webhooks from './schema/webhooks.ts';

export const schema = {
  ...catalog,
  ...people,
  ...imports,
  ...importWork,
  ...outbox,
  ...access,
  ...mail,
  ...limits,
  ...savedFits,
  ...webhooks,
  ...jobs,
};
export type Db = BetterSQLite3Database<typeof schema> & { $client: Database.Database };

/** Opens (and makes, where missing) the database file; `:memory:` for tests that need no file. */
export function connect(file: string): Db {
  const sqlite = new Database(file);
  // Readers and the one writer do not wait for each other.
  sqlite.pragma('journal_mode = WAL');
  // A reopened WAL database falls back to NORMAL; people's edits must survive a power cut.
  sqlite.pragma('synchronous = FULL');
  // Off by default in SQLite; every reference in the schema relies on it.
  sqlite.pragma('foreign_keys = ON');
  // Another process (a migration, an import worker) may hold the write lock for a moment.
  sqlite.pragma('busy_timeout = 5000');
  // Sorting and temporary tables in memory: the data folder may be on a slow disk.
  sqlite.pragma('temp_store = MEMORY');
  // 32 MB of pages; the demo world fits whole, 100 000 hulls nearly.
  sqlite.pragma('cache_size = -32000');
  return drizzle(sqlite, { schema });
}

export const databaseFile = (dataFolder: string) => path.join(dataFolder, 'tiltwright.sqlite');
