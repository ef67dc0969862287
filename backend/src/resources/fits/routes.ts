import { FitChange, NewFit, SavedFit } from '@tiltwright/shared/schemas/boat.ts';
import type { FitQuestion } from '@tiltwright/shared/schemas/fit.ts';
import * as z from 'zod';
import { actorId } from '../../auth/actor.ts';
import type { Deps } from '../../deps.ts';
import { decodeIdCursor, listOf, pageById, pageFields } from '../../http/cursor.ts';
import { answeredFromCache, demandMatch } from '../../http/etag.ts';
import { noStore, type Route, revalidate, route } from '../../http/operation.ts';
import { fitExample } from '../questions/examples.ts';
import { fitOrProblem, fitTag, listFits, toSavedFit } from './queries.ts';
import { changeFit, createFit, removeFit } from './save-fit.ts';

const tag = 'Boats';
const may = 'boats.own';
const fitParams = z.strictObject({ id: z.string().min(1).max(80) });
const fitUnits = (question: FitQuestion | undefined) => (question === undefined ? 0 : question.uncertainty === 'none' ? 1 : 19);
const moreCost = {
  of: ({ body }: { body: { question?: FitQuestion | undefined } }) => fitUnits(body.question),
  words: '1 more where a question is asked, 19 where it is sampled',
};

export function fitRoutes(deps: Deps): Route[] {
  const { db } = deps;
  return [
    route(
      {
        id: 'listFits',
        method: 'get',
        path: '/me/fits',
        tag,
        summary: 'The account’s saved fits',
        may,
        query: z.strictObject({ boat: z.string().max(80).optional().describe('Only those of one boat.'), ...pageFields }),
        reply: { status: 200, description: 'A page of fits, oldest first.', schema: listOf(SavedFit) },
        cache: noStore,
      },
      ({ actor, query }) => {
        const rows = listFits(db, actorId(actor), query.limit + 1, decodeIdCursor(query.cursor), query.boat);
        return pageById(rows.map(toSavedFit), query.limit);
      },
    ),
    route(
      {
        id: 'createFit',
        method: 'post',
        path: '/me/fits',
        tag,
        summary: 'Ask a fit and keep it with its answer',
        description: 'Engine version and edition are kept with the answer, so that it reads the same years later.',
        may,
        body: NewFit,
        bodyExample: { name: 'Port side, on a board', question: fitExample },
        reply: { status: 201, description: 'The saved fit.', schema: SavedFit },
        problems: ['unknown-part', 'not-found', 'wrong-state'],
        moreCost,
        etag: true,
        cache: noStore,
      },
      async ({ actor, body, res }) => {
        const row = await createFit(deps, actorId(actor), body);
        res.setHeader('ETag', `"${fitTag(row)}"`);
        return toSavedFit(row);
      },
    ),
    route(
      {
        id: 'getFit',
        method: 'get',
        path: '/me/fits/{id}',
        tag,
        summary: 'One saved fit',
        may,
        params: fitParams,
        reply: { status: 200, description: 'The saved fit.', schema: SavedFit },
        problems: ['not-found'],
        etag: true,
        cache: `private, ${revalidate}`,
      },
      ({ actor, params, req, res }) => {
        const row = fitOrProblem(db, actorId(actor), params.id);
        return answeredFromCache(req, res, fitTag(row)) ? undefined : toSavedFit(row);
      },
    ),
    route(
      {
        id: 'changeFit',
        method: 'patch',
        path: '/me/fits/{id}',
        tag,
        summary: 'Change a saved fit',
        description: 'What is left out stays; a changed question is asked anew. With If-Match a change made from a stale copy is refused.',
        may,
        params: fitParams,
        body: FitChange,
        bodyExample: { note: 'Tried on Saturday.' },
        reply: { status: 200, description: 'The fit as it is now.', schema: SavedFit },
        problems: ['not-found', 'unknown-part'],
        moreCost,
        etag: true,
        cache: noStore,
      },
      async ({ actor, params, body, req, res }) => {
        const row = await changeFit(deps, actorId(actor), params.id, body, (before) => demandMatch(req, fitTag(before)));
        res.setHeader('ETag', `"${fitTag(row)}"`);
        return toSavedFit(row);
      },
    ),
    route(
      {
        id: 'deleteFit',
        method: 'delete',
        path: '/me/fits/{id}',
        tag,
        summary: 'Delete a saved fit and the links to it',
        may,
        params: fitParams,
        reply: { status: 204, description: 'It is gone.' },
        problems: ['not-found'],
        etag: true,
        cache: noStore,
      },
      ({ actor, params, req }) => removeFit(db, actorId(actor), params.id, (row) => demandMatch(req, fitTag(row))),
    ),
  ];
}
