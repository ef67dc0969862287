import { Boat, BoatChange, NewBoat } from '@tiltwright/shared/schemas/boat.ts';
import * as z from 'zod';
import { actorId } from '../../auth/actor.ts';
import type { Deps } from '../../deps.ts';
import { decodeIdCursor, listOf, pageById, pageFields } from '../../http/cursor.ts';
import { answeredFromCache, demandMatch } from '../../http/etag.ts';
import { noStore, type Route, revalidate, route } from '../../http/operation.ts';
import { fitExample } from '../questions/examples.ts';
import { boatOrProblem, boatTag, changeBoat, createBoat, listBoats, removeBoat, toBoat } from './queries.ts';

const tag = 'Boats';
const may = 'boats.own';
const boatParams = z.strictObject({ id: z.string().min(1).max(80) });

export function boatRoutes({ db }: Deps): Route[] {
  return [
    route(
      {
        id: 'listBoats',
        method: 'get',
        path: '/me/boats',
        tag,
        summary: 'The account’s boats, each as the question its rig asks',
        may,
        query: z.strictObject(pageFields),
        reply: { status: 200, description: 'A page of boats, oldest first.', schema: listOf(Boat) },
        cache: noStore,
      },
      ({ actor, query }) => {
        const rows = listBoats(db, actorId(actor), query.limit + 1, decodeIdCursor(query.cursor));
        return pageById(rows.map(toBoat), query.limit);
      },
    ),
    route(
      {
        id: 'createBoat',
        method: 'post',
        path: '/me/boats',
        tag,
        summary: 'Keep a boat with its rig',
        may,
        body: NewBoat,
        bodyExample: { name: 'The skiff', question: fitExample },
        reply: { status: 201, description: 'The boat.', schema: Boat },
        problems: ['wrong-state'],
        etag: true,
        cache: noStore,
      },
      ({ actor, body, res }) => {
        const row = createBoat(db, actorId(actor), body);
        res.setHeader('ETag', `"${boatTag(row)}"`);
        return toBoat(row);
      },
    ),
    route(
      {
        id: 'getBoat',
        method: 'get',
        path: '/me/boats/{id}',
        tag,
        summary: 'One of the account’s boats',
        may,
        params: boatParams,
        reply: { status: 200, description: 'The boat.', schema: Boat },
        problems: ['not-found'],
        etag: true,
        cache: `private, ${revalidate}`,
      },
      ({ actor, params, req, res }) => {
        const row = boatOrProblem(db, actorId(actor), params.id);
        return answeredFromCache(req, res, boatTag(row)) ? undefined : toBoat(row);
      },
    ),
    route(
      {
        id: 'changeBoat',
        method: 'patch',
        path: '/me/boats/{id}',
        tag,
        summary: 'Change a boat',
        description: 'What is left out stays. With If-Match a change made from a stale copy is refused.',
        may,
        params: boatParams,
        body: BoatChange,
        bodyExample: { name: 'The old skiff' },
        reply: { status: 200, description: 'The boat as it is now.', schema: Boat },
        problems: ['not-found'],
        etag: true,
        cache: noStore,
      },
      ({ actor, params, body, req, res }) => {
        const row = changeBoat(db, actorId(actor), params.id, body, (before) => demandMatch(req, boatTag(before)));
        res.setHeader('ETag', `"${boatTag(row)}"`);
        return toBoat(row);
      },
    ),
    route(
      {
        id: 'deleteBoat',
        method: 'delete',
        path: '/me/boats/{id}',
        tag,
        summary: 'Delete a boat; saved fits of it stay',
        may,
        params: boatParams,
        reply: { status: 204, description: 'It is gone.' },
        problems: ['not-found'],
        etag: true,
        cache: noStore,
      },
      ({ actor, params, req }) => removeBoat(db, actorId(actor), params.id, (row) => demandMatch(req, boatTag(row))),
    ),
  ];
}
