import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { FieldChange } from '@tiltwright/shared/schemas/import.ts';
import type { RecordStatus } from '../../db/schema/catalog.ts';
import type { RowWrite } from '../../db/schema/imports.ts';
import type { AuditAction } from '../audit.ts';

/** What one edition does to one record. Only the fields in `values` are touched; null blanks a field. */
export interface RecordWrite extends RowWrite {
  kind: Table;
  /** Null makes a new record. */
  recordId: string | null;
  /** As the history shows it. */
  changes: FieldChange[];
  /** `published` where left out, which also brings a withdrawn record back. */
  status?: RecordStatus;
  /** The record that stands in its place; only with the status `superseded`. */
  supersededBy?: string | null;
}

export interface EditionOrder {
  actor: string;
  why: string | null;
  /** What the audit log says was done, and to what. */
  action: AuditAction;
  subject: string | null;
}
