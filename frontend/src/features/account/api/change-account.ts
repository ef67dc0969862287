import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { ProfileChange } from '@tiltwright/shared/schemas/access.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

export function changeAccount(body: ProfileChange) {
  return bodyOf(api.PATCH('/me', { body }));
}

/** Changes the name; the head of the page shows it at once. */
export function useChangeAccount() {
  const client = useQueryClient();
  return useMutation({ mutationFn: changeAccount, onSuccess: () => client.invalidateQueries({ queryKey: ['session'] }) });
}
