import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import { api, bodyOf } from '../../../lib/api-client.ts';

function getHullTrim({ hull, speedKn }: { hull: string; speedKn: number }, signal?: AbortSignal) {
  return bodyOf(api.GET('/hulls/{id}/trim', { params: { path: { id: hull }, query: { speedKn } }, signal }));
}

const hullTrimQuery = (hull: string, speedKn: number | null) =>
  queryOptions({
    queryKey: ['hulls', hull, 'trim', speedKn],
    queryFn: ({ signal }) => getHullTrim({ hull, speedKn: speedKn ?? 0 }, signal),
    enabled: speedKn !== null,
    placeholderData: keepPreviousData,
  });

/** The server's running trim of a hull at one speed; the last answer stays while the next is on its way. */
export function useHullTrim(hull: string, speedKn: number | null) {
  return useQuery(hullTrimQuery(hull, speedKn));
}
