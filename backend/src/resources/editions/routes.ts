import { Edition } from '@tiltwright/shared/schemas/edition.ts';
import * as z from 'zod';
import type { Deps } from '../../deps.ts';
import { ApiProblem } from '../../errors.ts';
import { decodeCursor, listOf, page, pageFields } from '../../http/cursor.ts';
import { type Route, revalidate, route } from '../../http/operation.ts';
import { currentEdition, findEdition, listEditions, listMakers } from '../catalog/queries.ts';

export function editionRoutes({ db }: Deps): Route[] {
  return [
    route(
      {
        id: 'listEditions',
        method: 'get',
        path: '/editions',
        tag: 'Catalog',
        summary: 'Editions of the catalog, newest first',
        may: 'catalog.read',
        query: z.strictObject(pageFields),
        reply: { status: 200, description: 'A page of editions.', schema: listOf(Edition) },
        problems: ['stale-edition'],
        cache: revalidate,
      },
      ({ query }) => {
        const place = decodeCursor(query.cursor, currentEdition(db));
        return page(listEditions(db, query.limit, place.after), query.limit, place);
      },
    ),
    route(
      {
        id: 'getEdition',
        method: 'get',
        path: '/editions/{n}',
        tag: 'Catalog',
        summary: 'One edition',
        may: 'catalog.read',
        params: z.strictObject({ n: z.int().min(0).max(1e9) }),
        reply: { status: 200, description: 'The edition.', schema: Edition },
        problems: ['not-found'],
        cache: revalidate,
      },
      ({ params }) => {
        const edition = findEdition(db, params.n);
        if (!edition) throw new ApiProblem('not-found', `There is no edition ${params.n}; the newest is ${currentEdition(db)}.`);
        return edition;
      },
    ),
    route(
      {
        id: 'listMakers',
        method: 'get',
        path: '/makers',
        tag: 'Catalog',
        summary: 'Makers of the catalog, by name',
        may: 'catalog.read',
        reply: { status: 200, description: 'All makers.', schema: listOf(z.strictObject({ name: z.string() }).meta({ id: 'Maker' })) },
        cache: revalidate,
      },
      () => ({ data: listMakers(db), next: null }),
    ),
  ];
}
