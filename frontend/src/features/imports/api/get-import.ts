import { queryOptions, useQuery } from '@tanstack/react-query';
import type { Import } from '@tiltwright/shared/schemas/import.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

/** How often to look while the server is at work on the table. */
const lookAgainMs = 700;

function getImport(id: string, signal?: AbortSignal): Promise<Import> {
  return bodyOf(api.GET('/imports/{id}', { params: { path: { id } }, signal }));
}

export const importQuery = (id: string) =>
  queryOptions({
    queryKey: ['imports', id],
    queryFn: ({ signal }) => getImport(id, signal),
    staleTime: 0,
    refetchInterval: ({ state }) => (state.data?.status === 'checking' || state.data?.status === 'publishing' ? lookAgainMs : false),
  });

/** One upload; asked for again while it is being checked or published. */
export function useImport(id: string) {
  return useQuery(importQuery(id));
}
