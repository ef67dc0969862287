import { Role } from '@tiltwright/shared/schemas/account.ts';
import { Person, PersonChange, PersonSession } from '@tiltwright/shared/schemas/desk.ts';
import * as z from 'zod';
import { actorId } from '../../auth/actor.ts';
import type { Deps } from '../../deps.ts';
import { decodeCursor, listOf, page, pageFields } from '../../http/cursor.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { removeSecondFactor } from '../second-factor/set-up.ts';
import { changePerson, endSessions } from './change-person.ts';
import { listPeople, listSessions, personOrProblem, readPerson } from './queries.ts';

const tag = 'Administration';
const may = 'site.run';
const cache = noStore;
const params = z.strictObject({ id: z.string().min(1).max(80) });

export function userRoutes(deps: Deps): Route[] {
  const { db } = deps;
  return [
    route(
      {
        id: 'listUsers',
        method: 'get',
        path: '/users',
        tag,
        summary: 'People, by e-mail address',
        may,
        query: z.strictObject({
          q: z.string().trim().min(1).max(80).optional().describe('Part of the address or the name.'),
          role: Role.optional(),
          state: z.enum(['active', 'disabled']).optional(),
          ...pageFields,
        }),
        reply: { status: 200, description: 'A page of people.', schema: listOf(Person) },
        cache,
      },
      ({ query: { limit, cursor, ...filter } }) => {
        const place = decodeCursor(cursor, 0);
        return page(listPeople(db, filter, limit, place.after), limit, place);
      },
    ),
    route(
      {
        id: 'getUser',
        method: 'get',
        path: '/users/{id}',
        tag,
        summary: 'One person',
        may,
        params,
        reply: { status: 200, description: 'The person.', schema: Person },
        problems: ['not-found'],
        cache,
      },
      ({ params: { id } }) => readPerson(db, personOrProblem(db, id)),
    ),
    route(
      {
        id: 'changeUser',
        method: 'patch',
        path: '/users/{id}',
        tag,
        summary: 'Change a person’s roles, disable or enable the account',
        description: 'A disabled account is signed out at once and its keys stop. The last admin keeps the role.',
        may,
        params,
        body: PersonChange,
        bodyExample: { roles: ['customer', 'steward'] },
        reply: { status: 200, description: 'The person as it is now.', schema: Person },
        problems: ['not-found', 'wrong-state'],
        cache,
      },
      ({ params: { id }, body, actor }) => {
        changePerson(db, actorId(actor), id, body);
        return readPerson(db, personOrProblem(db, id));
      },
    ),
    route(
      {
        id: 'listUserSessions',
        method: 'get',
        path: '/users/{id}/sessions',
        tag,
        summary: 'Where a person is signed in',
        may,
        params,
        reply: { status: 200, description: 'The sessions.', schema: listOf(PersonSession) },
        problems: ['not-found'],
        cache,
      },
      ({ params: { id } }) => ({ data: listSessions(db, personOrProblem(db, id).id), next: null }),
    ),
    route(
      {
        id: 'endUserSessions',
        method: 'delete',
        path: '/users/{id}/sessions',
        tag,
        summary: 'Sign a person out everywhere',
        may,
        params,
        reply: { status: 204, description: 'Signed out.' },
        problems: ['not-found'],
        cache,
      },
      ({ params: { id }, actor }) => endSessions(db, actorId(actor), id),
    ),
    route(
      {
        id: 'removeUserSecondFactor',
        method: 'delete',
        path: '/users/{id}/second-factor',
        tag,
        summary: 'Remove the second factor of a person who lost it',
        description: 'Only after making sure by another way that it is the person who asks.',
        may,
        params,
        reply: { status: 204, description: 'Removed; the person is told by mail.' },
        problems: ['not-found'],
        cache,
      },
      ({ params: { id }, actor }) => removeSecondFactor(deps, personOrProblem(db, id), actorId(actor)),
    ),
  ];
}
