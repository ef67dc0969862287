// What the catalog holds, as an import looks at it.
import { matchKey, normaliseName } from '@tiltwright/shared/names.ts';
import { type CatalogTable, catalogTables } from '@tiltwright/shared/schemas/catalog-record.ts';
import { and, eq, ne, sql } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { aliases, type Provenance, trimPoints } from '../../db/schema/catalog.ts';
import { type CatalogRow, kinds } from '../catalog/kinds.ts';
import { findRecord } from '../catalog/queries.ts';

/** Years a record stands for; null is open. */
export interface Years {
  from: number | null;
  to: number | null;
}

export const overlap = (a: Years, b: Years) => (a.from ?? 0) <= (b.to ?? 9999) && (b.from ?? 0) <= (a.to ?? 9999);

/** A stored record as plain fields; blank fields are left out. */
export interface StoredRecord {
  id: string;
  revision: number;
  values: Record<string, unknown>;
  provenance: Provenance;
}

export interface Stored {
  byId(id: string): StoredRecord | undefined;
  /** Published records of that name (or alias) whose years overlap. */
  matching(maker: string, model: string, pack: string | undefined, years: Years): StoredRecord[];
}

export const yearsOf = (values: Record<string, unknown>): Years => ({
  from: (values.yearFrom as number | undefined) ?? null,
  to: (values.yearTo as number | undefined) ?? null,
});

export function toStored(kind: CatalogTable, row: CatalogRow): StoredRecord {
  const cells = row as Record<string, unknown>;
  const values = Object.fromEntries(
    Object.keys(kinds[kind].fields).flatMap((field) =>
      cells[field] === null || cells[field] === undefined ? [] : [[field, cells[field]]],
    ),
  );
  return { id: row.id, revision: row.revision, values, provenance: row.provenance };
}

export function storedRecords(db: Db, kind: CatalogTable): Stored {
  const { table } = kinds[kind];
  const byKey = db
    .select()
    .from(table)
    .where(and(eq(table.matchKey, sql.placeholder('key')), ne(table.status, 'withdrawn')))
    .prepare();
  const byAlias = db
    .select({ id: aliases.recordId })
    .from(aliases)
    .where(and(eq(aliases.kind, kind), eq(aliases.normalised, sql.placeholder('alias'))))
    .prepare();
  return {
    byId(id) {
      const row = findRecord(db, kind, id);
      return row && toStored(kind, row);
    },
    matching(maker, model, pack, years) {
      const rows = byKey.all({ key: matchKey(maker, model, pack) }) as CatalogRow[];
      const named = rows.length > 0 ? rows : viaAlias(maker, model, pack);
      return named
        .filter((row) => row.status === 'published' && overlap({ from: row.yearFrom, to: row.yearTo }, years))
        .map((row) => toStored(kind, row));
    },
  };

  /** The model's other spelling, of the same maker and package. */
  function viaAlias(maker: string, model: string, pack: string | undefined): CatalogRow[] {
    return (byAlias.all({ alias: normaliseName(model) }) as { id: string }[])
      .map(({ id }) => findRecord(db, kind, id))
      .filter(
        (row): row is CatalogRow =>
          row !== undefined &&
          normaliseName(row.maker) === normaliseName(maker) &&
          normaliseName(row.package ?? '') === normaliseName(pack ?? ''),
      );
  }
}

export const findTrimPoint = (db: Pick<Db, 'select'>, hullId: string, key: string) =>
  db
    .select()
    .from(trimPoints)
    .where(and(eq(trimPoints.hullId, hullId), eq(trimPoints.matchKey, key)))
    .get();
export const findTrimPointById = (db: Pick<Db, 'select'>, id: string) => db.select().from(trimPoints).where(eq(trimPoints.id, id)).get();

export const isCatalogTable = (table: string): table is CatalogTable => (catalogTables as readonly string[]).includes(table);
