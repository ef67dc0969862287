import { infiniteQueryOptions, useInfiniteQuery } from '@tanstack/react-query';
import type { RecordDifference } from '@tiltwright/shared/schemas/edition.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

export type ListedDifference = Omit<RecordDifference, 'changes'> & { changes: Partial<RecordDifference['changes'][number]>[] };
interface DifferenceList {
  data: ListedDifference[];
  next: string | null;
}

interface Between {
  from: number;
  to: number;
}

function compareEditions({ from, to }: Between, cursor: string | undefined, signal?: AbortSignal): Promise<DifferenceList> {
  const params = { path: { a: from, b: to }, query: { limit: 50, ...(cursor && { cursor }) } };
  return bodyOf(api.GET('/editions/{a}/compare/{b}', { params, signal }));
}

const differencesQuery = (between: Between) =>
  infiniteQueryOptions({
    queryKey: ['editions', 'between', between],
    queryFn: ({ signal, pageParam }) => compareEditions(between, pageParam, signal),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (last) => last.next ?? undefined,
  });

/** Records that differ between an earlier edition and a later one, fifty at a time. */
export function useDifferences(between: Between) {
  return useInfiniteQuery(differencesQuery(between));
}
