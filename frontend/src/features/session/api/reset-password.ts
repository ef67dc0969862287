import { useMutation } from '@tanstack/react-query';
import type { MailPromise } from '@tiltwright/shared/schemas/access.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

export function requestReset(email: string): Promise<MailPromise> {
  return bodyOf(api.POST('/password-resets', { body: { email } }));
}

/** Asks for a link to choose a new password. */
export function useRequestReset() {
  return useMutation({ mutationFn: requestReset });
}

export function resetPassword({ token, password }: { token: string; password: string }) {
  return bodyOf(api.POST('/password-resets/{token}', { params: { path: { token } }, body: { password } }));
}

/** Sets a new password by the mail's link; every session of the account ends. */
export function useResetPassword() {
  return useMutation({ mutationFn: resetPassword });
}
