import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import { api, bodyOf } from '../../../lib/api-client.ts';
import type { FitPartName } from '../fit-state.ts';

/** What a list of findings needs of a part, whatever its kind. */
export interface FoundPart {
  id: string;
  maker: string;
  model: string;
  package?: string | undefined;
  yearFrom?: number | undefined;
  yearTo?: number | undefined;
  generic: boolean;
}

const limit = 8;

async function findParts(kind: FitPartName, q: string, signal: AbortSignal): Promise<FoundPart[]> {
  const params = { query: { limit, ...(q !== '' && { q }) } };
  switch (kind) {
    case 'hull':
      return (await bodyOf(api.GET('/hulls', { params, signal }))).data;
    case 'motor':
      return (await bodyOf(api.GET('/lower-units', { params, signal }))).data;
    case 'sensor':
      return (await bodyOf(api.GET('/transducers', { params, signal }))).data;
    case 'mount':
      return (await bodyOf(api.GET('/mounts', { params, signal }))).data;
    default:
      return kind satisfies never;
  }
}

const findPartsQuery = (kind: FitPartName, q: string) =>
  queryOptions({
    queryKey: ['find-parts', kind, q],
    queryFn: ({ signal }) => findParts(kind, q, signal),
    placeholderData: keepPreviousData,
  });

/** Parts whose name is like `q`, or the first few of all for an empty one. */
export function useFindParts(kind: FitPartName, q: string) {
  return useQuery(findPartsQuery(kind, q));
}
