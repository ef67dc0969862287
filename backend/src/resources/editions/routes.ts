import { Edition, RecordDifference, RollbackOrder, RolledBack } from '@tiltwright/shared/schemas/edition.ts';
import * as z from 'zod';
import { actorId } from '../../auth/actor.ts';
import type { Deps } from '../../deps.ts';
import { ApiProblem } from '../../errors.ts';
import { decodeCursor, listOf, page, pageFields } from '../../http/cursor.ts';
import { noStore, type Route, revalidate, route } from '../../http/operation.ts';
import { currentEdition, findEdition, listEditions, listMakers } from '../catalog/queries.ts';
import { compareEditions } from './compare-editions.ts';

const editionNumber = z.int().min(0).max(1e9);

export function editionRoutes({ db, jobs }: Deps): Route[] {
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
        byEdition: true,
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
        byEdition: true,
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
        id: 'compareEditions',
        method: 'get',
        path: '/editions/{a}/compare/{b}',
        tag: 'Catalog',
        summary: 'What lies between two editions, record by record',
        may: 'catalog.read',
        params: z.strictObject({ a: editionNumber, b: editionNumber }),
        query: z.strictObject(pageFields),
        reply: { status: 200, description: 'Records that differ.', schema: listOf(RecordDifference) },
        problems: ['not-found', 'stale-edition'],
        cache: revalidate,
      },
      ({ params: { a, b }, query }) => {
        if (a > b)
          throw new ApiProblem('invalid-input', 'a: name the earlier edition first.', [
            { path: 'a', code: 'later-edition', message: 'Name the earlier edition first.' },
          ]);
        if (b > currentEdition(db)) throw new ApiProblem('not-found', `There is no edition ${b}; the newest is ${currentEdition(db)}.`);
        const place = decodeCursor(query.cursor, b);
        return page(compareEditions(db, a, b, query.limit, place.after), query.limit, place);
      },
    ),
    route(
      {
        id: 'rollBackEdition',
        method: 'post',
        path: '/editions/{n}/rollback',
        tag: 'Imports',
        summary: 'Undo an edition by publishing the earlier values as a new one',
        description:
          'Fields that a later edition has set again stay and are named. Records that the edition first published become withdrawn: their id still answers, with that word. History stays.',
        may: 'imports.manage',
        params: z.strictObject({ n: editionNumber }),
        body: RollbackOrder,
        bodyExample: { why: 'The builder took the list back' },
        reply: { status: 200, description: 'The new edition; it is committed.', schema: RolledBack },
        problems: ['not-found', 'wrong-state', 'storage-full'],
        cache: noStore,
      },
      ({ params: { n }, body, actor }) => jobs.run({ kind: 'rollback', edition: n, why: body.why ?? null, actor: actorId(actor) }),
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
        byEdition: true,
        cache: revalidate,
      },
      () => ({ data: listMakers(db), next: null }),
    ),
  ];
}
