// The check: every row of the kept file gets its fate. Runs beside the requests, in small pieces.
import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { setImmediate as breathe } from 'node:timers/promises';
import { compileRowReader } from '@tiltwright/shared/csv/read-row.ts';
import { type FateCounts, fates } from '@tiltwright/shared/schemas/import.ts';
import { eq } from 'drizzle-orm';
import { importRows } from '../../db/schema/imports.ts';
import type { Deps } from '../../deps.ts';
import { ApiProblem } from '../../errors.ts';
import { currentEdition } from '../catalog/queries.ts';
import { catalogJudge, trimPointJudge } from './judge-row.ts';
import { type ImportRecord, importOrProblem, setImport } from './queries.ts';
import { readTable } from './read-table.ts';
import { isCatalogTable } from './stored.ts';

/** Rows judged before other requests get their turn: a few milliseconds' worth. */
const rowsAtOnce = 200;

/** Sets the status to `checking`. @throws ApiProblem wrong-state */
export function beginCheck({ db }: Pick<Deps, 'db'>, id: string): ImportRecord {
  const record = importOrProblem(db, id);
  const checkable = ['uploaded', 'mapped', 'checked', 'failed'].includes(record.status);
  if (!checkable) throw new ApiProblem('wrong-state', `An import that is ${record.status} cannot be checked.`);
  db.transaction(
    (tx) => {
      tx.delete(importRows).where(eq(importRows.importId, id)).run();
      setImport(tx, id, { status: 'checking', counts: null, checkedRows: 0, problem: null, checkedAgainst: currentEdition(db) });
    },
    { behavior: 'immediate' },
  );
  return importOrProblem(db, id);
}

/** Judges every row; ends as `checked`, or as `failed` with the reason kept. */
export async function runCheck({ db, config }: Pick<Deps, 'db' | 'config'>, id: string): Promise<void> {
  const record = importOrProblem(db, id);
  try {
    const table = readTable(await readFile(path.join(config.uploadsFolder, record.storedAs)), record.table);
    const read = compileRowReader(record.table, table.header, { decimalComma: table.decimalComma });
    const judge = isCatalogTable(record.table) ? catalogJudge(db, record.table) : trimPointJudge(db);
    const counts = Object.fromEntries(fates.map((fate) => [fate, 0])) as FateCounts;

    for (let from = 0; from < table.rows.length; from += rowsAtOnce) {
      const rows = table.rows
        .slice(from, from + rowsAtOnce)
        .map(({ n, cells }) => ({ importId: id, n, cells: [...cells], ...judge(n, read(cells)) }));
      for (const row of rows) counts[row.fate]++;
      const stillWanted = db.transaction(
        (tx) => {
          if (importOrProblem(db, id).status !== 'checking') return false;
          for (const row of rows) tx.insert(importRows).values(row).run();
          setImport(tx, id, { checkedRows: from + rows.length });
          return true;
        },
        { behavior: 'immediate' },
      );
      if (!stillWanted) return;
      await breathe();
    }
    setImport(db, id, { status: 'checked', counts, rows: table.rows.length, header: table.header });
  } catch (error) {
    if (!db.$client.open) return;
    const message = error instanceof ApiProblem ? error.message : 'The check ended unexpectedly; try again.';
    setImport(db, id, { status: 'failed', problem: { code: error instanceof ApiProblem ? error.code : 'internal-error', message } });
    if (!(error instanceof ApiProblem)) throw error;
  }
}
