import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Import } from '@tiltwright/shared/schemas/import.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';
import { importQuery } from './get-import.ts';

export function checkImport(id: string): Promise<Import> {
  return bodyOf(api.POST('/imports/{id}/check', { params: { path: { id } } }));
}

/** Has every row judged against the catalog as it stands now. */
export function useCheckImport(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => checkImport(id),
    onSuccess: (record) => {
      client.removeQueries({ queryKey: ['imports', id, 'rows'] });
      client.setQueryData(importQuery(id).queryKey, record);
    },
    onSettled: () => client.invalidateQueries({ queryKey: ['imports', id] }),
  });
}
