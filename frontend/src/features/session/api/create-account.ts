import { useMutation } from '@tanstack/react-query';
import type { MailPromise } from '@tiltwright/shared/schemas/access.ts';
import type { SignUp } from '@tiltwright/shared/schemas/account.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

export function createAccount(body: SignUp): Promise<MailPromise> {
  return bodyOf(api.POST('/accounts', { body }));
}

/** Asks for an account; what comes next is in the mail, and the answer does not tell whether there is an account already. */
export function useCreateAccount() {
  return useMutation({ mutationFn: createAccount });
}
