import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, bodyOf } from '../../../lib/api-client.ts';

function discardImport(id: string) {
  return bodyOf(api.DELETE('/imports/{id}', { params: { path: { id } } }));
}

/** Drops an upload and its file; the catalog stays as it is. */
export function useDiscardImport(id: string) {
  const client = useQueryClient();
  return useMutation({ mutationFn: () => discardImport(id), onSuccess: () => client.invalidateQueries({ queryKey: ['imports'] }) });
}
