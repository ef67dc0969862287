import { rm } from 'node:fs/promises';
import path from 'node:path';
import { guardFormula } from '@tiltwright/shared/csv/words.ts';
import { writeRow } from '@tiltwright/shared/csv/write-table.ts';
import { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import { CreatedImport, Fate, Import, ImportRow, PublishedEdition, PublishOrder } from '@tiltwright/shared/schemas/import.ts';
import * as z from 'zod';
import { actorId } from '../../auth/actor.ts';
import type { Deps } from '../../deps.ts';
import { ApiProblem } from '../../errors.ts';
import { decodeCursor, listOf, page, pageFields } from '../../http/cursor.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { parseBody } from '../../http/validate.ts';
import { audit } from '../audit.ts';
import { beginCheck, runCheck } from './check-import.ts';
import { publishImport } from './publish-import.ts';
import { importOrProblem, listImports, listRows, setImport, toImport, toImportRow } from './queries.ts';
import { fileReceiver } from './receive-file.ts';
import { uploadImport } from './upload-import.ts';

const tag = 'Imports';
const may = 'imports.manage';
const cache = noStore;
const params = z.strictObject({ id: z.string().min(1).max(80) });
const UploadFields = z.strictObject({ table: Table });

export function importRoutes(deps: Deps): Route[] {
  const { db, config } = deps;
  const receive = fileReceiver(config.uploadsFolder, config.uploadMaxBytes);
  return [
    route(
      {
        id: 'uploadImport',
        method: 'post',
        path: '/imports',
        tag,
        summary: 'Upload a CSV table',
        description: 'A form with `file` and `table`. A file that is no text table is refused and not kept.',
        may,
        multipart: UploadFields.extend({ file: z.string().meta({ format: 'binary' }).describe('The table, at most 50 MB.') }),
        reply: { status: 201, description: 'The import.', schema: CreatedImport },
        problems: ['binary-file', 'wrong-encoding', 'no-header', 'bad-table', 'storage-full'],
        cache,
      },
      async ({ actor, req, res }) => {
        const form = await receive(req, res);
        try {
          const { table } = parseBody(UploadFields, form.fields);
          const { id, status } = await uploadImport(deps, { table, ...form.file }, actorId(actor));
          return { id, status };
        } catch (error) {
          await rm(path.join(config.uploadsFolder, form.file.storedAs), { force: true });
          throw error;
        }
      },
    ),
    route(
      {
        id: 'listImports',
        method: 'get',
        path: '/imports',
        tag,
        summary: 'Imports, newest first',
        may,
        query: z.strictObject(pageFields),
        reply: { status: 200, description: 'A page of imports.', schema: listOf(Import) },
        cache,
      },
      ({ query }) => {
        const place = decodeCursor(query.cursor, 0);
        const { data, next } = page(listImports(db, query.limit, place.after), query.limit, place);
        return { data: data.map((row) => toImport(db, row)), next };
      },
    ),
    route(
      {
        id: 'getImport',
        method: 'get',
        path: '/imports/{id}',
        tag,
        summary: 'One import: status and counts',
        may,
        params,
        reply: { status: 200, description: 'The import.', schema: Import },
        problems: ['not-found'],
        cache,
      },
      ({ params: { id } }) => toImport(db, importOrProblem(db, id)),
    ),
    route(
      {
        id: 'checkImport',
        method: 'post',
        path: '/imports/{id}/check',
        tag,
        summary: 'Work out every row’s fate',
        description: 'Runs on after the answer; the import’s status is `checking` until it is `checked`.',
        may,
        params,
        reply: { status: 202, description: 'The check has begun.', schema: Import },
        problems: ['not-found', 'wrong-state'],
        cache,
      },
      ({ params: { id }, req }) => {
        const begun = toImport(db, beginCheck(deps, id));
        runCheck(deps, id).catch((error: unknown) => req.log.error({ err: error }, 'check of an import failed'));
        return begun;
      },
    ),
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
        return { data: data.map((row) => toImportRow(row, header ?? [])), next };
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
        const { header, fileName } = importOrProblem(db, id);
        res.type('text/csv; charset=utf-8').attachment(`${path.parse(fileName).name}-errors.csv`);
        const rows = (['error', 'conflict'] as const).flatMap((fate) => listRows(db, id, fate, 250_000, 0));
        const lines = rows.map(({ n, cells, errors }) => ({
          n,
          line: writeRow([
            ...(header ?? []).map((_, index) => guardFormula(cells[index] ?? '')),
            errors.map(({ column, message }) => `${column}: ${message}`).join(' '),
          ]),
        }));
        const body = lines.sort((a, b) => a.n - b.n).map(({ line }) => line);
        res.send([writeRow([...(header ?? []), 'reason']), ...body].join(''));
      },
    ),
    route(
      {
        id: 'publishImport',
        method: 'post',
        path: '/imports/{id}/publish',
        tag,
        summary: 'Publish the new and changed rows as one edition',
        description:
          'All of them or none. Wrong, duplicate and conflicting rows are left out and stay listed; rows with cautions are published unless `holdCautions` is set.',
        may,
        params,
        body: PublishOrder,
        bodyExample: { why: 'Spring list of the builder' },
        reply: { status: 200, description: 'The edition; it is committed.', schema: PublishedEdition },
        problems: ['not-found', 'wrong-state', 'stale-edition', 'storage-full'],
        cache,
      },
      ({ params: { id }, body, actor }) => publishImport(db, id, body, actorId(actor)),
    ),
    route(
      {
        id: 'discardImport',
        method: 'delete',
        path: '/imports/{id}',
        tag,
        summary: 'Discard an import that is not published',
        may,
        params,
        reply: { status: 204, description: 'Discarded; a check under way stops.' },
        problems: ['not-found', 'wrong-state'],
        cache,
      },
      async ({ params: { id }, actor }) => {
        const record = importOrProblem(db, id);
        if (record.status === 'discarded') return;
        if (record.status === 'published') throw new ApiProblem('wrong-state', 'A published import stays; roll its edition back instead.');
        db.transaction(
          (tx) => {
            setImport(tx, id, { status: 'discarded' });
            audit(tx, actorId(actor), 'import.discard', id);
          },
          { behavior: 'immediate' },
        );
        await rm(path.join(config.uploadsFolder, record.storedAs), { force: true });
      },
    ),
  ];
}
