// Once a run: migrates and seeds a database that every API test copies.
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { readConfig } from '../../backend/src/config.ts';
import { connect, databaseFile } from '../../backend/src/db/connect.ts';
import { migrateDatabase } from '../../backend/src/db/migrate.ts';
import { seedDemoWorld } from '../../backend/src/db/seed.ts';
import { migrationsFolder, seedsFolder } from '../../backend/src/paths.ts';

export default async function setup({ provide }: { provide: (key: 'seededDataFolder', value: string) => void }) {
  const folder = mkdtempSync(path.join(tmpdir(), 'tiltwright-seeded-'));
  const config = readConfig({ DATA_DIR: folder, NODE_ENV: 'test', LOG_LEVEL: 'silent' });
  const db = connect(databaseFile(folder));
  migrateDatabase(db, migrationsFolder);
  await seedDemoWorld(db, config, seedsFolder);
  // A copy takes one file: what the write-ahead log holds has to be in it.
  db.$client.pragma('wal_checkpoint(TRUNCATE)');
  db.$client.close();
  provide('seededDataFolder', folder);
  return () => rmSync(folder, { recursive: true, force: true });
}
