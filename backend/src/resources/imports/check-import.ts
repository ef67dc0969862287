// The check: every row of the kept file gets its fate, in batches that each stand by themselves, so that a stop loses none of them.
import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { setImmediate as breathe } from 'node:timers/promises';
import type { RowReading } from '@tiltwright/shared/csv/read-row.ts';
import { type FateCounts, fates } from '@tiltwright/shared/schemas/import.ts';
import type { Config } from '../../config.ts';
import type { Db } from '../../db/connect.ts';
import { ApiProblem } from '../../errors.ts';
import { currentEdition } from '../catalog/queries.ts';
import { rowStore } from './import-rows.ts';
import { missingColumns } from './map-columns.ts';
import { type ImportRecord, importOrProblem, setImport } from './queries.ts';
import { mappedReader } from './read-mapped.ts';
import { readTable } from './read-table.ts';
import { rowJudge } from './row-judge.ts';

/** Rows to one durable step: some 20 ms of judging, a few of writing. */
const rowsAtOnce = 1000;

export interface CheckDeps {
  db: Db;
  config: Pick<Config, 'uploadsFolder'>;
}

/** Sets the status to `checking`. @throws ApiProblem wrong-state, incomplete-mapping */
export function beginCheck({ db }: Pick<CheckDeps, 'db'>, id: string): ImportRecord {
  const record = importOrProblem(db, id);
  const checkable = ['uploaded', 'mapped', 'checked', 'failed'].includes(record.status);
  if (!checkable) throw new ApiProblem('wrong-state', `An import that is ${record.status} cannot be checked.`);
  const missing = record.mapping ? missingColumns(record.table, record.mapping) : [];
  if (missing.length > 0 || (record.needsMapping && !record.mapping))
    throw new ApiProblem(
      'incomplete-mapping',
      missing.length > 0
        ? `Map a column to ${missing.join(', ')}, or give a constant.`
        : 'The header is in words of its own: map its columns first.',
      missing.map((column) => ({ path: '/mapping', code: 'required-column', message: `Nothing fills ${column}, which every row needs.` })),
    );
  setImport(db, id, { status: 'checking', counts: null, checkedRows: 0, problem: null, checkedAgainst: currentEdition(db) });
  return importOrProblem(db, id);
}

/** Judges every row, from where an earlier run stopped; ends as `checked`, or as `failed` with the reason kept. */
export async function runCheck(deps: CheckDeps, id: string): Promise<void> {
  const { db } = deps;
  try {
    await judgeRows(deps, id);
  } catch (error) {
    if (!db.$client.open) return;
    if (isFull(error)) makeRoom(db, id);
    setImport(db, id, { status: 'failed', problem: reasonOf(error) });
    if (!(error instanceof ApiProblem) && !isFull(error)) throw error;
  }
}

const isFull = (error: unknown) => ['SQLITE_FULL', 'ENOSPC'].includes((error as { code?: string }).code ?? '');

/** Judged rows can be had again, and saying why the check ended needs room too. */
function makeRoom(db: Db, id: string): void {
  try {
    rowStore(db, id).clear();
  } catch (error) {
    if (!isFull(error)) throw error;
  }
}

function reasonOf(error: unknown): { code: string; message: string } {
  if (error instanceof ApiProblem) return { code: error.code, message: error.message };
  if (isFull(error)) return { code: 'storage-full', message: 'The disk is full; make room and check again. Nothing was published.' };
  if ((error as NodeJS.ErrnoException).code === 'ENOENT')
    return { code: 'internal-error', message: 'The uploaded file is gone; upload it again.' };
  return { code: 'internal-error', message: 'The check ended unexpectedly; try again.' };
}

async function judgeRows({ db, config }: CheckDeps, id: string): Promise<void> {
  const record = importOrProblem(db, id);
  if (record.status !== 'checking') return;
  const bytes = await readFile(path.join(config.uploadsFolder, record.storedAs));
  const table = readTable(bytes, { table: record.table, headerRow: record.headerRow, ...choicesOf(record) });
  const reader = mappedReader(record.table, table.header, record.mapping, { decimalComma: table.decimalComma, fixes: record.fixes });
  const rows = rowStore(db, id);
  const edits = rows.edits();
  const read = (at: number) => reader.read(table.rows[at]!.cells, edits.get(table.rows[at]!.n)?.cells);
  const judge = rowJudge(db, record.table, (n) => readRowNumber(table.rows, n, read));

  let done = resumable(db, record) ? record.checkedRows : 0;
  if (done === 0) rows.clear();
  const counts = done === 0 ? noCounts() : rows.counts();
  for (const { n, rowKey } of done === 0 ? [] : rows.keys()) judge.noteDone(n, rowKey, readRowNumber(table.rows, n, read));

  while (done < table.rows.length) {
    const batch = table.rows.slice(done, done + rowsAtOnce).map(({ n, cells }, index) => {
      const judged = judge.judge(n, read(done + index), edits.get(n)?.resolution ?? null);
      counts[judged.fate]++;
      return { n, cells, judged };
    });
    const stillWanted = db.transaction(
      () => {
        const now = importOrProblem(db, id);
        // A check begun anew has set the count back.
        if (now.status !== 'checking' || now.checkedRows !== done) return false;
        for (const row of batch) rows.put(row.n, row.cells, row.judged);
        setImport(db, id, { checkedRows: done + batch.length });
        return true;
      },
      { behavior: 'immediate' },
    );
    if (!stillWanted) return;
    done += batch.length;
    await breathe();
  }
  finishCheck(db, id, {
    ...{ counts, rows: table.rows.length, header: table.header, decimalComma: table.decimalComma ?? null },
  });
}

/** Rows judged against an older edition are judged again. */
function resumable(db: Db, record: ImportRecord): boolean {
  if (record.checkedAgainst === currentEdition(db)) return true;
  setImport(db, record.id, { checkedAgainst: currentEdition(db), checkedRows: 0 });
  return false;
}

function finishCheck(db: Db, id: string, end: Partial<ImportRecord>): void {
  db.transaction(
    () => {
      if (importOrProblem(db, id).status === 'checking') setImport(db, id, { status: 'checked', ...end });
    },
    { behavior: 'immediate' },
  );
}

export const choicesOf = ({ encoding, delimiter }: ImportRecord) => ({
  ...(encoding && { encoding: encoding as never }),
  ...(delimiter && { delimiter: delimiter as never }),
});

const noCounts = () => Object.fromEntries(fates.map((fate) => [fate, 0])) as FateCounts;

function readRowNumber(rows: readonly { n: number }[], n: number, read: (at: number) => RowReading): RowReading {
  // Rows stand in the order of their numbers.
  let [low, high] = [0, rows.length - 1];
  while (low < high) {
    const middle = (low + high) >> 1;
    if (rows[middle]!.n < n) low = middle + 1;
    else high = middle;
  }
  return read(low);
}
