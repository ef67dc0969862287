import { useMutation } from '@tanstack/react-query';
import { api, bodyOf } from '../../../lib/api-client.ts';

export function deleteAccount(password: string) {
  return bodyOf(api.DELETE('/me', { body: { password } }));
}

/** Deletes the account for good. */
export function useDeleteAccount() {
  return useMutation({ mutationFn: deleteAccount });
}
