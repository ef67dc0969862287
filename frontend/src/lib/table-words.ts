import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';

/** What each table holds, as a sentence names it. */
export const tableWords: Record<Table, string> = {
  hulls: 'hulls',
  'lower-units': 'lower units',
  transducers: 'transducers',
  mounts: 'mounts',
  'trim-points': 'measured trim',
};
export const allTables = Object.keys(tableWords) as Table[];
