import { queryOptions, useQuery } from '@tanstack/react-query';
import type { Import } from '@tiltwright/shared/schemas/import.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

function listImports(signal?: AbortSignal): Promise<{ data: Import[]; next: string | null }> {
  return bodyOf(api.GET('/imports', { params: { query: { limit: 50 } }, signal }));
}

const importsQuery = queryOptions({ queryKey: ['imports'], queryFn: ({ signal }) => listImports(signal), staleTime: 0 });

/** The latest uploads, newest first. */
export function useImports() {
  return useQuery(importsQuery);
}
