// The four kinds of catalog records differ in their fields, not in what is done with them.
import { type CatalogTable, envelopeFields } from '@tiltwright/shared/schemas/catalog-record.ts';
import { Hull, HullSheet, hullFields } from '@tiltwright/shared/schemas/hull.ts';
import { LowerUnit, LowerUnitSheet, lowerUnitFields } from '@tiltwright/shared/schemas/lower-unit.ts';
import { Mount, MountSheet, mountFields } from '@tiltwright/shared/schemas/mount.ts';
import { Transducer, TransducerSheet, transducerFields } from '@tiltwright/shared/schemas/transducer.ts';
import { hulls, lowerUnits, mounts, transducers } from '../../db/schema/catalog.ts';

export const kinds = {
  hulls: { table: hulls, prefix: 'hul', noun: 'hull', title: 'Hull', record: Hull, sheet: HullSheet, fields: hullFields },
  'lower-units': {
    table: lowerUnits,
    prefix: 'low',
    noun: 'lower unit',
    title: 'LowerUnit',
    record: LowerUnit,
    sheet: LowerUnitSheet,
    fields: lowerUnitFields,
  },
  transducers: {
    table: transducers,
    prefix: 'trd',
    noun: 'transducer',
    title: 'Transducer',
    record: Transducer,
    sheet: TransducerSheet,
    fields: transducerFields,
  },
  mounts: { table: mounts, prefix: 'mnt', noun: 'mount', title: 'Mount', record: Mount, sheet: MountSheet, fields: mountFields },
} as const satisfies Record<CatalogTable, unknown>;

/** The common columns of the four tables; their own fields are reached by name. */
export type CatalogRow =
  | typeof hulls.$inferSelect
  | typeof lowerUnits.$inferSelect
  | typeof transducers.$inferSelect
  | typeof mounts.$inferSelect;
export type CatalogRecord = Record<string, unknown> & { id: string; maker: string; model: string };

const envelopeNames = Object.keys(envelopeFields) as (keyof typeof envelopeFields)[];

/** A row as the API shows it: the envelope and every stated field; what is not stated is left out. */
export function toRecord(kind: CatalogTable, row: CatalogRow): CatalogRecord {
  const cells = row as Record<string, unknown>;
  const stated = Object.keys(kinds[kind].fields).filter((field) => cells[field] !== null && cells[field] !== undefined);
  return Object.fromEntries([...envelopeNames, ...stated].map((name) => [name, cells[name]])) as CatalogRecord;
}

/** The record with where each value comes from. */
export function toSheet(kind: CatalogTable, row: CatalogRow) {
  const record = toRecord(kind, row);
  const values = Object.fromEntries(Object.entries(row.provenance).map(([field, origin]) => [field, { value: record[field], ...origin }]));
  return { ...record, values };
}
