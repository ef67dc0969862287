// Writes openapi/openapi.json, or with --check says whether it is what the code describes.
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { readConfig } from '../config.ts';
import { connect, databaseFile } from '../db/connect.ts';
import { migrateDatabase } from '../db/migrate.ts';
import { createDeps } from '../deps.ts';
import { migrationsFolder, topFolder } from '../paths.ts';
import { allRoutes } from '../routes.ts';
import { openApiDocument } from './openapi.ts';

const file = path.join(topFolder, 'openapi/openapi.json');
const folder = mkdtempSync(path.join(tmpdir(), 'tiltwright-openapi-'));
const config = readConfig({ DATA_DIR: folder, NODE_ENV: 'test' });
const db = connect(databaseFile(folder));
migrateDatabase(db, migrationsFolder);
const text = `${JSON.stringify(openApiDocument(allRoutes(createDeps(db, config))), null, 2)}\n`;
db.$client.close();
rmSync(folder, { recursive: true });

if (!process.argv.includes('--check')) writeFileSync(file, text);
else if (readFileSync(file, 'utf8') !== text) {
  process.stderr.write('openapi/openapi.json is not what the code describes; run `npm run openapi:write`.\n');
  process.exit(1);
}
