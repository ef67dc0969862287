import { queryOptions, useQuery } from '@tanstack/react-query';
import type { Health } from '@tiltwright/shared/schemas/desk.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

const healthQuery = queryOptions({
  queryKey: ['health'],
  queryFn: ({ signal }): Promise<Health> => bodyOf(api.GET('/health', { signal })),
  staleTime: 0,
});
export const useHealth = () => useQuery(healthQuery);
