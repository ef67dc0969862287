import { infiniteQueryOptions, useInfiniteQuery } from '@tanstack/react-query';
import type { Fate, FieldChange, ImportRow } from '@tiltwright/shared/schemas/import.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

export interface ImportRowList {
  data: (Omit<ImportRow, 'changes'> & { changes: Partial<FieldChange>[] })[];
  next: string | null;
}
export type ListedRow = ImportRowList['data'][number];

interface RowQuestion {
  id: string;
  fate?: Fate | undefined;
  cursor?: string | undefined;
}

function listImportRows({ id, fate, cursor }: RowQuestion, signal?: AbortSignal): Promise<ImportRowList> {
  const query = { limit: 100, ...(fate && { fate }), ...(cursor && { cursor }) };
  return bodyOf(api.GET('/imports/{id}/rows', { params: { path: { id }, query }, signal }));
}

const importRowsQuery = (id: string, fate: Fate | undefined, enabled: boolean) =>
  infiniteQueryOptions({
    queryKey: ['imports', id, 'rows', fate ?? 'all'],
    queryFn: ({ signal, pageParam }) => listImportRows({ id, fate, cursor: pageParam }, signal),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (last) => last.next ?? undefined,
    enabled,
  });

/** The rows of an upload with their fates, a hundred at a time. */
export function useImportRows(id: string, fate: Fate | undefined, enabled: boolean) {
  return useInfiniteQuery(importRowsQuery(id, fate, enabled));
}
