// Looking at an import's rows, mending them, and mapping its columns.
import path from 'node:path';
import { Fate, ImportRow, RowPatch } from '@tiltwright/shared/schemas/import.ts';
import { Fix, FixResult, Mapping, MappingSheet } from '@tiltwright/shared/schemas/mapping.ts';
import * as z from 'zod';
import { actorId } from '../../auth/actor.ts';
import type { Deps } from '../../deps.ts';
import { decodeCursor, listOf, page, pageFields } from '../../http/cursor.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { errorsCsv } from './errors-csv.ts';
import { saveMapping, showMapping } from './map-import.ts';
import { findRow, importOrProblem, listRows, toImportRows } from './queries.ts';
import { fixCells, patchRow } from './review-rows.ts';

const tag = 'Imports';
const may = 'imports.manage';
const cache = noStore;
const params = z.strictObject({ id: z.string().min(1).max(80) });

export function reviewRoutes(deps: Deps): Route[] {
  const { db } = deps;
  return [
    route(
      {
        id: 'listImportRows',
        method: 'get',
        path: '/imports/{id}/rows',
        tag,
        summary: 'Rows with their fates, in the file’s order',
        may,
        params,
        query: z.strictObject({ fate: Fate.optional(), ...pageFields }),
        reply: { status: 200, description: 'A page of rows.', schema: listOf(ImportRow) },
        problems: ['not-found'],
        cache,
      },
      ({ params: { id }, query }) => {
        const { header } = importOrProblem(db, id);
        const place = decodeCursor(query.cursor, 0);
        const { data, next } = page(listRows(db, id, query.fate, query.limit, place.after), query.limit, place);
        return { data: toImportRows(db, id, header ?? [], data), next };
      },
    ),
    route(
      {
        id: 'getImportErrors',
        method: 'get',
        path: '/imports/{id}/errors.csv',
        tag,
        summary: 'The wrong and conflicting rows as CSV, with a reason column',
        may,
        params,
        reply: { status: 200, description: 'The table.', schema: z.string(), contentType: 'text/csv' },
        problems: ['not-found'],
        cache,
      },
      ({ params: { id }, res }) => {
        const record = importOrProblem(db, id);
        res.type('text/csv; charset=utf-8').attachment(`${path.parse(record.fileName).name}-errors.csv`);
        res.send(errorsCsv(db, record));
      },
    ),
    route(
      {
        id: 'patchImportRow',
        method: 'patch',
        path: '/imports/{id}/rows/{n}',
        tag,
        summary: 'Mend one row, accept or skip it, or decide its conflict',
        description: 'The row is judged again at once, and so are the rows that speak of the same record. Edits outlive a new check.',
        may,
        params: params.extend({ n: z.int().min(1).max(1e9) }),
        body: RowPatch,
        bodyExample: { cells: { deadrise_deg: '18' } },
        reply: { status: 200, description: 'The row as it stands now.', schema: ImportRow },
        problems: ['not-found', 'wrong-state', 'stale-edition'],
        cache,
      },
      ({ params: { id, n }, body }) => {
        patchRow(db, id, n, body);
        return toImportRows(db, id, importOrProblem(db, id).header ?? [], [findRow(db, id, n)!])[0];
      },
    ),
    route(
      {
        id: 'fixImportCells',
        method: 'post',
        path: '/imports/{id}/fixes',
        tag,
        summary: 'Mend every cell of a column that reads the same',
        may,
        params,
        body: Fix,
        bodyExample: { column: 'form', from: 'semi-vee', to: 'modified-v' },
        reply: { status: 200, description: 'How many rows were judged again.', schema: FixResult },
        problems: ['not-found', 'wrong-state', 'stale-edition'],
        cache,
      },
      ({ params: { id }, body, actor }) => ({ rows: fixCells(db, id, body, actorId(actor)) }),
    ),
    route(
      {
        id: 'getImportMapping',
        method: 'get',
        path: '/imports/{id}/mapping',
        tag,
        summary: 'How the file’s columns are read: saved, remembered or suggested, with the first rows read live',
        may,
        params,
        query: z.strictObject({
          headerRow: z.int().min(1).max(1000).optional().describe('Try another header row; nothing is saved.'),
        }),
        reply: { status: 200, description: 'The mapping and a preview.', schema: MappingSheet },
        problems: ['not-found', 'wrong-state', 'no-header', 'bad-table'],
        cache,
      },
      ({ params: { id }, query }) => showMapping(deps, id, query.headerRow),
    ),
    route(
      {
        id: 'putImportMapping',
        method: 'put',
        path: '/imports/{id}/mapping',
        tag,
        summary: 'Say how the file’s columns are read',
        description:
          'Saved also while something is missing, and then told; the check waits until nothing is. A complete mapping is remembered for files of the same header.',
        may,
        params,
        body: Mapping,
        bodyExample: {
          headerRow: 3,
          columns: [
            { at: 0, to: 'model' },
            { at: 1, split: { by: 'times', into: ['length_m', 'beam_m'] }, unit: 'ft' },
            { at: 2, to: 'years' },
          ],
          constants: { maker: 'Alderwick', form: 'modified-v' },
        },
        reply: { status: 200, description: 'The mapping and a preview.', schema: MappingSheet },
        problems: ['not-found', 'wrong-state', 'no-header', 'bad-table'],
        cache,
      },
      ({ params: { id }, body, actor }) => saveMapping(deps, id, body, actorId(actor)),
    ),
  ];
}
