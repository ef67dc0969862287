import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, bodyOf } from '../../../lib/api-client.ts';
import { sessionQuery } from './get-session.ts';

export function endSession() {
  return bodyOf(api.DELETE('/session'));
}

/** Signs out and forgets everything that was read under the account. */
export function useEndSession() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: endSession,
    onSuccess: async () => {
      client.clear();
      await client.invalidateQueries({ queryKey: sessionQuery.queryKey });
    },
  });
}
