// The one way into the catalog: writes of records become one edition, all of them or none.
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { Db } from '../../db/connect.ts';
import { ApiProblem } from '../../errors.ts';
import { audit } from '../audit.ts';
import { currentEdition } from '../catalog/queries.ts';
import { catalogWriter } from './catalog-writer.ts';
import { historyWriter } from './history-writer.ts';
import type { EditionOrder, RecordWrite } from './record-write.ts';
import { trimPointWriter } from './trim-point-writer.ts';

/**
 * Publishes the writes as the next edition: records, history, search index, names, sources and outbox in one immediate transaction,
 * or inside the one that is open already.
 * @throws ApiProblem wrong-state where there is nothing to write
 */
export function publishEdition(db: Db, order: EditionOrder, writes: Iterable<RecordWrite>): { edition: number; records: number } {
  if (db.$client.inTransaction) return writeEdition(db, order, writes);
  return db.transaction(() => writeEdition(db, order, writes), { behavior: 'immediate' });
}

function writeEdition(db: Db, { actor, why, action, subject }: EditionOrder, writes: Iterable<RecordWrite>) {
  const { $client: sqlite } = db;
  const edition = currentEdition(db) + 1;
  const at = new Date().toISOString();
  sqlite.prepare('INSERT INTO editions (edition, published_at, actor, why, records) VALUES (?, ?, ?, ?, 0)').run(edition, at, actor, why);
  const history = historyWriter(sqlite, { edition, at, actor, why });
  const writers = new Map<Table, (write: RecordWrite) => void>();
  const writerOf = (kind: Table) => {
    let writer = writers.get(kind);
    if (!writer) {
      writer = kind === 'trim-points' ? trimPointWriter(sqlite, edition, history) : catalogWriter(sqlite, kind, edition, history);
      writers.set(kind, writer);
    }
    return writer;
  };
  let records = 0;
  for (const write of writes) {
    writerOf(write.kind)(write);
    records++;
  }
  if (records === 0) throw new ApiProblem('wrong-state', 'Nothing is new or changed: there is nothing to publish.');
  sqlite.prepare('UPDATE editions SET records = ? WHERE edition = ?').run(records, edition);
  history.finish(records);
  audit(db, actor, action, subject, { edition, records });
  return { edition, records };
}
