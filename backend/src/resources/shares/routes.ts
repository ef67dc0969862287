import { NewShare, Share, SharedFit } from '@tiltwright/shared/schemas/boat.ts';
import * as z from 'zod';
import { actorId } from '../../auth/actor.ts';
import type { Deps } from '../../deps.ts';
import { listOf } from '../../http/cursor.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { createShare, listShares, revokeShare, sharedFit, toShare } from './queries.ts';

const tag = 'Boats';
const may = 'boats.own';

export function shareRoutes({ db }: Deps): Route[] {
  return [
    route(
      {
        id: 'listShares',
        method: 'get',
        path: '/me/shares',
        tag,
        summary: 'Links to the account’s saved fits, newest first',
        may,
        reply: { status: 200, description: 'The links, the last thousand.', schema: listOf(Share) },
        cache: noStore,
      },
      ({ actor }) => ({ data: listShares(db, actorId(actor)).map(toShare), next: null }),
    ),
    route(
      {
        id: 'createShare',
        method: 'post',
        path: '/me/shares',
        tag,
        summary: 'Make a link that opens one saved fit to whoever has it',
        description: 'The link shows the fit as it stands when it is opened, without the note and without whose it is.',
        may,
        body: NewShare,
        bodyExample: { fit: 'fit_01K0000000000000000000000' },
        reply: { status: 201, description: 'The link.', schema: Share },
        problems: ['not-found'],
        cache: noStore,
      },
      ({ actor, body }) => toShare(createShare(db, actorId(actor), body.fit)),
    ),
    route(
      {
        id: 'revokeShare',
        method: 'delete',
        path: '/me/shares/{id}',
        tag,
        summary: 'Withdraw a link at once',
        may,
        params: z.strictObject({ id: z.string().min(1).max(80) }),
        reply: { status: 204, description: 'It opens nothing any more.' },
        problems: ['not-found'],
        cache: noStore,
      },
      ({ actor, params }) => revokeShare(db, actorId(actor), params.id),
    ),
    route(
      {
        id: 'getSharedFit',
        method: 'get',
        path: '/shares/{token}',
        tag,
        summary: 'The saved fit behind a link',
        may: 'catalog.read',
        params: z.strictObject({ token: z.string().min(1).max(100) }),
        reply: { status: 200, description: 'The fit.', schema: SharedFit },
        problems: ['not-found'],
        cache: noStore,
      },
      ({ params, res }) => {
        // Passed on by mouth and mail, not by search engines.
        res.setHeader('X-Robots-Tag', 'noindex');
        return sharedFit(db, params.token);
      },
    ),
  ];
}
