import { queryOptions, useQuery } from '@tanstack/react-query';
import type { SearchHit } from '@tiltwright/shared/schemas/edition.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

function searchParts(q: string, signal?: AbortSignal): Promise<{ data: SearchHit[]; next: string | null }> {
  return bodyOf(api.GET('/search', { params: { query: { q, limit: 6 } }, signal }));
}

const partSearchQuery = (q: string, enabled: boolean) =>
  queryOptions({
    queryKey: ['search', q],
    queryFn: ({ signal }) => searchParts(q, signal),
    enabled: enabled && q !== '',
  });

/** Everything in the catalog whose name is like `q`; asked only where `enabled`, e.g. once no boat was found. */
export function usePartSearch(q: string, enabled: boolean) {
  return useQuery(partSearchQuery(q, enabled));
}
