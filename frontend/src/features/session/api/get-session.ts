import { queryOptions, useQuery } from '@tanstack/react-query';
import type { Role, Session } from '@tiltwright/shared/schemas/account.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

function getSession(signal?: AbortSignal): Promise<Session> {
  return bodyOf(api.GET('/session', { signal }));
}

export const sessionQuery = queryOptions({
  queryKey: ['session'],
  queryFn: ({ signal }) => getSession(signal),
  staleTime: 5 * 60_000,
});

/** Who is signed in; `account` is null for a visitor. */
export function useSession() {
  return useQuery(sessionQuery);
}

/** A steward's work may be done by an admin as well; the other two roles stand alone. */
export function mayAct(roles: readonly Role[] | undefined, role: Role): boolean {
  if (!roles) return false;
  return roles.includes(role) || (role === 'steward' && roles.includes('admin'));
}
