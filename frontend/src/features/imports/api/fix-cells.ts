import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Fix } from '@tiltwright/shared/schemas/mapping.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

function fixCells(id: string, fix: Fix): Promise<{ rows: number }> {
  return bodyOf(api.POST('/imports/{id}/fixes', { params: { path: { id } }, body: fix }));
}

/** The same new text in every cell of a column that reads alike; tells how many rows were judged again. */
export function useFixCells(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (fix: Fix) => fixCells(id, fix),
    onSuccess: () => client.invalidateQueries({ queryKey: ['imports', id] }),
  });
}
