// Catalog records as the engine takes them, kept while their edition is the newest: most questions name the same few parts.
import type { HullPart, LowerUnitPart, MountPart, TransducerPart } from '@tiltwright/shared/questions/parts.ts';
import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import { LRUCache } from 'mnemonist';
import type { Db } from '../../db/connect.ts';
import { ApiProblem } from '../../errors.ts';
import { type CatalogRow, kinds } from '../catalog/kinds.ts';
import { findRecord, listTrimPoints } from '../catalog/queries.ts';

export type PartOf = { hulls: HullPart; 'lower-units': LowerUnitPart; transducers: TransducerPart; mounts: MountPart };

export interface PartLookup {
  /** Number of the newest edition. */
  edition(): number;
  /**
   * The record of an id; an inline part is given back as it is.
   * @throws ApiProblem unknown-part, naming where in the question the id stands
   */
  part<K extends CatalogTable>(kind: K, part: string | PartOf[K], path: string): PartOf[K];
}

const mostParts = 2000;

export function partLookup(db: Db): PartLookup {
  const newest = db.$client.prepare('SELECT coalesce(max(edition), 0) FROM editions').pluck();
  const kept = new LRUCache<string, object>(mostParts);
  let keptEdition = -1;
  const edition = () => newest.get() as number;
  return {
    edition,
    part(kind, part, path) {
      if (typeof part !== 'string') return part;
      const now = edition();
      if (now !== keptEdition) {
        kept.clear();
        keptEdition = now;
      }
      const place = `${kind} ${part}`;
      let found = kept.get(place);
      if (!found) {
        found = readPart(db, kind, part, path);
        kept.set(place, found);
      }
      return found as PartOf[typeof kind];
    },
  };
}

function readPart(db: Db, kind: CatalogTable, id: string, path: string): object {
  const row = findRecord(db, kind, id);
  if (!row || row.status === 'withdrawn') {
    const message = row ? `The ${kinds[kind].noun} ${id} has been withdrawn.` : `There is no ${kinds[kind].noun} with the id ${id}.`;
    throw new ApiProblem('unknown-part', message, [{ path, code: 'unknown-part', message }]);
  }
  return kind === 'hulls' ? { ...partOfRow(kind, row), trimPoints: trimPointsOf(db, row.id) } : partOfRow(kind, row);
}

function partOfRow(kind: CatalogTable, row: CatalogRow): Record<string, unknown> {
  const cells = row as Record<string, unknown>;
  const stated = Object.keys(kinds[kind].fields).filter((field) => cells[field] !== null);
  const values = Object.fromEntries(Object.entries(row.provenance).map(([field, { basis, sigma }]) => [field, { basis, sigma }]));
  return { ...Object.fromEntries(stated.map((field) => [field, cells[field]])), values };
}

function trimPointsOf(db: Db, hullId: string) {
  return listTrimPoints(db, hullId).map((point) => ({
    speedKn: point.speedKn,
    trimDeg: point.trimDeg,
    ...(point.sigmaDeg !== null && { sigmaDeg: point.sigmaDeg }),
    ...(point.runs !== null && { runs: point.runs }),
    ...(point.loadedMassKg !== null && { loadedMassKg: point.loadedMassKg }),
    ...(point.motorTrimDeg !== null && { motorTrimDeg: point.motorTrimDeg }),
  }));
}
