import { keepPreviousData, queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { Role } from '@tiltwright/shared/schemas/account.ts';
import type { Person, PersonSession } from '@tiltwright/shared/schemas/desk.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

export interface PeopleFilter {
  q?: string;
  role?: Role;
  state?: 'active' | 'disabled';
  cursor?: string;
}
type Page<T> = { data: T[]; next: string | null };

const peopleQuery = (filter: PeopleFilter) =>
  queryOptions({
    queryKey: ['people', 'list', filter],
    queryFn: ({ signal }): Promise<Page<Person>> => bodyOf(api.GET('/users', { params: { query: { ...filter, limit: 50 } }, signal })),
    staleTime: 0,
    placeholderData: keepPreviousData,
  });
export const usePeople = (filter: PeopleFilter) => useQuery(peopleQuery(filter));

const personQuery = (id: string) =>
  queryOptions({
    queryKey: ['people', id],
    queryFn: ({ signal }): Promise<Person> => bodyOf(api.GET('/users/{id}', { params: { path: { id } }, signal })),
    staleTime: 0,
  });
export const usePerson = (id: string) => useQuery(personQuery(id));

const sessionsQuery = (id: string) =>
  queryOptions({
    queryKey: ['people', id, 'sessions'],
    queryFn: ({ signal }): Promise<Page<PersonSession>> => bodyOf(api.GET('/users/{id}/sessions', { params: { path: { id } }, signal })),
    staleTime: 0,
  });
export const usePersonSessions = (id: string) => useQuery(sessionsQuery(id));

export type PersonOrder =
  | { kind: 'roles'; roles: Role[] }
  | { kind: 'disable' | 'enable' }
  | { kind: 'end-sessions' }
  | { kind: 'remove-factor' };

async function changePerson(id: string, order: PersonOrder): Promise<void> {
  const params = { path: { id } };
  switch (order.kind) {
    case 'roles':
      await bodyOf(api.PATCH('/users/{id}', { params, body: { roles: order.roles } }));
      return;
    case 'disable':
    case 'enable':
      await bodyOf(api.PATCH('/users/{id}', { params, body: { disabled: order.kind === 'disable' } }));
      return;
    case 'end-sessions':
      await bodyOf(api.DELETE('/users/{id}/sessions', { params }));
      return;
    case 'remove-factor':
      await bodyOf(api.DELETE('/users/{id}/second-factor', { params }));
      return;
    default:
      return order satisfies never;
  }
}

/** Any change to a person; lists and the sheet are read anew. */
export function useChangePerson(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (order: PersonOrder) => changePerson(id, order),
    onSuccess: () => client.invalidateQueries({ queryKey: ['people'] }),
  });
}
