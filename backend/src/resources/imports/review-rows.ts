// Mending what the check found: one row in place, or every cell alike. Whatever is touched is judged again at once.
import { canonicalName } from '@tiltwright/shared/csv/headers.ts';
import type { RowPatch } from '@tiltwright/shared/schemas/import.ts';
import type { Fix } from '@tiltwright/shared/schemas/mapping.ts';
import type { ProblemIssue } from '@tiltwright/shared/schemas/problem.ts';
import type { Db } from '../../db/connect.ts';
import { importEdits } from '../../db/schema/import-work.ts';
import { ApiProblem } from '../../errors.ts';
import { audit } from '../audit.ts';
import { currentEdition } from '../catalog/queries.ts';
import { rowStore } from './import-rows.ts';
import type { Judge } from './judge-row.ts';
import { isColumn } from './map-columns.ts';
import { findEdit, findRow, type ImportRecord, type ImportRowRecord, importOrProblem, rowsOfKeys, setImport } from './queries.ts';
import { mappedReader } from './read-mapped.ts';
import { rowJudge } from './row-judge.ts';

/** Rows of one import that may be mended: checked, and against the catalog as it stands. @throws ApiProblem wrong-state, stale-edition */
function reviewable(db: Db, id: string): ImportRecord {
  const record = importOrProblem(db, id);
  if (record.status !== 'checked') throw new ApiProblem('wrong-state', `The rows of an import that is ${record.status} cannot be changed.`);
  if (record.checkedAgainst !== currentEdition(db))
    throw new ApiProblem('stale-edition', `Edition ${currentEdition(db)} was published since the check; check again. Edits are kept.`);
  return record;
}

const readerOf = ({ table, header, mapping, fixes, decimalComma }: ImportRecord) =>
  mappedReader(table, header ?? [], mapping, { fixes, ...(decimalComma !== null && { decimalComma }) });

/** @throws ApiProblem not-found, wrong-state, stale-edition, invalid-input */
export function patchRow(db: Db, id: string, n: number, patch: RowPatch): void {
  db.transaction(
    () => {
      const record = reviewable(db, id);
      const row = findRow(db, id, n);
      if (!row) throw new ApiProblem('not-found', `The import has no row ${n}.`);
      const before = findEdit(db, id, n);
      const cells = { ...before?.cells, ...namedCells(record, patch.cells ?? {}) };
      const edit = {
        cells: Object.fromEntries(Object.entries(cells).filter((entry): entry is [string, string] => entry[1] !== null)),
        decision: patch.decision === undefined ? (before?.decision ?? null) : patch.decision,
        resolution: patch.resolution === undefined ? (before?.resolution ?? null) : patch.resolution,
      };
      db.insert(importEdits)
        .values({ importId: id, n, ...edit })
        .onConflictDoUpdate({ target: [importEdits.importId, importEdits.n], set: edit })
        .run();
      judgeAgain(db, record, [row]);
    },
    { behavior: 'immediate' },
  );
}

/** New texts by canonical column, whichever name the caller used. */
function namedCells(record: ImportRecord, cells: Record<string, string | null>): Record<string, string | null> {
  const issues: ProblemIssue[] = [];
  const named = Object.entries(cells).map(([name, text]): [string, string | null] => {
    const column = columnNamed(record, name);
    if (!column)
      issues.push({
        path: `/cells/${name.replaceAll('~', '~0').replaceAll('/', '~1')}`,
        code: 'unknown-column',
        message: `No column that is read is called ${name}.`,
      });
    return [column ?? name, text];
  });
  if (issues.length > 0) throw new ApiProblem('invalid-input', issues[0]!.message, issues);
  return Object.fromEntries(named);
}

function columnNamed({ table, header, mapping }: ImportRecord, name: string): string | undefined {
  const at = header?.indexOf(name) ?? -1;
  const mapped = at >= 0 ? mapping?.columns.find((column) => column.at === at)?.to : undefined;
  if (mapped) return mapped;
  const canonical = canonicalName(table, name);
  return canonical !== undefined && isColumn(table, canonical) ? canonical : undefined;
}

/** Rows read in one step while looking for a cell. */
const rowsAtOnce = 2000;

/** Mends every cell that reads the same. @returns how many rows were judged again. @throws ApiProblem wrong-state, stale-edition, invalid-input */
export function fixCells(db: Db, id: string, fix: Fix, actor: string): number {
  return db.transaction(
    () => {
      const record = reviewable(db, id);
      const column = columnNamed(record, fix.column);
      if (!column)
        throw new ApiProblem('invalid-input', `column: no column that is read is called ${fix.column}.`, [
          { path: '/column', code: 'unknown-column', message: `No column that is read is called ${fix.column}.` },
        ]);
      const alike = rowsAlike(db, record, column, fix.from);
      if (alike.length === 0)
        throw new ApiProblem('invalid-input', `from: no row has this text in ${column}.`, [
          { path: '/from', code: 'not-in-file', message: `No row has this text in ${column}.` },
        ]);
      setImport(db, id, { fixes: [...record.fixes, { ...fix, column }] });
      audit(db, actor, 'import.fix', id, { column, rows: alike.length });
      judgeAgain(db, importOrProblem(db, id), alike);
      return alike.length;
    },
    { behavior: 'immediate' },
  );
}

function rowsAlike(db: Db, record: ImportRecord, column: string, from: string): ImportRowRecord[] {
  const reader = readerOf(record);
  const edits = rowStore(db, record.id).edits();
  const wanted = from.trim();
  const alike: ImportRowRecord[] = [];
  let after = -1;
  while (true) {
    const rows = rowsOfKeys(db, record.id, undefined, after, rowsAtOnce);
    if (rows.length === 0) return alike;
    for (const row of rows) {
      after = row.n;
      const edit = edits.get(row.n)?.cells;
      if (edit?.[column] === undefined && (reader.textOf(row.cells, column) ?? '').trim() === wanted) alike.push(row);
    }
  }
}

/** Judges these rows, and all that speak of the same records before or after, in the file's order; the counts follow. */
function judgeAgain(db: Db, record: ImportRecord, rows: readonly ImportRowRecord[]): void {
  const store = rowStore(db, record.id);
  const reader = readerOf(record);
  const edits = store.edits();
  const pending = new Map(rows.map((row) => [row.n, row] as const));
  const keys = new Set(rows.flatMap(({ rowKey }) => (rowKey === null ? [] : [rowKey])));
  const readPending = (n: number) => reader.read(pending.get(n)!.cells, edits.get(n)?.cells);
  const judgeWith = (judge: Judge, { n }: ImportRowRecord) => judge.judge(n, readPending(n), edits.get(n)?.resolution ?? null);
  // What the rows speak of now may be something else than before.
  const scout = rowJudge(db, record.table, readPending);
  for (const row of rows) {
    const { rowKey } = judgeWith(scout, row);
    if (rowKey !== null) keys.add(rowKey);
  }
  for (const row of rowsOfKeys(db, record.id, [...keys])) pending.set(row.n, row);

  const counts = { ...record.counts! };
  const judge = rowJudge(db, record.table, readPending);
  for (const row of [...pending.values()].sort((a, b) => a.n - b.n)) {
    const judged = judgeWith(judge, row);
    counts[row.fate]--;
    counts[judged.fate]++;
    store.put(row.n, row.cells, judged);
  }
  setImport(db, record.id, { counts });
}
