import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { Role } from '@tiltwright/shared/schemas/account.ts';
import type { Invitation } from '@tiltwright/shared/schemas/desk.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

const invitationsQuery = (cursor: string | undefined) =>
  queryOptions({
    queryKey: ['invitations', cursor ?? ''],
    queryFn: ({ signal }): Promise<{ data: Invitation[]; next: string | null }> =>
      bodyOf(api.GET('/invitations', { params: { query: { limit: 50, ...(cursor && { cursor }) } }, signal })),
    staleTime: 0,
  });
export const useInvitations = (cursor: string | undefined) => useQuery(invitationsQuery(cursor));

function useInvitationChange<In, Out>(change: (given: In) => Promise<Out>) {
  const client = useQueryClient();
  return useMutation({ mutationFn: change, onSuccess: () => client.invalidateQueries({ queryKey: ['invitations'] }) });
}

export const useInvite = () =>
  useInvitationChange((wish: { email: string; roles: Role[] }): Promise<Invitation> => bodyOf(api.POST('/invitations', { body: wish })));

export const useRevokeInvitation = () =>
  useInvitationChange((id: string) => bodyOf(api.DELETE('/invitations/{token}', { params: { path: { token: id } } })));
