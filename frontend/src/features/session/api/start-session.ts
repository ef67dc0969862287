import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Session, SignIn } from '@tiltwright/shared/schemas/account.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';
import { become } from './become.ts';

function startSession(body: SignIn): Promise<Session> {
  return bodyOf(api.POST('/session', { body }));
}

/** Signs in. What was read as a visitor is asked for anew, since an account may see more. */
export function useStartSession() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: startSession,
    onSuccess: (session) => become(client, session),
  });
}
