import { queryOptions, useQuery } from '@tanstack/react-query';
import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';
import type { components } from '../../../lib/api-schema.generated.ts';

export type Revision = components['schemas']['Revision'];

export interface RevisionList {
  data: Revision[];
  next: string | null;
}

function listRevisions(table: CatalogTable, id: string, signal?: AbortSignal): Promise<RevisionList> {
  const init = { params: { path: { id } }, signal };
  switch (table) {
    case 'hulls':
      return bodyOf(api.GET('/hulls/{id}/revisions', init));
    case 'lower-units':
      return bodyOf(api.GET('/lower-units/{id}/revisions', init));
    case 'transducers':
      return bodyOf(api.GET('/transducers/{id}/revisions', init));
    case 'mounts':
      return bodyOf(api.GET('/mounts/{id}/revisions', init));
    default:
      return table satisfies never;
  }
}

const revisionsQuery = (table: CatalogTable, id: string) =>
  queryOptions({ queryKey: [table, id, 'revisions'], queryFn: ({ signal }) => listRevisions(table, id, signal) });

/** What changed in a record, and when. */
export function useRevisions(table: CatalogTable, id: string) {
  return useQuery(revisionsQuery(table, id));
}
