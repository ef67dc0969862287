import type { Fate, Import, ImportRow } from '@tiltwright/shared/schemas/import.ts';
import { and, asc, desc, eq, gt, inArray, ne, type SQL } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { importEdits } from '../../db/schema/import-work.ts';
import { importRows, imports } from '../../db/schema/imports.ts';
import { ApiProblem } from '../../errors.ts';
import { firstChanges } from '../editions/first-changes.ts';

export type ImportRecord = typeof imports.$inferSelect;
export type ImportRowRecord = typeof importRows.$inferSelect;

/** @throws ApiProblem not-found */
export function importOrProblem(db: Db, id: string): ImportRecord {
  const found = db.select().from(imports).where(eq(imports.id, id)).get();
  if (!found) throw new ApiProblem('not-found', `There is no import ${id}.`);
  return found;
}

export const setImport = (db: Pick<Db, 'update'>, id: string, set: Partial<ImportRecord>) =>
  db.update(imports).set(set).where(eq(imports.id, id)).run();

export const listImports = (db: Db, limit: number, after: number) =>
  db
    .select()
    .from(imports)
    .orderBy(desc(imports.id))
    .limit(limit + 1)
    .offset(after)
    .all();

export function listRows(db: Db, importId: string, fate: Fate | undefined, limit: number, after: number): ImportRowRecord[] {
  return db
    .select()
    .from(importRows)
    .where(and(eq(importRows.importId, importId), fate && eq(importRows.fate, fate)))
    .orderBy(asc(importRows.n))
    .limit(limit + 1)
    .offset(after)
    .all();
}

export const findRow = (db: Db, importId: string, n: number): ImportRowRecord | undefined =>
  db
    .select()
    .from(importRows)
    .where(and(eq(importRows.importId, importId), eq(importRows.n, n)))
    .get();

/** Rows that speak of these things, all of them where `keys` is undefined, in the file's order behind row `after`. */
export function rowsOfKeys(db: Db, importId: string, keys: readonly string[] | undefined, after = -1, limit = 250_000): ImportRowRecord[] {
  const read = (condition?: SQL) =>
    db
      .select()
      .from(importRows)
      .where(and(eq(importRows.importId, importId), gt(importRows.n, after), condition))
      .orderBy(asc(importRows.n))
      .limit(limit)
      .all();
  if (keys === undefined) return read();
  const found: ImportRowRecord[] = [];
  for (let from = 0; from < keys.length; from += keysAtOnce)
    found.push(...read(inArray(importRows.rowKey, keys.slice(from, from + keysAtOnce))));
  return found;
}

/** SQLite takes 32 766 variables in one statement. */
const keysAtOnce = 10_000;

export const findEdit = (db: Db, importId: string, n: number) =>
  db
    .select()
    .from(importEdits)
    .where(and(eq(importEdits.importId, importId), eq(importEdits.n, n)))
    .get();

/** An earlier import of the very same bytes. */
export function sameFileAs(db: Db, of: ImportRecord): string | null {
  const earlier = db
    .select({ id: imports.id })
    .from(imports)
    .where(and(eq(imports.sha256, of.sha256), ne(imports.id, of.id)))
    .orderBy(asc(imports.id))
    .get();
  return earlier && earlier.id < of.id ? earlier.id : null;
}

export function toImport(db: Db, row: ImportRecord): Import {
  const {
    storedAs: _storedAs,
    checkedAgainst: _checkedAgainst,
    header: _header,
    mapping: _mapping,
    fixes: _fixes,
    decimalComma: _comma,
    ...shown
  } = row;
  return { ...shown, sameFileAs: sameFileAs(db, row) };
}

/** Rows as the API shows them, with what people did to them. */
export function toImportRows(db: Db, importId: string, header: readonly string[], rows: readonly ImportRowRecord[]): ImportRow[] {
  const numbers = rows.map(({ n }) => n);
  const edits = db
    .select()
    .from(importEdits)
    .where(and(eq(importEdits.importId, importId), inArray(importEdits.n, numbers)))
    .all();
  const byRow = new Map(edits.map((edit) => [edit.n, edit]));
  return rows.map(({ n, fate, name, recordId, errors, cautions, changes, cells, write }) => ({
    ...{ n, fate, name, record: recordId, errors, cautions },
    changes: fate === 'new' && write ? firstChanges(write.values) : changes,
    cells: Object.fromEntries(header.map((column, index) => [column || `column ${index + 1}`, cells[index] ?? ''])),
    edits: byRow.get(n)?.cells ?? {},
    decision: byRow.get(n)?.decision ?? null,
    resolution: byRow.get(n)?.resolution ?? null,
  }));
}
