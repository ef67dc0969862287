// Catalog tables. Nothing published is ever deleted: a record is superseded or withdrawn.
import type { Basis, CatalogTable, Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import { hullFields } from '@tiltwright/shared/schemas/hull.ts';
import type { FieldChange } from '@tiltwright/shared/schemas/import.ts';
import { lowerUnitFields } from '@tiltwright/shared/schemas/lower-unit.ts';
import { mountFields } from '@tiltwright/shared/schemas/mount.ts';
import { transducerFields } from '@tiltwright/shared/schemas/transducer.ts';
import { trimPointFields } from '@tiltwright/shared/schemas/trim-point.ts';
import { sql } from 'drizzle-orm';
import { check, index, integer, primaryKey, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core';
import { checksOf, columnsOf } from './catalog-columns.ts';
import { type Provenance, provenanceColumn } from './provenance.ts';

export type { Provenance } from './provenance.ts';
export type RecordStatus = 'published' | 'superseded' | 'withdrawn';

export const makers = sqliteTable('makers', {
  name: text('name').primaryKey(),
  normalised: text('normalised').notNull(),
});

const envelope = () => ({
  id: text('id').primaryKey(),
  /** Normalised maker + model + package: with the years, what a CSV row is matched by. */
  matchKey: text('match_key').notNull(),
  generic: integer('generic', { mode: 'boolean' }).notNull().default(false),
  status: text('status').$type<RecordStatus>().notNull().default('published'),
  supersededBy: text('superseded_by'),
  revision: integer('revision').notNull().default(1),
  edition: integer('edition')
    .notNull()
    .references(() => editions.edition),
  provenance: provenanceColumn('provenance').notNull(),
});

const envelopeRules = (name: string) => [
  check(`${name}_status`, sql.raw("status IN ('published', 'superseded', 'withdrawn')")),
  check(`${name}_generic`, sql.raw('generic IN (0, 1)')),
  check(`${name}_revision`, sql.raw('revision >= 1')),
  check(`${name}_provenance`, sql.raw('json_valid(provenance)')),
  check(`${name}_years`, sql.raw('year_from IS NULL OR year_to IS NULL OR year_from <= year_to')),
];

export const hulls = sqliteTable('hulls', { ...envelope(), ...columnsOf(hullFields) }, (table) => [
  index('hulls_match_key').on(table.matchKey),
  index('hulls_form').on(table.form),
  ...envelopeRules('hulls'),
  ...checksOf('hulls', hullFields),
  check('hulls_beam_below_length', sql.raw('beam_m IS NULL OR beam_m < length_m')),
  check('hulls_chine_within_beam', sql.raw('chine_beam_m IS NULL OR beam_m IS NULL OR chine_beam_m <= beam_m')),
]);

export const lowerUnits = sqliteTable('lower_units', { ...envelope(), ...columnsOf(lowerUnitFields) }, (table) => [
  index('lower_units_match_key').on(table.matchKey),
  ...envelopeRules('lower_units'),
  ...checksOf('lower_units', lowerUnitFields),
]);

export const transducers = sqliteTable('transducers', { ...envelope(), ...columnsOf(transducerFields) }, (table) => [
  index('transducers_match_key').on(table.matchKey),
  ...envelopeRules('transducers'),
  ...checksOf('transducers', transducerFields),
]);

export const mounts = sqliteTable('mounts', { ...envelope(), ...columnsOf(mountFields) }, (table) => [
  index('mounts_match_key').on(table.matchKey),
  ...envelopeRules('mounts'),
  ...checksOf('mounts', mountFields),
]);

const { hullMaker, hullModel, hullPackage, hullYear, ...measurement } = trimPointFields;
export const trimPoints = sqliteTable(
  'trim_points',
  {
    id: text('id').primaryKey(),
    hullId: text('hull_id')
      .notNull()
      .references(() => hulls.id),
    /** Speed, condition and source: with the hull, what a CSV row is matched by. */
    matchKey: text('match_key').notNull(),
    status: text('status').$type<RecordStatus>().notNull().default('published'),
    revision: integer('revision').notNull().default(1),
    edition: integer('edition')
      .notNull()
      .references(() => editions.edition),
    ...columnsOf(measurement),
    basis: text('basis').$type<Basis>().notNull(),
    source: text('source'),
    sourceDate: text('source_date'),
  },
  (table) => [
    uniqueIndex('trim_points_match').on(table.hullId, table.matchKey),
    check('trim_points_status', sql.raw("status IN ('published', 'superseded', 'withdrawn')")),
    check('trim_points_basis', sql.raw("basis IN ('measured', 'published', 'estimated', 'class')")),
    ...checksOf('trim_points', measurement),
  ],
);

/** Other spellings; text of a record's `aliases` field, kept here to be matched and found by. */
export const aliases = sqliteTable(
  'aliases',
  {
    kind: text('kind').$type<CatalogTable>().notNull(),
    recordId: text('record_id').notNull(),
    alias: text('alias').notNull(),
    normalised: text('normalised').notNull(),
  },
  (table) => [primaryKey({ columns: [table.kind, table.recordId, table.normalised] }), index('aliases_normalised').on(table.normalised)],
);

export const sources = sqliteTable('sources', {
  name: text('name').primaryKey(),
  firstEdition: integer('first_edition')
    .notNull()
    .references(() => editions.edition),
});

export const editions = sqliteTable('editions', {
  edition: integer('edition').primaryKey(),
  publishedAt: text('published_at').notNull(),
  actor: text('actor').notNull(),
  why: text('why'),
  records: integer('records').notNull(),
});

/** One row a published change of one record. */
export const revisions = sqliteTable(
  'revisions',
  {
    kind: text('kind').$type<Table>().notNull(),
    recordId: text('record_id').notNull(),
    revision: integer('revision').notNull(),
    edition: integer('edition')
      .notNull()
      .references(() => editions.edition),
    at: text('at').notNull(),
    actor: text('actor').notNull(),
    why: text('why'),
    source: text('source'),
    changes: text('changes', { mode: 'json' }).$type<FieldChange[]>().notNull(),
    /** The touched fields as they were (null: first published here) and as they are now; null for a blank one. */
    before: text('before', { mode: 'json' }).$type<Record<string, unknown>>(),
    after: text('after', { mode: 'json' }).$type<Record<string, unknown>>().notNull(),
    /** Where the touched fields came from before, and come from now. */
    origins: text('origins', { mode: 'json' }).$type<{
      before: Record<string, Provenance[string]>;
      after: Record<string, Provenance[string]>;
    }>(),
  },
  (table) => [
    primaryKey({ columns: [table.recordId, table.revision] }),
    index('revisions_edition').on(table.edition, table.recordId, table.revision),
  ],
);

/** Text of the full-text index `search_index`, one row a record that can be found. */
export const searchEntries = sqliteTable(
  'search_entries',
  {
    entry: integer('entry').primaryKey(),
    kind: text('kind').$type<CatalogTable>().notNull(),
    recordId: text('record_id').notNull(),
    words: text('words').notNull(),
  },
  (table) => [uniqueIndex('search_entries_record').on(table.recordId)],
);
