// What the catalog holds, as an import looks at it: by id, by name and years, by another spelling.
import { matchKey, normaliseName } from '@tiltwright/shared/names.ts';
import { type CatalogTable, catalogTables } from '@tiltwright/shared/schemas/catalog-record.ts';
import { and, eq } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { trimPoints } from '../../db/schema/catalog.ts';
import { recordTable, type StoredRecord } from '../editions/record-table.ts';

/** Years a record stands for; null is open. */
export interface Years {
  from: number | null;
  to: number | null;
}

export const overlap = (a: Years, b: Years) => (a.from ?? 0) <= (b.to ?? 9999) && (b.from ?? 0) <= (a.to ?? 9999);

export interface Stored {
  /** Published, superseded or withdrawn. */
  byId(id: string): StoredRecord | undefined;
  /** Published records of that name (or alias) whose years overlap. */
  matching(maker: string, model: string, pack: string | undefined, years: Years): StoredRecord[];
}

export const yearsOf = (values: Record<string, unknown>): Years => ({
  from: (values.yearFrom as number | undefined) ?? null,
  to: (values.yearTo as number | undefined) ?? null,
});

export function storedRecords({ $client: sqlite }: Pick<Db, '$client'>, kind: CatalogTable): Stored {
  const table = recordTable(kind);
  const select = (where: string) => sqlite.prepare(`SELECT ${table.selected} FROM ${table.name} WHERE ${where}`).raw();
  const byId = select('id = ?');
  const byKey = select("match_key = ? AND status <> 'withdrawn'");
  const byAlias = sqlite.prepare('SELECT record_id FROM aliases WHERE normalised = ? AND kind = ?').pluck();
  const find = (id: string) => {
    const row = byId.get(id) as unknown[] | undefined;
    return row && table.read(row);
  };
  return {
    byId: find,
    matching(maker, model, pack, years) {
      const rows = (byKey.all(matchKey(maker, model, pack)) as unknown[][]).map((row) => table.read(row));
      const named = rows.length > 0 ? rows : viaAlias(maker, model, pack);
      return named.filter((record) => record.status === 'published' && overlap(yearsOf(record.values), years));
    },
  };

  /** The model's other spelling, of the same maker and package. */
  function viaAlias(maker: string, model: string, pack: string | undefined): StoredRecord[] {
    return (byAlias.all(normaliseName(model), kind) as string[])
      .map(find)
      .filter(
        (record): record is StoredRecord =>
          record !== undefined &&
          normaliseName(record.values.maker as string) === normaliseName(maker) &&
          normaliseName((record.values.package as string | undefined) ?? '') === normaliseName(pack ?? ''),
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
