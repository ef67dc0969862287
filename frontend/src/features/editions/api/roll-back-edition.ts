import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { RolledBack } from '@tiltwright/shared/schemas/edition.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

interface Rollback {
  edition: number;
  why: string;
}

function rollBackEdition({ edition, why }: Rollback): Promise<RolledBack> {
  return bodyOf(api.POST('/editions/{n}/rollback', { params: { path: { n: edition } }, body: { why } }));
}

/** Publishes what stood before an edition as a new one. Everything read from the catalog is out of date afterwards. */
export function useRollBack() {
  const client = useQueryClient();
  return useMutation({ mutationFn: rollBackEdition, onSuccess: () => client.invalidateQueries() });
}
