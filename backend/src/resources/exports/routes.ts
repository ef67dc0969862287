import { once } from 'node:events';
import { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import * as z from 'zod';
import type { Deps } from '../../deps.ts';
import { type Route, revalidate, route } from '../../http/operation.ts';
import { currentEdition } from '../catalog/queries.ts';
import { exportTable } from './export-table.ts';

export function exportRoutes({ db }: Deps): Route[] {
  return [
    route(
      {
        id: 'exportTable',
        method: 'get',
        path: '/exports/{table}.csv',
        tag: 'Catalog',
        summary: 'A whole table as CSV',
        description:
          'Canonical columns, published records only. Texts that a spreadsheet would run carry an apostrophe. Imported again it is unchanged throughout.',
        may: 'catalog.read',
        params: z.strictObject({ table: Table }),
        reply: { status: 200, description: 'The table.', schema: z.string(), contentType: 'text/csv' },
        cache: revalidate,
      },
      async ({ params: { table }, res }) => {
        res.type('text/csv; charset=utf-8').attachment(`${table}-edition-${currentEdition(db)}.csv`);
        for (const piece of exportTable(db, table)) {
          if (res.destroyed) return;
          if (!res.write(piece)) await Promise.race([once(res, 'drain'), once(res, 'close')]);
        }
        res.end();
      },
    ),
  ];
}
