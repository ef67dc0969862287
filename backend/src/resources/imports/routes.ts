import { rm } from 'node:fs/promises';
import path from 'node:path';
import { encodings } from '@tiltwright/shared/csv/encoding.ts';
import { delimiters } from '@tiltwright/shared/csv/formats.ts';
import { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import { CreatedImport, Import, PublishedEdition, PublishOrder } from '@tiltwright/shared/schemas/import.ts';
import * as z from 'zod';
import { actorId } from '../../auth/actor.ts';
import type { Deps } from '../../deps.ts';
import { decodeCursor, listOf, page, pageFields } from '../../http/cursor.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { parseBody } from '../../http/validate.ts';
import { demandRoom } from '../../storage/room.ts';
import { beginCheck } from './check-import.ts';
import { cancelCheck, discardImport } from './end-import.ts';
import { beginPublish } from './publish-import.ts';
import { importOrProblem, listImports, toImport } from './queries.ts';
import { fileReceiver } from './receive-file.ts';
import { streamEvents } from './stream-events.ts';
import { uploadImport } from './upload-import.ts';

const tag = 'Imports';
const may = 'imports.manage';
const cache = noStore;
const params = z.strictObject({ id: z.string().min(1).max(80) });
const UploadFields = z.strictObject({
  table: Table,
  headerRow: z.coerce.number().int().min(1).max(1000).optional().describe('Row of the column names, where it is not found by itself.'),
  encoding: z.enum(encodings).optional().describe('Text encoding, where it is not found by itself.'),
  delimiter: z.enum(delimiters).optional(),
});

export function importRoutes(deps: Deps): Route[] {
  const { db, config, jobs } = deps;
  const receive = fileReceiver(config.uploadsFolder, config.uploadMaxBytes);
  return [
    route(
      {
        id: 'uploadImport',
        method: 'post',
        path: '/imports',
        tag,
        summary: 'Upload a CSV table',
        description:
          'A form with `file` and `table`. A file that is no text table is refused and not kept. A header in words of its own is taken where a row looks like one: map it before the check.',
        may,
        multipart: UploadFields.extend({ file: z.string().meta({ format: 'binary' }).describe('The table, at most 50 MB.') }),
        reply: { status: 201, description: 'The import.', schema: CreatedImport },
        problems: ['binary-file', 'wrong-encoding', 'no-header', 'bad-table', 'storage-full'],
        cache,
      },
      async ({ actor, req, res }) => {
        await demandRoom(config);
        const form = await receive(req, res);
        try {
          const { table, ...choices } = parseBody(UploadFields, form.fields);
          const { id, status } = await uploadImport(deps, { table, choices, ...form.file }, actorId(actor));
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
        problems: ['not-found', 'wrong-state', 'incomplete-mapping'],
        cache,
      },
      ({ params: { id }, req }) => {
        const begun = toImport(db, beginCheck(deps, id));
        jobs.run({ kind: 'check', id }).catch((error: unknown) => req.log.error({ err: error }, 'check of an import failed'));
        return begun;
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
      ({ params: { id }, body, actor }) => {
        beginPublish(db, id);
        return jobs.run({ kind: 'publish', id, order: body, actor: actorId(actor) });
      },
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
      ({ params: { id }, actor }) => discardImport(deps, id, actorId(actor)),
    ),
    route(
      {
        id: 'cancelImport',
        method: 'post',
        path: '/imports/{id}/cancel',
        tag,
        summary: 'Stop a check under way',
        description:
          'The file and its mapping stay; nothing was published. Publishing is one step and cannot be stopped: roll its edition back.',
        may,
        params,
        reply: { status: 200, description: 'The import, as it was before the check.', schema: Import },
        problems: ['not-found', 'wrong-state'],
        cache,
      },
      ({ params: { id }, actor }) => {
        cancelCheck(db, id, actorId(actor));
        return toImport(db, importOrProblem(db, id));
      },
    ),
    route(
      {
        id: 'watchImport',
        method: 'get',
        path: '/imports/{id}/events',
        tag,
        summary: 'Progress of a check or a publication, as server-sent events',
        description: 'Each `import` event carries the import as `GET /imports/{id}` shows it; the stream ends once nothing is under way.',
        may,
        params,
        reply: { status: 200, description: 'The events.', schema: z.string(), contentType: 'text/event-stream' },
        problems: ['not-found'],
        // Compression would hold the events back.
        cache: 'no-store, no-transform',
      },
      ({ params: { id }, res }) => streamEvents(db, id, res),
    ),
  ];
}
