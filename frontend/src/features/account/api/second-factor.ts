import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { BegunSecondFactor, RecoveryCodes, SecondFactor } from '@tiltwright/shared/schemas/access.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

const secondFactorQuery = queryOptions({
  queryKey: ['second-factor'],
  queryFn: ({ signal }): Promise<SecondFactor> => bodyOf(api.GET('/me/second-factor', { signal })),
  staleTime: 0,
});

/** Whether signing in needs a code, and how many recovery codes are left. */
export function useSecondFactor() {
  return useQuery(secondFactorQuery);
}

function beginSecondFactor(password: string): Promise<BegunSecondFactor> {
  return bodyOf(api.POST('/me/second-factor', { body: { password } }));
}

export const useBeginSecondFactor = () => useMutation({ mutationFn: beginSecondFactor });

export function confirmSecondFactor(code: string): Promise<RecoveryCodes> {
  return bodyOf(api.POST('/me/second-factor/confirm', { body: { code } }));
}

export function renewRecoveryCodes(code: string): Promise<RecoveryCodes> {
  return bodyOf(api.POST('/me/second-factor/recovery-codes', { body: { code } }));
}

export function removeSecondFactor(password: string) {
  return bodyOf(api.DELETE('/me/second-factor', { body: { password } }));
}

/** One of the changes above, after which the account is read anew. */
export function useSecondFactorChange<In, Out>(change: (given: In) => Promise<Out>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: change,
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: secondFactorQuery.queryKey });
      await client.invalidateQueries({ queryKey: ['session'] });
    },
  });
}
