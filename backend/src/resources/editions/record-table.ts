// One kind of catalog record as SQLite holds it, read and written by position: the way for many thousand records at once.
import { columnOfField } from '@tiltwright/shared/csv/columns.ts';
import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import { getTableName } from 'drizzle-orm';
import * as z from 'zod';
import type { RecordStatus } from '../../db/schema/catalog.ts';
import { type Provenance, unpackProvenance } from '../../db/schema/provenance.ts';
import { kinds } from '../catalog/kinds.ts';

/** A stored record as plain fields; blank fields are left out. Its provenance is shared between records: never change it. */
export interface StoredRecord {
  id: string;
  revision: number;
  status: RecordStatus;
  values: Record<string, unknown>;
  provenance: Provenance;
}

export interface RecordTable {
  name: string;
  fields: readonly string[];
  /** Columns of the fields, in their order. */
  columns: readonly string[];
  /** What `read` expects of a raw row. */
  selected: string;
  read(row: readonly unknown[]): StoredRecord;
}

const tables = new Map<CatalogTable, RecordTable>();

export function recordTable(kind: CatalogTable): RecordTable {
  const known = tables.get(kind);
  if (known) return known;
  const made = makeTable(kind);
  tables.set(kind, made);
  return made;
}

const envelope = ['id', 'revision', 'status', 'provenance'];

function makeTable(kind: CatalogTable): RecordTable {
  const { table, fields: shape } = kinds[kind];
  const fields = Object.keys(shape);
  const columns = fields.map(columnOfField);
  const isList = Object.values(shape).map((schema) => (schema instanceof z.ZodOptional ? schema.unwrap() : schema) instanceof z.ZodArray);
  return {
    name: getTableName(table),
    fields,
    columns,
    selected: [...envelope, ...columns].join(', '),
    read(row) {
      const values: Record<string, unknown> = {};
      for (let at = 0; at < fields.length; at++) {
        const cell = row[at + envelope.length];
        if (cell !== null) values[fields[at]!] = isList[at] ? JSON.parse(cell as string) : cell;
      }
      return {
        id: row[0] as string,
        revision: row[1] as number,
        status: row[2] as RecordStatus,
        values,
        provenance: parseProvenance(row[3] as string),
      };
    },
  };
}

/** Most records of one source say the same of all their fields: reading it once spares two thirds of a check's look-ups. */
const mostRemembered = 4000;
const remembered = new Map<string, Provenance>();

function parseProvenance(text: string): Provenance {
  let found = remembered.get(text);
  if (found === undefined) {
    found = unpackProvenance(text);
    if (remembered.size >= mostRemembered) remembered.clear();
    remembered.set(text, found);
  }
  return found;
}

/** A field's value as its column takes it. */
export const toCell = (value: unknown): unknown => (value === undefined ? null : Array.isArray(value) ? JSON.stringify(value) : value);
