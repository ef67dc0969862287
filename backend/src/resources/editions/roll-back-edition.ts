// Undoes one edition by publishing the earlier values as a new one; history stays.
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { RolledBack } from '@tiltwright/shared/schemas/edition.ts';
import type { FieldChange } from '@tiltwright/shared/schemas/import.ts';
import type { Db } from '../../db/connect.ts';
import type { RecordStatus } from '../../db/schema/catalog.ts';
import type { Origin } from '../../db/schema/imports.ts';
import { ApiProblem } from '../../errors.ts';
import { findEdition } from '../catalog/queries.ts';
import { everyField } from './history-writer.ts';
import { publishEdition } from './publish-edition.ts';
import { type RecordState, stateReader } from './record-state.ts';
import type { RecordWrite } from './record-write.ts';

interface Undone {
  kind: Table;
  recordId: string;
  revision: number;
  changes: FieldChange[];
  before: Record<string, unknown> | null;
  after: Record<string, unknown>;
  origins: { before: Record<string, Origin>; after: Record<string, Origin> };
}

/** Kept fields told of in the answer; the rest are counted in the history of the records. */
const mostKept = 200;

/**
 * Every field the edition set goes back to what it was, unless a later edition has set it again: then it stays and is told of.
 * A record that the edition first published becomes withdrawn; one it withdrew comes back.
 * @throws ApiProblem not-found, wrong-state
 */
export function rollBackEdition(db: Db, edition: number, why: string | null, actor: string): RolledBack {
  return db.transaction(
    () => {
      if (edition < 1 || !findEdition(db, edition)) throw new ApiProblem('not-found', `There is no edition ${edition}.`);
      const result = { withdrawn: 0, kept: [] as RolledBack['kept'] };
      const order = { actor, why: why ?? `Edition ${edition} rolled back`, action: 'edition.rollback' as const, subject: String(edition) };
      try {
        return { ...publishEdition(db, order, undoing(db, edition, result)), ...result };
      } catch (error) {
        if (error instanceof ApiProblem && error.code === 'wrong-state')
          throw new ApiProblem(
            'wrong-state',
            error.message.startsWith('Nothing')
              ? `Nothing of edition ${edition} stands any more: there is nothing to roll back.`
              : error.message,
          );
        throw error;
      }
    },
    { behavior: 'immediate' },
  );
}

function* undoing(db: Db, edition: number, result: Pick<RolledBack, 'withdrawn' | 'kept'>): Generator<RecordWrite> {
  const stateOf = stateReader(db.$client);
  for (const undone of revisionsBackwards(db, edition)) {
    const now = stateOf(undone.kind, undone.recordId);
    if (!now) continue;
    const { write, kept } = undo(undone, now);
    if (kept.length > 0 && result.kept.length < mostKept) result.kept.push({ record: undone.recordId, fields: kept });
    if (!write) continue;
    if (write.status === 'withdrawn') result.withdrawn++;
    yield write;
  }
}

function undo(undone: Undone, now: RecordState): { write?: RecordWrite; kept: string[] } {
  const { kind, recordId, before, after, origins, changes } = undone;
  const origin = Object.values(origins.before)[0] ?? origins.after[everyField]!;
  if (before === null) {
    if (now.status !== 'published') return { kept: [] };
    const change = { field: 'status', before: now.status, after: 'withdrawn' };
    return { write: { kind, recordId, values: {}, origin, status: 'withdrawn', changes: [change] }, kept: [] };
  }
  const write: RecordWrite = { kind, recordId, values: {}, origin, origins: {}, changes: [] };
  const kept: string[] = [];
  for (const field of Object.keys(after)) {
    const [was, is] = [before[field] ?? null, now.values[field] ?? null];
    const setOrigin = origins.after[field] ?? origins.after[everyField];
    // A field that only places a trim point has no origin of its own.
    const stands = same(is, after[field] ?? null) && (is === null || !setOrigin || same(now.origins[field], setOrigin));
    const cameFrom = origins.before[field];
    if (same(is, was) && (was === null || same(now.origins[field], cameFrom))) continue;
    if (!stands) {
      kept.push(field);
      continue;
    }
    write.values[field] = was;
    if (was !== null && cameFrom) write.origins![field] = cameFrom;
    write.changes.push(
      same(is, was)
        ? { field: `${field}.basis`, before: now.origins[field]?.basis ?? null, after: cameFrom?.basis ?? null }
        : { field, before: is, after: was },
    );
  }
  const status = changes.find(({ field }) => field === 'status') as { before: RecordStatus; after: RecordStatus } | undefined;
  const comesBack = status !== undefined && status.after === now.status;
  if (comesBack) write.changes.push({ field: 'status', before: now.status, after: status.before });
  if (write.changes.length === 0) return { kept };
  return { write: { ...write, status: comesBack ? status.before : now.status, ...(comesBack && { supersededBy: null }) }, kept };
}

const same = (a: unknown, b: unknown) => a === b || JSON.stringify(a) === JSON.stringify(b);

/** Last written first, a page at a time. @throws ApiProblem wrong-state for an edition whose origins were never kept */
function* revisionsBackwards({ $client: sqlite }: Db, edition: number): Generator<Undone> {
  const page = sqlite.prepare(
    'SELECT kind, record_id AS recordId, revision, changes, "before", "after", origins FROM revisions WHERE edition = ? AND (record_id, revision) < (?, ?) ORDER BY record_id DESC, revision DESC LIMIT 2000',
  );
  let [lastId, lastRevision] = ['~', 0];
  while (true) {
    const rows = page.all(edition, lastId, lastRevision) as (Record<string, string | null> & { recordId: string; revision: number })[];
    if (rows.length === 0) return;
    for (const row of rows) {
      [lastId, lastRevision] = [row.recordId, row.revision];
      if (row.origins === null)
        throw new ApiProblem(
          'wrong-state',
          `Edition ${edition} was published before origins were kept beside values; it cannot be rolled back.`,
        );
      yield {
        ...{ kind: row.kind as Table, recordId: row.recordId, revision: row.revision },
        ...{ changes: JSON.parse(row.changes!), before: row.before === null ? null : JSON.parse(row.before!) },
        ...{ after: JSON.parse(row.after!), origins: JSON.parse(row.origins!) },
      };
    }
  }
}
