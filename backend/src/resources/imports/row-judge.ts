import type { RowReading } from '@tiltwright/shared/csv/read-row.ts';
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { Db } from '../../db/connect.ts';
import { catalogJudge } from './judge-catalog-row.ts';
import type { Judge } from './judge-row.ts';
import { trimPointJudge } from './judge-trim-point-row.ts';
import { isCatalogTable } from './stored.ts';

/** The judge of a table's rows. @param readAgain reads an earlier row of the same file */
export const rowJudge = (db: Db, table: Table, readAgain: (n: number) => RowReading): Judge =>
  isCatalogTable(table) ? catalogJudge(db, table, readAgain) : trimPointJudge(db, readAgain);
