import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, bodyOf } from '../../../lib/api-client.ts';

function publishImport({ id, why }: { id: string; why: string }): Promise<{ edition: number }> {
  return bodyOf(api.POST('/imports/{id}/publish', { params: { path: { id } }, body: { why, holdCautions: true } }));
}

/** Makes the new and changed rows an edition, without those that ask for a second look nobody has taken. Everything read from the catalog is out of date afterwards. */
export function usePublishImport(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (why: string) => publishImport({ id, why }),
    onSettled: () => client.invalidateQueries(),
  });
}
