import { queryOptions, useQuery, useQueryClient } from '@tanstack/react-query';
import type { Import } from '@tiltwright/shared/schemas/import.ts';
import { useEffect } from 'react';
import { api, apiBase, bodyOf } from '../../../lib/api-client.ts';

/** How often to look while the server is at work on the table, should its own events not come through. */
const lookAgainMs = 2000;

function getImport(id: string, signal?: AbortSignal): Promise<Import> {
  return bodyOf(api.GET('/imports/{id}', { params: { path: { id } }, signal }));
}

const isAtWork = (record: Import | undefined) => record?.status === 'checking' || record?.status === 'publishing';

export const importQuery = (id: string) =>
  queryOptions({
    queryKey: ['imports', id],
    queryFn: ({ signal }) => getImport(id, signal),
    staleTime: 0,
    refetchInterval: ({ state }) => (isAtWork(state.data) ? lookAgainMs : false),
  });

/** One upload; while it is being checked or published the server tells how far it is. */
export function useImport(id: string) {
  const client = useQueryClient();
  const query = useQuery(importQuery(id));
  const atWork = isAtWork(query.data);
  useEffect(() => {
    if (!atWork || typeof EventSource === 'undefined') return;
    const events = new EventSource(`${apiBase}/imports/${encodeURIComponent(id)}/events`);
    events.addEventListener('import', ({ data }: MessageEvent<string>) => {
      const record = JSON.parse(data) as Import;
      client.setQueryData(importQuery(id).queryKey, record);
      // The stream ends here; left open it would be asked for again and again.
      if (!isAtWork(record)) events.close();
    });
    events.addEventListener('error', () => events.close());
    return () => events.close();
  }, [id, atWork, client]);
  return query;
}
