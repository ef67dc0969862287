// The feed of changes: every revision in the order of editions, to be read on from where one stopped.
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { Change, ChangePage } from '@tiltwright/shared/schemas/edition.ts';
import type { FieldChange } from '@tiltwright/shared/schemas/import.ts';
import * as z from 'zod';
import type { Db } from '../../db/connect.ts';
import { ApiProblem } from '../../errors.ts';
import { currentEdition } from '../catalog/queries.ts';
import { firstChanges } from '../editions/first-changes.ts';

type Position = [edition: number, recordId: string, revision: number];

const Position = z.tuple([z.int().nonnegative(), z.string().max(80), z.int().nonnegative()]);
const write = (position: Position) => Buffer.from(JSON.stringify(position)).toString('base64url');

/** An edition's number stands for all of that edition. @throws ApiProblem invalid-input */
function read(after: string): Position {
  if (/^\d{1,9}$/.test(after)) return [Number(after), '~', 0];
  try {
    return Position.parse(JSON.parse(Buffer.from(after, 'base64url').toString('utf8')));
  } catch {
    const message = 'Use the number of an edition, or `next` as it was given.';
    throw new ApiProblem('invalid-input', `after: ${message}`, [{ path: 'after', code: 'invalid-cursor', message }]);
  }
}

/** Changes behind `after`; `next` is where to go on, also when there is nothing new yet. */
export function listChanges(db: Db, after: string, limit: number): ChangePage {
  const from = read(after);
  const rows = db.$client
    .prepare(
      `SELECT kind, record_id AS record, revision, edition, at, why, source, changes, "after", "before" IS NULL AS isNew FROM revisions
       WHERE (edition, record_id, revision) > (?, ?, ?) ORDER BY edition, record_id, revision LIMIT ?`,
    )
    .all(...from, limit + 1) as (Omit<Change, 'changes' | 'isNew'> & { kind: Table; changes: string; after: string; isNew: 0 | 1 })[];
  const shown = rows.slice(0, limit);
  const last = shown.at(-1);
  return {
    data: shown.map(({ changes, after: values, isNew, ...row }) => ({
      ...row,
      isNew: isNew === 1,
      changes: isNew ? firstChanges(JSON.parse(values)) : (JSON.parse(changes) as FieldChange[]),
    })),
    next: last ? write([last.edition, last.record, last.revision]) : after,
    more: rows.length > limit,
    edition: currentEdition(db),
  };
}
