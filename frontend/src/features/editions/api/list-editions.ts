import { infiniteQueryOptions, useInfiniteQuery } from '@tanstack/react-query';
import type { Edition } from '@tiltwright/shared/schemas/edition.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

interface EditionList {
  data: Edition[];
  next: string | null;
}

function listEditions(cursor: string | undefined, signal?: AbortSignal): Promise<EditionList> {
  return bodyOf(api.GET('/editions', { params: { query: { limit: 50, ...(cursor && { cursor }) } }, signal }));
}

const editionsQuery = infiniteQueryOptions({
  queryKey: ['editions', 'list'],
  queryFn: ({ signal, pageParam }) => listEditions(pageParam, signal),
  initialPageParam: undefined as string | undefined,
  getNextPageParam: (last) => last.next ?? undefined,
  staleTime: 0,
});

/** Editions of the catalog, newest first, fifty at a time. */
export function useEditions() {
  return useInfiniteQuery(editionsQuery);
}
