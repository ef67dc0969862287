// The demo world, through the same upload, check and publish that a steward uses.
import { copyFile, readFile } from 'node:fs/promises';
import path from 'node:path';
import type { Role } from '@tiltwright/shared/schemas/account.ts';
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { Config } from '../config.ts';
import { inProcessJobs } from '../jobs/in-process-jobs.ts';
import { createAccount } from '../resources/accounts/create-account.ts';
import { findUserByEmail } from '../resources/accounts/queries.ts';
import { currentEdition } from '../resources/catalog/queries.ts';
import { beginCheck, runCheck } from '../resources/imports/check-import.ts';
import { beginPublish, publishImport } from '../resources/imports/publish-import.ts';
import { importOrProblem, listRows } from '../resources/imports/queries.ts';
import { uploadImport } from '../resources/imports/upload-import.ts';
import { StartProblem } from '../start-problem.ts';
import type { Db } from './connect.ts';
import { seedBoats } from './seed-boats.ts';

export const demoPassword = 'loft-floor-2026';
const roleSets: Record<string, Role[]> = { customer: ['customer'], integrator: ['integrator'], steward: ['steward'], admin: ['admin'] };
export const demoAccounts = Object.entries(roleSets).map(([name, roles]) => ({
  email: `${name}@tiltwright.example`,
  name: `Demo ${name}`,
  roles,
}));

/** In this order: a trim point names a hull. The generic parts come first and carry the unlisted boat. */
const files: [file: string, table: Table][] = [
  ['generic/hulls.csv', 'hulls'],
  ['generic/lower-units.csv', 'lower-units'],
  ['generic/transducers.csv', 'transducers'],
  ['generic/mounts.csv', 'mounts'],
  ['hulls.csv', 'hulls'],
  ['lower-units.csv', 'lower-units'],
  ['transducers.csv', 'transducers'],
  ['mounts.csv', 'mounts'],
  ['trim-points.csv', 'trim-points'],
];

/** Makes the demo accounts and, in an empty catalog, publishes every table of the seeds folder. */
export async function seedDemoWorld(db: Db, config: Config, seedsFolder: string): Promise<void> {
  for (const account of demoAccounts) {
    if (!findUserByEmail(db, account.email)) await createAccount(db, { ...account, password: demoPassword });
  }
  if (currentEdition(db) > 0) return;
  const steward = findUserByEmail(db, 'steward@tiltwright.example')!.id;
  for (const [file, table] of files) await importSeed(db, config, path.join(seedsFolder, file), table, steward);
  seedBoats(db, await readFile(path.join(seedsFolder, 'demo-boats.csv'), 'utf8'));
}

/** @throws StartProblem naming the first wrong row */
async function importSeed(db: Db, config: Config, file: string, table: Table, steward: string): Promise<void> {
  const storedAs = `seed-${path.basename(path.dirname(file))}-${path.basename(file)}`;
  await copyFile(file, path.join(config.uploadsFolder, storedAs));
  const { id } = await uploadImport(
    { db, config, jobs: inProcessJobs({ db, config }) },
    { table, fileName: path.basename(file), storedAs },
    steward,
  );
  beginCheck({ db }, id);
  await runCheck({ db, config }, id);
  const { counts, problem } = importOrProblem(db, id);
  const wrong = listRows(db, id, 'error', 1, 0)[0];
  if (!counts || wrong) {
    const why = wrong
      ? `row ${wrong.n}: ${wrong.errors.map(({ column, message }) => `${column}: ${message}`).join(' ')}`
      : problem?.message;
    throw new StartProblem(`The demo table ${file} cannot be loaded: ${why}`);
  }
  beginPublish(db, id);
  publishImport(db, id, { why: 'The demo world', holdCautions: false }, steward);
}
