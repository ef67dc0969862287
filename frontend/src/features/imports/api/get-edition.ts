import { queryOptions, useQuery } from '@tanstack/react-query';
import type { Edition } from '@tiltwright/shared/schemas/edition.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

function getEdition(n: number, signal?: AbortSignal): Promise<Edition> {
  return bodyOf(api.GET('/editions/{n}', { params: { path: { n } }, signal }));
}

const editionQuery = (n: number | null) =>
  queryOptions({ queryKey: ['editions', 'one', n], queryFn: ({ signal }) => getEdition(n ?? 0, signal), enabled: n !== null });

/** The edition an upload became: how many records it really reached. */
export function useEdition(n: number | null) {
  return useQuery(editionQuery(n));
}
