import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Import } from '@tiltwright/shared/schemas/import.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';
import { importQuery } from './get-import.ts';

function cancelCheck(id: string): Promise<Import> {
  return bodyOf(api.POST('/imports/{id}/cancel', { params: { path: { id } } }));
}

/** Stops a check under way; the file and its mapping stay. */
export function useCancelCheck(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => cancelCheck(id),
    onSuccess: (record) => client.setQueryData(importQuery(id).queryKey, record),
    // A check that ended in the same moment refuses: the import itself says how it stands.
    onSettled: () => client.invalidateQueries({ queryKey: ['imports', id] }),
  });
}
