import { queryOptions, useQuery } from '@tanstack/react-query';
import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { HullSheet } from '@tiltwright/shared/schemas/hull.ts';
import type { LowerUnitSheet } from '@tiltwright/shared/schemas/lower-unit.ts';
import type { MountSheet } from '@tiltwright/shared/schemas/mount.ts';
import type { TransducerSheet } from '@tiltwright/shared/schemas/transducer.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

export interface Sheets {
  hulls: HullSheet;
  'lower-units': LowerUnitSheet;
  transducers: TransducerSheet;
  mounts: MountSheet;
}
export type AnySheet = Sheets[CatalogTable];

function getSheet<T extends CatalogTable>(table: T, id: string, signal?: AbortSignal): Promise<Sheets[T]> {
  return sheetOf(table, id, signal) as Promise<Sheets[T]>;
}

function sheetOf(table: CatalogTable, id: string, signal?: AbortSignal): Promise<AnySheet> {
  const init = { params: { path: { id } }, signal };
  switch (table) {
    case 'hulls':
      return bodyOf(api.GET('/hulls/{id}', init));
    case 'lower-units':
      return bodyOf(api.GET('/lower-units/{id}', init));
    case 'transducers':
      return bodyOf(api.GET('/transducers/{id}', init));
    case 'mounts':
      return bodyOf(api.GET('/mounts/{id}', init));
    default:
      return table satisfies never;
  }
}

const sheetQuery = <T extends CatalogTable>(table: T, id: string) =>
  queryOptions({ queryKey: [table, id], queryFn: ({ signal }) => getSheet(table, id, signal) });

/** One catalog record with where each of its values comes from. */
export function useSheet<T extends CatalogTable>(table: T, id: string) {
  return useQuery(sheetQuery(table, id));
}
