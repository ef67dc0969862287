// A part of a question is a catalog id or an inline record; the engine wants records.

import type { HullPart, LowerUnitPart, MountPart, TransducerPart } from '@tiltwright/shared/questions/parts.ts';
import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { Db } from '../../db/connect.ts';
import { ApiProblem } from '../../errors.ts';
import { type CatalogRow, kinds } from '../catalog/kinds.ts';
import { findRecord, listTrimPoints } from '../catalog/queries.ts';

type PartOf = { hulls: HullPart; 'lower-units': LowerUnitPart; transducers: TransducerPart; mounts: MountPart };

/** @throws ApiProblem unknown-part, naming where in the question the id stands */
export function resolvePart<K extends CatalogTable>(db: Db, kind: K, part: string | PartOf[K], path: string): PartOf[K] {
  if (typeof part !== 'string') return part;
  const row = findRecord(db, kind, part);
  if (!row || row.status === 'withdrawn') {
    const message = row ? `The ${kinds[kind].noun} ${part} has been withdrawn.` : `There is no ${kinds[kind].noun} with the id ${part}.`;
    throw new ApiProblem('unknown-part', message, [{ path, code: 'unknown-part', message }]);
  }
  return (kind === 'hulls'
    ? { ...partOfRow(kind, row), trimPoints: trimPointsOf(db, row.id) }
    : partOfRow(kind, row)) as unknown as PartOf[K];
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
