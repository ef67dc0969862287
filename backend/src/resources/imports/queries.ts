import type { Fate, Import, ImportRow } from '@tiltwright/shared/schemas/import.ts';
import { and, asc, desc, eq, inArray, ne } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { importRows, imports } from '../../db/schema/imports.ts';
import { ApiProblem } from '../../errors.ts';

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

export const rowsToPublish = (db: Pick<Db, 'select'>, importId: string) =>
  db
    .select()
    .from(importRows)
    .where(and(eq(importRows.importId, importId), inArray(importRows.fate, ['new', 'changed'])))
    .orderBy(asc(importRows.n))
    .all();

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
  const { storedAs: _storedAs, checkedAgainst: _checkedAgainst, header: _header, mapping: _mapping, fixes: _fixes, ...shown } = row;
  return { ...shown, sameFileAs: sameFileAs(db, row) };
}

export function toImportRow(row: ImportRowRecord, header: readonly string[]): ImportRow {
  const { n, fate, name, recordId, errors, cautions, changes, cells } = row;
  return {
    n,
    fate,
    name,
    record: recordId,
    errors,
    cautions,
    changes,
    cells: Object.fromEntries(header.map((column, index) => [column, cells[index] ?? ''])),
    edits: {},
    decision: null,
    resolution: null,
  };
}
