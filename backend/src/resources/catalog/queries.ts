import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import { and, asc, count, desc, eq, gt, gte, inArray, isNull, lte, or, type SQL, sql } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { editions, hulls, makers, revisions, trimPoints } from '../../db/schema/catalog.ts';
import { firstChanges } from '../editions/first-changes.ts';
import { type CatalogRow, kinds } from './kinds.ts';

export interface ListFilter {
  maker?: string | undefined;
  form?: string | undefined;
  year?: number | undefined;
  lengthMinM?: number | undefined;
  lengthMaxM?: number | undefined;
  deadriseMinDeg?: number | undefined;
  deadriseMaxDeg?: number | undefined;
  generic?: boolean | undefined;
}

/** Number of the newest edition; 0 before anything is published. */
export const currentEdition = (db: Db): number =>
  db
    .select({ edition: sql<number>`coalesce(max(${editions.edition}), 0)` })
    .from(editions)
    .get()!.edition;

export function findRecord(db: Db, kind: CatalogTable, id: string): CatalogRow | undefined {
  const { table } = kinds[kind];
  return db.select().from(table).where(eq(table.id, id)).get() as CatalogRow | undefined;
}

/** Rows in a stable order, one more than `limit` where there is one. */
export function listRecords(db: Db, kind: CatalogTable, filter: ListFilter, limit: number, after: number): CatalogRow[] {
  const { table } = kinds[kind];
  return db
    .select()
    .from(table)
    .where(and(...conditions(kind, filter)))
    .orderBy(asc(table.maker), asc(table.model), asc(table.yearFrom), asc(table.id))
    .limit(limit + 1)
    .offset(after)
    .all() as CatalogRow[];
}

/** The rows of these ids that pass the filter, in the order of the ids. */
export function pickRecords(db: Db, kind: CatalogTable, ids: readonly string[], filter: ListFilter): CatalogRow[] {
  const { table } = kinds[kind];
  const rows = db
    .select()
    .from(table)
    .where(and(inArray(table.id, [...ids]), ...conditions(kind, filter)))
    .all() as CatalogRow[];
  const byId = new Map(rows.map((row) => [row.id, row]));
  return ids.flatMap((id) => byId.get(id) ?? []);
}

/** Ids of the hulls that pass the filter, in the order of ids. */
export const hullIdsAfter = (db: Db, filter: ListFilter, after: string | undefined, limit: number): string[] =>
  db
    .select({ id: hulls.id })
    .from(hulls)
    .where(and(...conditions('hulls', filter), ...(after === undefined ? [] : [gt(hulls.id, after)])))
    .orderBy(asc(hulls.id))
    .limit(limit)
    .all()
    .map(({ id }) => id);

export const countHulls = (db: Db, filter: ListFilter): number =>
  db
    .select({ n: count() })
    .from(hulls)
    .where(and(...conditions('hulls', filter)))
    .get()!.n;

function conditions(kind: CatalogTable, filter: ListFilter): SQL[] {
  const { table } = kinds[kind];
  const wanted: (SQL | undefined)[] = [
    eq(table.status, 'published'),
    filter.maker === undefined ? undefined : sql`lower(${table.maker}) = lower(${filter.maker})`,
    filter.generic === undefined ? undefined : eq(table.generic, filter.generic),
    filter.year === undefined ? undefined : or(isNull(table.yearFrom), lte(table.yearFrom, filter.year)),
    filter.year === undefined ? undefined : or(isNull(table.yearTo), gte(table.yearTo, filter.year)),
    filter.form === undefined ? undefined : eq(hulls.form, filter.form),
    filter.lengthMinM === undefined ? undefined : gte(hulls.lengthM, filter.lengthMinM),
    filter.lengthMaxM === undefined ? undefined : lte(hulls.lengthM, filter.lengthMaxM),
    filter.deadriseMinDeg === undefined ? undefined : gte(hulls.deadriseDeg, filter.deadriseMinDeg),
    filter.deadriseMaxDeg === undefined ? undefined : lte(hulls.deadriseDeg, filter.deadriseMaxDeg),
  ];
  return wanted.filter((condition) => condition !== undefined);
}

export const listTrimPoints = (db: Db, hullId: string) =>
  db
    .select()
    .from(trimPoints)
    .where(and(eq(trimPoints.hullId, hullId), eq(trimPoints.status, 'published')))
    .orderBy(asc(trimPoints.speedKn), asc(trimPoints.id))
    .all();

/** A record's history, newest first. */
export const listRevisions = (db: Db, recordId: string) =>
  db
    .select()
    .from(revisions)
    .where(eq(revisions.recordId, recordId))
    .orderBy(desc(revisions.revision))
    .all()
    .map((row) => (row.before === null ? { ...row, changes: firstChanges(row.after) } : row));

export const listMakers = (db: Db) => db.select({ name: makers.name }).from(makers).orderBy(asc(makers.name)).all();
export const listEditions = (db: Db, limit: number, after: number) =>
  db
    .select()
    .from(editions)
    .orderBy(desc(editions.edition))
    .limit(limit + 1)
    .offset(after)
    .all();
export const findEdition = (db: Db, edition: number) => db.select().from(editions).where(eq(editions.edition, edition)).get();
