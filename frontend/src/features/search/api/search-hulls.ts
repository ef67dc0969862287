import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import type { Hull } from '@tiltwright/shared/schemas/hull.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

function searchHulls({ q, limit }: { q: string; limit: number }, signal?: AbortSignal): Promise<{ data: Hull[]; next: string | null }> {
  return bodyOf(api.GET('/hulls', { params: { query: { q, limit } }, signal }));
}

const hullSearchQuery = (q: string, limit: number) =>
  queryOptions({
    queryKey: ['hulls', 'search', q, limit],
    queryFn: ({ signal }) => searchHulls({ q, limit }, signal),
    enabled: q !== '',
    placeholderData: q === '' ? undefined : keepPreviousData,
  });

/** Boats whose name is like `q`; the last finding stays while the next is on its way. Not asked for an empty `q`. */
export function useHullSearch(q: string, limit: number) {
  return useQuery(hullSearchQuery(q, limit));
}
