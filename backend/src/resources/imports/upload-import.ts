// Keeps an uploaded table and looks at what it is; a file that is no table is refused and not kept.
import { rm } from 'node:fs/promises';
import path from 'node:path';
import type { TableOptions } from '@tiltwright/shared/csv/formats.ts';
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { Config } from '../../config.ts';
import type { Db } from '../../db/connect.ts';
import { imports } from '../../db/schema/imports.ts';
import { newId } from '../../ids.ts';
import type { ImportJobs } from '../../jobs/import-jobs.ts';
import { audit } from '../audit.ts';
import { type ImportRecord, importOrProblem } from './queries.ts';

export interface Upload {
  table: Table;
  fileName: string;
  /** Name of the file inside the uploads folder. */
  storedAs: string;
  /** What the sender says of the file, where it is not to be found out. */
  choices?: Pick<TableOptions, 'headerRow' | 'encoding' | 'delimiter'>;
}

interface UploadDeps {
  db: Db;
  config: Pick<Config, 'uploadsFolder'>;
  jobs: ImportJobs;
}

/** @throws ApiProblem binary-file, wrong-encoding, no-header or bad-table; the file is then gone */
export async function uploadImport({ db, config, jobs }: UploadDeps, upload: Upload, actor: string): Promise<ImportRecord> {
  const { table, fileName, storedAs, choices = {} } = upload;
  try {
    const found = await jobs.run({ kind: 'inspect', table, storedAs, choices });
    await jobs.untilWritable();
    const id = newId('imp');
    db.transaction(
      (tx) => {
        tx.insert(imports)
          .values({ ...found, id, table, status: 'uploaded', fileName, storedAs, createdAt: new Date().toISOString(), createdBy: actor })
          .run();
        audit(tx, actor, 'import.upload', id, { table, fileName });
      },
      { behavior: 'immediate' },
    );
    return importOrProblem(db, id);
  } catch (error) {
    await rm(path.join(config.uploadsFolder, storedAs), { force: true });
    throw error;
  }
}
