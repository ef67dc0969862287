import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import { api, bodyOf } from '../../../lib/api-client.ts';
import type { components } from '../../../lib/api-schema.generated.ts';

export type MappingSheet = components['schemas']['MappingSheet'];
export type Mapping = MappingSheet['mapping'];
export type MappedColumn = components['schemas']['MappedColumn'];

function getMapping(id: string, headerRow: number | undefined, signal?: AbortSignal): Promise<MappingSheet> {
  const query = headerRow === undefined ? {} : { headerRow };
  // The client's own types lose the length of a pair.
  return bodyOf(api.GET('/imports/{id}/mapping', { params: { path: { id }, query }, signal })) as Promise<MappingSheet>;
}

const mappingQuery = (id: string, headerRow: number | undefined) =>
  queryOptions({
    queryKey: ['mappings', id, headerRow ?? 'own'],
    queryFn: ({ signal }) => getMapping(id, headerRow, signal),
    // It is asked for once and then kept by whoever edits it: a later answer must not replace what is being chosen.
    staleTime: Number.POSITIVE_INFINITY,
    gcTime: 0,
    placeholderData: keepPreviousData,
  });

/** How the file's columns are read, saved, remembered or suggested; with another header row only tried. */
export function useMapping(id: string, headerRow: number | undefined) {
  return useQuery(mappingQuery(id, headerRow));
}
