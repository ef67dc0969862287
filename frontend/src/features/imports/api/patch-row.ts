import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { RowPatch } from '@tiltwright/shared/schemas/import.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';
import type { ListedRow } from './list-import-rows.ts';

interface RowChange {
  n: number;
  patch: RowPatch;
}

function patchRow(id: string, { n, patch: { cells, decision, resolution } }: RowChange): Promise<ListedRow> {
  const body = { ...(cells && { cells }), ...(decision !== undefined && { decision }), ...(resolution !== undefined && { resolution }) };
  return bodyOf(api.PATCH('/imports/{id}/rows/{n}', { params: { path: { id, n } }, body }));
}

/** Mends cells of one row, leaves it out, or decides its conflict. Other rows may speak of the same record: all are asked for anew. */
export function usePatchRow(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (change: RowChange) => patchRow(id, change),
    onSuccess: () => client.invalidateQueries({ queryKey: ['imports', id] }),
  });
}
