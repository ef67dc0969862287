import { guardFormula } from '@tiltwright/shared/csv/words.ts';
import { writeRow } from '@tiltwright/shared/csv/write-table.ts';
import type { Db } from '../../db/connect.ts';
import { type ImportRecord, listRows } from './queries.ts';

/** Wrong and conflicting rows under the file's own header, in its order, with a column of reasons; mended, it can be uploaded as it is. */
export function errorsCsv(db: Db, { id, header }: ImportRecord): string {
  const columns = header ?? [];
  const rows = (['error', 'conflict'] as const).flatMap((fate) => listRows(db, id, fate, 250_000, 0)).sort((a, b) => a.n - b.n);
  const lines = rows.map(({ cells, errors }) =>
    writeRow([
      ...columns.map((_, index) => guardFormula(cells[index] ?? '')),
      errors.map(({ column, message }) => `${column}: ${message}`).join(' '),
    ]),
  );
  return [writeRow([...columns, 'reason']), ...lines].join('');
}
