import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { Session } from '@tiltwright/shared/schemas/account.ts';
import type { InvitationAnswer, InvitationOffer } from '@tiltwright/shared/schemas/desk.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';
import { become } from './become.ts';

const offerQuery = (token: string) =>
  queryOptions({
    queryKey: ['invitation', token],
    queryFn: ({ signal }): Promise<InvitationOffer> => bodyOf(api.GET('/invitations/{token}', { params: { path: { token } }, signal })),
    enabled: token !== '',
  });

/** What an invitation's link offers. */
export const useInvitationOffer = (token: string) => useQuery(offerQuery(token));

/** Accepts it; the answer is the session of the account. */
export function useAcceptInvitation(token: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: InvitationAnswer): Promise<Session> =>
      bodyOf(api.POST('/invitations/{token}', { params: { path: { token } }, body })),
    onSuccess: (session) => become(client, session),
  });
}
