import { useMutation, useQueryClient } from '@tanstack/react-query';
import { api, bodyOf } from '../../../lib/api-client.ts';
import { become } from './become.ts';

function endSession() {
  return bodyOf(api.DELETE('/session'));
}

/** Signs out and forgets everything that was read under the account. */
export function useEndSession() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: endSession,
    onSuccess: () => become(client, { account: null, expiresAt: null }),
  });
}
