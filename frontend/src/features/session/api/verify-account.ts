import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Verification } from '@tiltwright/shared/schemas/access.ts';
import type { Session } from '@tiltwright/shared/schemas/account.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';
import { become } from './become.ts';

export function verifyAccount(body: Verification): Promise<Session> {
  return bodyOf(api.POST('/accounts/verify', { body }));
}

/** Finishes an account by the mail's link; the answer is its first session. */
export function useVerifyAccount() {
  const client = useQueryClient();
  return useMutation({ mutationFn: verifyAccount, onSuccess: (session) => become(client, session) });
}
