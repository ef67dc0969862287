// Writes catalog records by positional, prepared statements; only touched columns are set, so that untouched indexes rest.
import { columnOfField } from '@tiltwright/shared/csv/columns.ts';
import { matchKey, normaliseName } from '@tiltwright/shared/names.ts';
import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import type Database from 'better-sqlite3';
import { type Provenance, packProvenance } from '../../db/schema/provenance.ts';
import { newId } from '../../ids.ts';
import { kinds } from '../catalog/kinds.ts';
import { indexWords } from '../search/index-words.ts';
import type { HistoryWriter } from './history-writer.ts';
import { recordTable, type StoredRecord, toCell } from './record-table.ts';
import type { RecordWrite } from './record-write.ts';

interface Names {
  maker: string;
  model: string;
  package?: string;
  aliases?: string[];
}

const nameFields = ['maker', 'model', 'package', 'aliases'];

export function catalogWriter(sqlite: Database.Database, kind: CatalogTable, edition: number, history: HistoryWriter) {
  const table = recordTable(kind);
  const select = sqlite.prepare(`SELECT ${table.selected} FROM ${table.name} WHERE id = ?`).raw();
  const newColumns = ['id', 'match_key', 'generic', 'status', 'superseded_by', 'revision', 'edition', 'provenance', ...table.columns];
  const insert = sqlite.prepare(`INSERT INTO ${table.name} (${newColumns.join(', ')}) VALUES (${newColumns.map(() => '?').join(', ')})`);
  const updates = new Map<string, Database.Statement>();
  const index = nameIndexer(sqlite, kind);

  return (write: RecordWrite): void => {
    const before = write.recordId === null ? undefined : readOrThrow(write.recordId);
    const id = before?.id ?? newId(kinds[kind].prefix);
    const revision = (before?.revision ?? 0) + 1;
    const status = write.status ?? 'published';
    const provenance = provenanceAfter(before, write);
    const values = { ...before?.values, ...write.values } as Record<string, unknown> & Names;
    history.sources(write);
    if (before) update(id, before, write, values, provenance, revision, status);
    else {
      const cells = table.fields.map((field) => toCell(write.values[field]));
      insert.run(
        id,
        keyOf(values),
        generic(provenance),
        status,
        write.supersededBy ?? null,
        revision,
        edition,
        packProvenance(provenance),
        ...cells,
      );
    }
    if (status !== 'published') index.remove(id);
    else if (before?.status !== 'published' || nameFields.some((field) => field in write.values)) {
      history.maker(values.maker);
      index.put(id, values);
    }
    history.revision(write, id, revision, before && { values: before.values, origins: before.provenance });
    if (kind !== 'hulls') return;
    if (status === 'superseded' && write.supersededBy) history.hullSuperseded(id, write.supersededBy);
    else history.hullChanged(id);
  };

  function readOrThrow(id: string): StoredRecord {
    const row = select.get(id) as unknown[] | undefined;
    if (!row) throw new Error(`the record ${id} is gone`);
    return table.read(row);
  }

  function update(
    id: string,
    before: StoredRecord,
    write: RecordWrite,
    values: Names,
    provenance: Provenance,
    revision: number,
    status: string,
  ) {
    const touched = Object.keys(write.values);
    const renamed = touched.some((field) => field === 'maker' || field === 'model' || field === 'package');
    const moved = status !== before.status || write.supersededBy !== undefined;
    const form = `${touched.join(',')};${renamed};${moved}`;
    let statement = updates.get(form);
    if (!statement) {
      const columns = ['revision', 'edition', 'provenance', 'generic', ...touched.map(columnOfField)];
      if (renamed) columns.push('match_key');
      if (moved) columns.push('status', 'superseded_by');
      statement = sqlite.prepare(`UPDATE ${table.name} SET ${columns.map((column) => `${column} = ?`).join(', ')} WHERE id = ?`);
      updates.set(form, statement);
    }
    const cells: unknown[] = [revision, edition, packProvenance(provenance), generic(provenance)];
    for (const field of touched) cells.push(toCell(write.values[field]));
    if (renamed) cells.push(keyOf(values));
    if (moved) cells.push(status, write.supersededBy ?? null);
    statement.run(...cells, id);
  }
}

const keyOf = (names: Names) => matchKey(names.maker, names.model, names.package);

function provenanceAfter(before: StoredRecord | undefined, { values, origin, origins }: RecordWrite): Provenance {
  const provenance: Provenance = { ...before?.provenance };
  for (const field in values) {
    if (values[field] === null || values[field] === undefined) delete provenance[field];
    else provenance[field] = origins?.[field] ?? origin;
  }
  return provenance;
}

/** A part every value of which is a class default stands for a whole class. */
function generic(provenance: Provenance): 0 | 1 {
  for (const field in provenance) if (provenance[field]!.basis !== 'class') return 0;
  return 1;
}

/** Other spellings and the words a record is found by. */
function nameIndexer(sqlite: Database.Database, kind: CatalogTable) {
  const dropAliases = sqlite.prepare('DELETE FROM aliases WHERE kind = ? AND record_id = ?');
  const addAlias = sqlite.prepare('INSERT INTO aliases (kind, record_id, alias, normalised) VALUES (?, ?, ?, ?) ON CONFLICT DO NOTHING');
  const dropEntry = sqlite.prepare('DELETE FROM search_entries WHERE record_id = ?');
  const putEntry = sqlite.prepare(
    'INSERT INTO search_entries (kind, record_id, words) VALUES (?, ?, ?) ON CONFLICT (record_id) DO UPDATE SET words = excluded.words WHERE words <> excluded.words',
  );
  return {
    put(id: string, { maker, model, package: pack, aliases = [] }: Names) {
      dropAliases.run(kind, id);
      // A blanked list of aliases arrives as null.
      for (const alias of aliases ?? []) addAlias.run(kind, id, alias, normaliseName(alias));
      putEntry.run(kind, id, indexWords([maker, model, pack, ...(aliases ?? [])]));
    },
    remove(id: string) {
      dropAliases.run(kind, id);
      dropEntry.run(id);
    },
  };
}
