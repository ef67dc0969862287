import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Session, SignUp } from '@tiltwright/shared/schemas/account.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';
import { become } from './become.ts';

function createAccount(body: SignUp): Promise<Session> {
  return bodyOf(api.POST('/accounts', { body }));
}

/** Makes an account; the answer is its first session, so nobody types the password twice. */
export function useCreateAccount() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: createAccount,
    onSuccess: (session) => become(client, session),
  });
}
