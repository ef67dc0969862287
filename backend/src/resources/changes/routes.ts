import { ChangePage } from '@tiltwright/shared/schemas/edition.ts';
import * as z from 'zod';
import type { Deps } from '../../deps.ts';
import { pageFields } from '../../http/cursor.ts';
import { type Route, revalidate, route } from '../../http/operation.ts';
import { listChanges } from './list-changes.ts';

export function changeRoutes({ db }: Deps): Route[] {
  return [
    route(
      {
        id: 'listChanges',
        method: 'get',
        path: '/changes',
        tag: 'Catalog',
        summary: 'What changed, oldest first, to be read on from where you stopped',
        description: 'Begin with `after=0`, or with the number of the edition you have. Keep `next`; ask again with it whenever you like.',
        may: 'catalog.read',
        query: z.strictObject({
          after: z.string().min(1).max(300).default('0').describe('Number of an edition, or `next` of the page before.'),
          limit: pageFields.limit,
        }),
        reply: { status: 200, description: 'A page of changes.', schema: ChangePage },
        cache: revalidate,
      },
      ({ query }) => listChanges(db, query.after, query.limit),
    ),
  ];
}
