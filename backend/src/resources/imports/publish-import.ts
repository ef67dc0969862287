// Accepted rows become one edition: all of them or none, in one transaction.
import { matchKey, normaliseName } from '@tiltwright/shared/names.ts';
import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { PublishOrder } from '@tiltwright/shared/schemas/import.ts';
import { eq } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { aliases, editions, makers, type Provenance, revisions, searchEntries, sources, trimPoints } from '../../db/schema/catalog.ts';
import { ApiProblem } from '../../errors.ts';
import { newId } from '../../ids.ts';
import { audit } from '../audit.ts';
import { type CatalogRow, kinds } from '../catalog/kinds.ts';
import { currentEdition } from '../catalog/queries.ts';
import { indexWords } from '../search/index-words.ts';
import { type ImportRowRecord, importOrProblem, rowsToPublish, setImport } from './queries.ts';
import { findTrimPointById, isCatalogTable, toStored } from './stored.ts';

type Tx = Parameters<Parameters<Db['transaction']>[0]>[0];

interface Publication {
  tx: Tx;
  edition: number;
  at: string;
  actor: string;
  why: string | null;
}

/** @throws ApiProblem wrong-state, or stale-edition when the catalog moved on since the check */
export function publishImport(db: Db, id: string, order: PublishOrder, actor: string): { edition: number } {
  return db.transaction(
    (tx) => {
      const record = importOrProblem(db, id);
      if (record.status !== 'checked') throw new ApiProblem('wrong-state', `An import that is ${record.status} cannot be published.`);
      const newest = currentEdition(db);
      if (record.checkedAgainst !== newest)
        throw new ApiProblem('stale-edition', `Edition ${newest} was published since this import was checked; check it again.`);
      const rows = rowsToPublish(tx, id).filter((row) => !order.holdCautions || row.cautions.length === 0);
      if (rows.length === 0) throw new ApiProblem('wrong-state', 'No row of this import is new or changed: there is nothing to publish.');

      const publication: Publication = { tx, edition: newest + 1, at: new Date().toISOString(), actor, why: order.why ?? null };
      tx.insert(editions)
        .values({ edition: publication.edition, publishedAt: publication.at, actor, why: publication.why, records: rows.length })
        .run();
      for (const row of rows) {
        if (isCatalogTable(record.table)) publishRecord(publication, record.table, row);
        else publishTrimPoint(publication, row);
      }
      setImport(tx, id, { status: 'published', edition: publication.edition });
      audit(tx, actor, 'edition.publish', id, { edition: publication.edition, records: rows.length });
      return { edition: publication.edition };
    },
    { behavior: 'immediate' },
  );
}

function publishRecord(publication: Publication, kind: CatalogTable, row: ImportRowRecord): void {
  const { tx, edition } = publication;
  const { table, prefix, fields } = kinds[kind];
  const write = row.write!;
  const found = row.recordId === null ? undefined : (tx.select().from(table).where(eq(table.id, row.recordId)).get() as CatalogRow);
  const before = found && toStored(kind, found);
  const id = before?.id ?? newId(prefix);
  const revision = (before?.revision ?? 0) + 1;
  const values = { ...before?.values, ...write.values } as Record<string, unknown> & {
    maker: string;
    model: string;
    package?: string;
    aliases?: string[];
  };
  const provenance: Provenance = { ...before?.provenance, ...write.provenance };
  for (const field of Object.keys(provenance)) if (values[field] === null || values[field] === undefined) delete provenance[field];
  const cells = Object.fromEntries(Object.keys(fields).map((field) => [field, values[field] ?? null]));

  rememberNames(publication, values.maker, provenance);
  const stored = {
    ...cells,
    id,
    matchKey: matchKey(values.maker, values.model, values.package),
    generic: isGeneric(provenance),
    revision,
    edition,
    provenance,
  };
  if (before) tx.update(table).set(stored).where(eq(table.id, id)).run();
  else
    tx.insert(table)
      .values(stored as never)
      .run();
  indexRecord(tx, kind, id, values);
  addRevision(publication, kind, id, revision, row, before?.values ?? null, values);
}

/** A part every value of which is a class default, its name aside, stands for a whole class. */
const isGeneric = (provenance: Provenance) => Object.values(provenance).every(({ basis }) => basis === 'class');

function rememberNames({ tx, edition }: Publication, maker: string, provenance: Provenance): void {
  tx.insert(makers)
    .values({ name: maker, normalised: normaliseName(maker) })
    .onConflictDoNothing()
    .run();
  for (const source of new Set(Object.values(provenance).map((origin) => origin.source))) {
    if (source !== null) tx.insert(sources).values({ name: source, firstEdition: edition }).onConflictDoNothing().run();
  }
}

function indexRecord(
  tx: Tx,
  kind: CatalogTable,
  id: string,
  values: { maker: string; model: string; package?: string; aliases?: string[] },
): void {
  const other = values.aliases ?? [];
  tx.delete(aliases).where(eq(aliases.recordId, id)).run();
  for (const alias of other)
    tx.insert(aliases)
      .values({ kind, recordId: id, alias, normalised: normaliseName(alias) })
      .onConflictDoNothing()
      .run();
  const words = indexWords([values.maker, values.model, values.package, ...other]);
  tx.insert(searchEntries)
    .values({ kind, recordId: id, words })
    .onConflictDoUpdate({ target: searchEntries.recordId, set: { words } })
    .run();
}

function publishTrimPoint(publication: Publication, row: ImportRowRecord): void {
  const { tx, edition } = publication;
  const write = row.write!;
  const before = row.recordId === null ? undefined : findTrimPointById(tx, row.recordId);
  const origin = Object.values(write.provenance)[0];
  const id = before?.id ?? newId('trp');
  const revision = (before?.revision ?? 0) + 1;
  const values = {
    ...write.values,
    ...(origin && { basis: origin.basis, source: origin.source, sourceDate: origin.sourceDate }),
    revision,
    edition,
  };
  if (before) tx.update(trimPoints).set(values).where(eq(trimPoints.id, id)).run();
  else
    tx.insert(trimPoints)
      .values({ id, ...values } as typeof trimPoints.$inferInsert)
      .run();
  if (origin?.source) tx.insert(sources).values({ name: origin.source, firstEdition: edition }).onConflictDoNothing().run();
  addRevision(publication, 'trim-points', id, revision, row, before ?? null, { ...before, ...values, id });
}

function addRevision(
  { tx, edition, at, actor, why }: Publication,
  kind: CatalogTable | 'trim-points',
  recordId: string,
  revision: number,
  row: ImportRowRecord,
  before: Record<string, unknown> | null,
  after: Record<string, unknown>,
): void {
  const source = Object.values(row.write!.provenance)[0]?.source ?? null;
  tx.insert(revisions).values({ kind, recordId, revision, edition, at, actor, why, source, changes: row.changes, before, after }).run();
}
