import { readFileSync } from 'node:fs';
import path from 'node:path';
import { migrate } from 'drizzle-orm/better-sqlite3/migrator';
import { StartProblem } from '../start-problem.ts';
import type { Db } from './connect.ts';

interface Journal {
  entries: { when: number; tag: string }[];
}

/**
 * Brings the database to the code's schema.
 * @throws StartProblem when the database was written by newer code, or when rows would lose what they refer to.
 */
export function migrateDatabase(db: Db, migrationsFolder: string): void {
  refuseNewerDatabase(db, migrationsFolder);
  // The migrator works inside a transaction, where this pragma does nothing, and a table rebuild
  // would then cascade deletes: it has to be off before, and the references checked after.
  db.$client.pragma('foreign_keys = OFF');
  migrate(db, { migrationsFolder });
  const broken = db.$client.pragma('foreign_key_check') as unknown[];
  if (broken.length > 0)
    throw new StartProblem(`The migration left ${broken.length} rows that refer to nothing; restore the backup of the data folder.`);
  db.$client.pragma('foreign_keys = ON');
}

function refuseNewerDatabase(db: Db, migrationsFolder: string): void {
  const known = JSON.parse(readFileSync(path.join(migrationsFolder, 'meta/_journal.json'), 'utf8')) as Journal;
  const newestKnown = Math.max(...known.entries.map((entry) => entry.when));
  const has = db.$client.prepare("SELECT 1 FROM sqlite_master WHERE name = '__drizzle_migrations'").get();
  if (!has) return;
  const row = db.$client.prepare('SELECT max(created_at) AS newest FROM __drizzle_migrations').get() as { newest: number | null };
  if (row.newest !== null && row.newest > newestKnown) {
    throw new StartProblem(
      'The database was written by a newer version of Tiltwright; start that version, or point DATA_DIR at another folder.',
    );
  }
}
