import { useMutation } from '@tanstack/react-query';
import type { PasswordChange } from '@tiltwright/shared/schemas/access.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

export function changePassword(body: PasswordChange) {
  return bodyOf(api.PUT('/me/password', { body }));
}

/** Sets a new password; every other device is signed out. */
export function useChangePassword() {
  return useMutation({ mutationFn: changePassword });
}
