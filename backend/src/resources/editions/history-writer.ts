// What an edition leaves behind beside the records: revisions, names of sources and makers, and word to the outside.
import { normaliseName } from '@tiltwright/shared/names.ts';
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type Database from 'better-sqlite3';
import type { Origin } from '../../db/schema/imports.ts';
import type { OutboxTopic } from '../../db/schema/outbox.ts';
import type { RecordWrite } from './record-write.ts';

export interface Publication {
  edition: number;
  at: string;
  actor: string;
  why: string | null;
}

/** Origins of the touched fields; `*` speaks for all that are not named. */
export const everyField = '*';

export interface Before {
  values: Readonly<Record<string, unknown>>;
  origins: Readonly<Record<string, Origin>>;
}

export interface HistoryWriter {
  /** `before` is undefined for a record that did not exist. */
  revision(write: RecordWrite, id: string, revision: number, before: Before | undefined): void;
  maker(name: string): void;
  sources(write: RecordWrite): void;
  /** A hull is spoken of once an edition, however many of its points changed. */
  hullChanged(id: string): void;
  hullSuperseded(id: string, supersededBy: string): void;
  finish(records: number): void;
}

export function historyWriter(sqlite: Database.Database, { edition, at, actor, why }: Publication): HistoryWriter {
  const insertRevision = sqlite.prepare(
    'INSERT INTO revisions (kind, record_id, revision, edition, at, actor, why, source, changes, "before", "after", origins) VALUES (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?)',
  );
  const insertMaker = sqlite.prepare('INSERT INTO makers (name, normalised) VALUES (?, ?) ON CONFLICT DO NOTHING');
  const insertSource = sqlite.prepare('INSERT INTO sources (name, first_edition) VALUES (?, ?) ON CONFLICT DO NOTHING');
  const insertOutbox = sqlite.prepare('INSERT INTO outbox (edition, topic, payload, created_at) VALUES (?, ?, ?, ?)');
  const makers = new Set<string>();
  const sources = new Set<string>();
  const hulls = new Set<string>();
  const tell = (topic: OutboxTopic, payload: Record<string, unknown>) => insertOutbox.run(edition, topic, JSON.stringify(payload), at);
  const rememberSource = (source: string | null) => {
    if (source === null || sources.has(source)) return;
    sources.add(source);
    insertSource.run(source, edition);
  };

  return {
    revision({ kind, values, origin, origins, changes }: RecordWrite, id, revision, before) {
      const was = before && Object.fromEntries(Object.keys(values).map((field) => [field, before.values[field] ?? null]));
      const came = {
        before: before ? Object.fromEntries(Object.keys(values).flatMap((f) => (before.origins[f] ? [[f, before.origins[f]]] : []))) : {},
        after: { [everyField]: origin, ...origins },
      };
      insertRevision.run(
        ...[kind satisfies Table, id, revision, edition, at, actor, why, origin.source, JSON.stringify(changes)],
        ...[was ? JSON.stringify(was) : null, JSON.stringify(values), JSON.stringify(came)],
      );
    },
    maker(name) {
      if (makers.has(name)) return;
      makers.add(name);
      insertMaker.run(name, normaliseName(name));
    },
    sources({ origin, origins }) {
      rememberSource(origin.source);
      for (const field in origins) rememberSource(origins[field]!.source);
    },
    hullChanged(id) {
      if (hulls.has(id)) return;
      hulls.add(id);
      tell('hull.changed', { hull: id, edition });
    },
    hullSuperseded: (id, supersededBy) => void tell('hull.superseded', { hull: id, supersededBy, edition }),
    finish: (records) => void tell('edition.published', { edition, records, why }),
  };
}
