import { queryOptions, useQuery } from '@tanstack/react-query';
import type { TrimPoint } from '@tiltwright/shared/schemas/trim-point.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

function listTrimPoints(hull: string, signal?: AbortSignal): Promise<{ data: TrimPoint[]; next: string | null }> {
  return bodyOf(api.GET('/hulls/{id}/trim-points', { params: { path: { id: hull } }, signal }));
}

const trimPointsQuery = (hull: string) =>
  queryOptions({ queryKey: ['hulls', hull, 'trim-points'], queryFn: ({ signal }) => listTrimPoints(hull, signal) });

/** The measured running angles of a hull. */
export function useTrimPoints(hull: string) {
  return useQuery(trimPointsQuery(hull));
}
