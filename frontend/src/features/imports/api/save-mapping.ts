import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, bodyOf } from '../../../lib/api-client.ts';
import { importQuery } from './get-import.ts';
import type { Mapping, MappingSheet } from './get-mapping.ts';

function saveMapping(id: string, mapping: Mapping): Promise<MappingSheet> {
  // The client's own types lose the length of a pair.
  return bodyOf(api.PUT('/imports/{id}/mapping', { params: { path: { id } }, body: mapping })) as Promise<MappingSheet>;
}

/** Keeps the mapping, complete or not, and reads the first rows with it. One after the other, so that the last one stands. */
export function useSaveMapping(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (mapping: Mapping) => saveMapping(id, mapping),
    scope: { id: `mapping ${id}` },
    // The rows judged before were read another way.
    onSuccess: () => client.invalidateQueries({ queryKey: importQuery(id).queryKey, exact: true }),
  });
}
