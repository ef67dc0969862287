import { SearchHit } from '@tiltwright/shared/schemas/edition.ts';
import * as z from 'zod';
import type { Deps } from '../../deps.ts';
import { listOf } from '../../http/cursor.ts';
import { type Route, revalidate, route } from '../../http/operation.ts';
import { findRecord } from '../catalog/queries.ts';

export function searchRoutes({ db, search }: Deps): Route[] {
  return [
    route(
      {
        id: 'search',
        method: 'get',
        path: '/search',
        tag: 'Catalog',
        summary: 'Find hulls, lower units, transducers and mounts by name',
        description: 'Best first; slips, joined and split words allowed.',
        may: 'catalog.read',
        query: z.strictObject({ q: z.string().trim().min(1).max(120), limit: z.int().min(1).max(200).default(20) }),
        reply: { status: 200, description: 'The findings.', schema: listOf(SearchHit) },
        byEdition: true,
        cache: revalidate,
      },
      ({ query }) => {
        const data = search.find(query.q, undefined, query.limit).flatMap(({ kind, id, corrected }) => {
          const row = findRecord(db, kind, id);
          if (row?.status !== 'published') return [];
          const { maker, model, package: pack, yearFrom, yearTo, generic } = row;
          return [{ kind, id, maker, model, package: pack, yearFrom, yearTo, generic, corrected }];
        });
        return { data, next: null };
      },
    ),
  ];
}
