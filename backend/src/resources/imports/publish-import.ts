// The accepted rows of an import become one edition: all of them or none.
import type { PublishOrder } from '@tiltwright/shared/schemas/import.ts';
import type { ProblemIssue } from '@tiltwright/shared/schemas/problem.ts';
import type { Db } from '../../db/connect.ts';
import { ApiProblem } from '../../errors.ts';
import { currentEdition } from '../catalog/queries.ts';
import { publishEdition } from '../editions/publish-edition.ts';
import type { RecordWrite } from '../editions/record-write.ts';
import { rowStore } from './import-rows.ts';
import { type ImportRecord, importOrProblem, setImport } from './queries.ts';

/** Sets the status to `publishing`, so that nobody edits meanwhile. @throws ApiProblem wrong-state, stale-edition */
export function beginPublish(db: Db, id: string): void {
  db.transaction(
    () => {
      refuseUnlessReady(db, importOrProblem(db, id), 'checked');
      setImport(db, id, { status: 'publishing' });
    },
    { behavior: 'immediate' },
  );
}

/** After a publication that did not happen the import is as it was. */
export function abandonPublish(db: Db, id: string): void {
  if (importOrProblem(db, id).status === 'publishing') setImport(db, id, { status: 'checked' });
}

/** @throws ApiProblem wrong-state, or stale-edition when the catalog moved on since the check */
export function publishImport(db: Db, id: string, order: PublishOrder, actor: string): { edition: number } {
  return db.transaction(
    () => {
      const record = importOrProblem(db, id);
      refuseUnlessReady(db, record, 'publishing');
      const edition = { actor, why: order.why ?? null, action: 'edition.publish' as const, subject: id };
      const { edition: published } = publishEdition(db, edition, writesOf(db, record, order.holdCautions));
      setImport(db, id, { status: 'published', edition: published });
      return { edition: published };
    },
    { behavior: 'immediate' },
  );
}

function* writesOf(db: Db, { id, table }: ImportRecord, holdCautions: boolean): Generator<RecordWrite> {
  for (const { recordId, write, changes, hasCautions, decision } of rowStore(db, id).accepted()) {
    if (holdCautions && hasCautions && decision !== 'accept') continue;
    yield { kind: table, recordId, ...write, changes };
  }
}

function refuseUnlessReady(db: Db, record: ImportRecord, status: 'checked' | 'publishing'): void {
  if (record.status !== status) throw new ApiProblem('wrong-state', `An import that is ${record.status} cannot be published.`);
  const newest = currentEdition(db);
  if (record.checkedAgainst === newest) return;
  const changed = changedSince(db, record);
  const own = changed.length > 0 ? ` It changed records of this import: ${changed.map(({ message }) => message).join(' ')}` : '';
  throw new ApiProblem('stale-edition', `Edition ${newest} was published since this import was checked; check it again.${own}`, changed);
}

/** Rows whose record another edition has changed since the check, the first ten. */
function changedSince({ $client: sqlite }: Db, { id, checkedAgainst }: ImportRecord): ProblemIssue[] {
  const rows = sqlite
    .prepare(
      `SELECT r.n, r.name, max(v.edition) AS edition FROM import_rows r JOIN revisions v ON v.record_id = r.record_id
       WHERE r.import_id = ? AND v.edition > ? GROUP BY r.n ORDER BY r.n LIMIT 10`,
    )
    .all(id, checkedAgainst ?? -1) as { n: number; name: string; edition: number }[];
  return rows.map(({ n, name, edition }) => ({
    path: `/rows/${n}`,
    code: 'changed-since',
    message: `Row ${n} (${name}) in edition ${edition}.`,
  }));
}
