import { ResolveOrder, ResolveReply } from '@tiltwright/shared/schemas/resolve.ts';
import type { Deps } from '../../deps.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { currentEdition } from '../catalog/queries.ts';
import { resolveHulls } from './resolve-hulls.ts';

export function resolveRoutes({ db, search }: Deps): Route[] {
  return [
    route(
      {
        id: 'resolveHulls',
        method: 'post',
        path: '/hulls/resolve',
        tag: 'Catalog',
        summary: 'Match up to 1 000 names of a stock list to hulls',
        description:
          'Slips, joined and split words and the model year in the name are allowed for. Each candidate has a score and says why; `best` is set where one is good enough and well ahead of the next.',
        may: 'catalog.read',
        body: ResolveOrder,
        bodyExample: { names: ['2018 Withyholm Reedcutter 14', { ref: 'stock 7', name: 'heddle14', maker: 'Ostrel' }] },
        reply: { status: 200, description: 'The names in their order.', schema: ResolveReply },
        moreCost: { of: ({ body }) => body.names.length - 1, words: '1 more for each further name' },
        cache: noStore,
      },
      async ({ body }) => ({ data: await resolveHulls(db, search, body), edition: currentEdition(db) }),
    ),
  ];
}
