import { queryOptions, useQuery } from '@tanstack/react-query';
import type { Boat } from '@tiltwright/shared/schemas/boat.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

/** What the first page shows of a boat. */
type OwnBoat = Pick<Boat, 'id' | 'name' | 'story' | 'question'>;

function listBoats(signal?: AbortSignal): Promise<{ data: OwnBoat[] }> {
  return bodyOf(api.GET('/me/boats', { signal }));
}

const boatsQuery = queryOptions({ queryKey: ['me', 'boats'], queryFn: ({ signal }) => listBoats(signal) });

/** The boats of whoever is signed in; ask only once somebody is. */
export function useOwnBoats() {
  return useQuery(boatsQuery);
}
