import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { Limit, LimitedCaller } from '@tiltwright/shared/schemas/limit.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

const limitsQuery = queryOptions({
  queryKey: ['limits'],
  queryFn: ({ signal }): Promise<{ data: Limit[]; next: string | null }> => bodyOf(api.GET('/limits', { signal })),
  staleTime: 0,
});
export const useLimits = () => useQuery(limitsQuery);

/** New limits for one kind of caller; null goes back to the configured ones. */
export function useChangeLimit(caller: LimitedCaller) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { unitsPerMinute: number; unitsPerDay: number | null } | null) => {
      const params = { path: { caller } };
      return body ? bodyOf(api.PUT('/limits/{caller}', { params, body })) : bodyOf(api.DELETE('/limits/{caller}', { params }));
    },
    onSuccess: () => client.invalidateQueries({ queryKey: limitsQuery.queryKey }),
  });
}
