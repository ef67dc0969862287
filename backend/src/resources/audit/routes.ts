import { guardFormula } from '@tiltwright/shared/csv/words.ts';
import { writeRow } from '@tiltwright/shared/csv/write-table.ts';
import { AuditEntry } from '@tiltwright/shared/schemas/desk.ts';
import * as z from 'zod';
import { actorId } from '../../auth/actor.ts';
import type { Deps } from '../../deps.ts';
import { decodeCursor, encodeCursor, listOf, pageFields } from '../../http/cursor.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { audit } from '../audit.ts';
import { type AuditFilter, listAudit } from './queries.ts';

const tag = 'Administration';
const may = 'site.run';
const words = z.string().trim().min(1).max(80).optional();
const moment = z.union([z.iso.date(), z.iso.datetime()]).optional();
const filterFields = {
  actor: words.describe('Opaque id of who acted.'),
  action: words.describe('Whole, as `session.begin`, or its first word.'),
  subject: words.describe('Id of what was acted on.'),
  from: moment.describe('First day or moment, UTC.'),
  to: moment.describe('Up to this day or moment, not with it.'),
};
/** Rows of an export read at a time: the whole log never stands in memory. */
const chunk = 2000;
const header = ['entry', 'at', 'actor', 'name', 'action', 'subject', 'detail'];

export function auditRoutes({ db }: Deps): Route[] {
  return [
    route(
      {
        id: 'listAudit',
        method: 'get',
        path: '/audit',
        tag,
        summary: 'The audit log, newest first',
        description: 'Entries are only ever added. They name people by opaque ids; once a person has left, an id names nobody.',
        may,
        query: z.strictObject({ ...filterFields, ...pageFields }),
        reply: { status: 200, description: 'A page of entries.', schema: listOf(AuditEntry) },
        cache: noStore,
      },
      ({ query: { limit, cursor, ...filter } }) => {
        const { after } = decodeCursor(cursor, 0);
        const rows = listAudit(db, filter, limit + 1, after === 0 ? undefined : after);
        const data = rows.slice(0, limit);
        return { data, next: rows.length > limit ? encodeCursor({ edition: 0, after: data.at(-1)!.entry }) : null };
      },
    ),
    route(
      {
        id: 'exportAudit',
        method: 'get',
        path: '/audit.csv',
        tag,
        summary: 'The audit log as CSV',
        may,
        query: z.strictObject(filterFields),
        reply: { status: 200, description: 'The table, newest first.', schema: z.string(), contentType: 'text/csv' },
        cache: noStore,
      },
      async ({ query, actor, res }) => {
        audit(db, actorId(actor), 'audit.export', null, query);
        res.type('text/csv; charset=utf-8').attachment('audit.csv');
        res.write(writeRow(header));
        for (const lines of exportLines(query)) {
          if (res.destroyed) return;
          if (!res.write(lines)) await new Promise<void>((resolve) => res.once('drain', resolve).once('close', resolve));
        }
        res.end();
      },
    ),
  ];

  function* exportLines(filter: AuditFilter): Generator<string> {
    let before: number | undefined;
    for (;;) {
      const rows = listAudit(db, filter, chunk, before);
      if (rows.length === 0) return;
      before = rows.at(-1)!.entry;
      yield rows.map(lineOf).join('');
    }
  }
}

const lineOf = ({ entry, at, actor, actorName, action, subject, detail }: AuditEntry) =>
  writeRow([String(entry), at, actor ?? '', actorName ?? '', action, subject ?? '', JSON.stringify(detail)].map(guardFormula));
