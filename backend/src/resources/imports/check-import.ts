// The check: every row of the kept file gets its fate, in batches that each stand by themselves, so that a stop loses none of them.
import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { type FateCounts, fates } from '@tiltwright/shared/schemas/import.ts';
import type { Config } from '../../config.ts';
import type { Db } from '../../db/connect.ts';
import { ApiProblem } from '../../errors.ts';
import { currentEdition } from '../catalog/queries.ts';
import { rowStore } from './import-rows.ts';
import type { Judgement } from './judge-row.ts';
import { missingColumns } from './map-columns.ts';
import { type ImportRecord, importOrProblem, setImport } from './queries.ts';
import { mappedReader } from './read-mapped.ts';
import { eachRow, readHead } from './read-table.ts';
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
  // The whole file was looked at when it came: now its head is enough to know where the rows begin.
  const table = readHead(bytes, { table: record.table, headerRow: record.headerRow, ...choicesOf(record) }, 1);
  const reader = mappedReader(record.table, table.header, record.mapping, {
    fixes: record.fixes,
    ...(record.decimalComma !== null && { decimalComma: record.decimalComma }),
  });
  const store = rowStore(db, id);
  const edits = store.edits();
  const read = (n: number, cells: readonly string[]) => reader.read(cells, edits.get(n)?.cells);

  const done = resumable(db, record) ? record.checkedRows : 0;
  if (done === 0) store.clear();
  const counts = done === 0 ? noCounts() : store.counts();
  const known = new Map((done === 0 ? [] : store.keys()).map(({ n, rowKey }) => [n, rowKey]));
  let batch: JudgedRow[] = [];
  const judge = rowJudge(db, record.table, (n) => read(n, batch.find((row) => row.n === n)?.cells ?? store.cells(n)));
  let [passed, kept] = [0, done];

  // One read transaction a batch: beginning one for each look-up costs more than the look-up.
  const reading = readTransaction(db);
  const keep = (): boolean => {
    reading.end();
    const stillWanted = keepBatch(db, id, store, batch, kept);
    kept += batch.length;
    batch = [];
    return stillWanted;
  };
  let wanted = true;
  try {
    eachRow(bytes, table, (n, cells) => {
      if (passed++ < done) {
        const rowKey = known.get(n);
        if (rowKey !== undefined) judge.noteDone(n, rowKey, read(n, cells));
        return true;
      }
      reading.begin();
      const judged = judge.judge(n, read(n, cells), edits.get(n)?.resolution ?? null);
      counts[judged.fate]++;
      batch.push({ n, cells, judged });
      if (batch.length >= rowsAtOnce) wanted = keep();
      return wanted;
    });
    if (wanted && batch.length > 0) wanted = keep();
  } finally {
    reading.end();
  }
  if (wanted) finishCheck(db, id, { counts, rows: kept, header: table.header });
}

/** Sees the catalog as it was when it began; never open while anything is written. */
function readTransaction({ $client: sqlite }: Db): { begin(): void; end(): void } {
  return {
    begin: () => void (sqlite.inTransaction || sqlite.exec('BEGIN')),
    end: () => void (sqlite.inTransaction && sqlite.exec('COMMIT')),
  };
}

interface JudgedRow {
  n: number;
  cells: string[];
  judged: Judgement;
}

/** One durable step. @returns false where the check was cancelled, or begun anew, which has set the count back */
function keepBatch(db: Db, id: string, store: ReturnType<typeof rowStore>, batch: readonly JudgedRow[], kept: number): boolean {
  return db.transaction(
    () => {
      const now = importOrProblem(db, id);
      if (now.status !== 'checking' || now.checkedRows !== kept) return false;
      for (const { n, cells, judged } of batch) store.put(n, cells, judged);
      setImport(db, id, { checkedRows: kept + batch.length });
      return true;
    },
    { behavior: 'immediate' },
  );
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
