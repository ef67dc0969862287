// Keeps an uploaded table and looks at its head; a file that is no table is refused and not kept.
import { createHash } from 'node:crypto';
import { readFile, rm } from 'node:fs/promises';
import path from 'node:path';
import { matchHeader } from '@tiltwright/shared/csv/headers.ts';
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import { imports } from '../../db/schema/imports.ts';
import type { Deps } from '../../deps.ts';
import { newId } from '../../ids.ts';
import { audit } from '../audit.ts';
import { type ImportRecord, importOrProblem } from './queries.ts';
import { readTable } from './read-table.ts';

export interface Upload {
  table: Table;
  fileName: string;
  /** Name of the file inside the uploads folder. */
  storedAs: string;
}

/** @throws ApiProblem binary-file, wrong-encoding, no-header or bad-table; the file is then gone */
export async function uploadImport({ db, config }: Pick<Deps, 'db' | 'config'>, upload: Upload, actor: string): Promise<ImportRecord> {
  const file = path.join(config.uploadsFolder, upload.storedAs);
  try {
    const bytes = await readFile(file);
    const table = readTable(bytes, upload.table);
    const id = newId('imp');
    db.transaction(
      (tx) => {
        tx.insert(imports)
          .values({
            id,
            table: upload.table,
            status: 'uploaded',
            fileName: upload.fileName,
            storedAs: upload.storedAs,
            bytes: bytes.length,
            sha256: createHash('sha256').update(bytes).digest('hex'),
            encoding: table.encoding,
            delimiter: table.delimiter,
            rows: table.rows.length,
            header: table.header,
            unknownColumns: matchHeader(upload.table, table.header).unknown.map(({ header }) => header),
            createdAt: new Date().toISOString(),
            createdBy: actor,
          })
          .run();
        audit(tx, actor, 'import.upload', id, { table: upload.table, fileName: upload.fileName });
      },
      { behavior: 'immediate' },
    );
    return importOrProblem(db, id);
  } catch (error) {
    await rm(file, { force: true });
    throw error;
  }
}
