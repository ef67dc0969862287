import { createHash } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { matchHeader } from '@tiltwright/shared/csv/headers.ts';
import type { Config } from '../../config.ts';
import type { ImportOrder, Inspection } from '../../jobs/import-jobs.ts';
import { surveyTable } from './read-table.ts';

/**
 * Reads a whole uploaded file once, to say what it is.
 * @throws ApiProblem binary-file, wrong-encoding, no-header, bad-table
 */
export async function inspectFile(
  { uploadsFolder }: Pick<Config, 'uploadsFolder'>,
  { storedAs, table, choices }: Extract<ImportOrder, { kind: 'inspect' }>,
): Promise<Inspection> {
  const bytes = await readFile(path.join(uploadsFolder, storedAs));
  const { header, headerRow, rows, encoding, delimiter, decimalComma } = surveyTable(bytes, { table, ...choices });
  const { unknown, columns, yearsAt } = matchHeader(table, header);
  const known = columns.filter((column) => column !== undefined).length + (yearsAt === undefined ? 0 : 1);
  return {
    bytes: bytes.length,
    sha256: createHash('sha256').update(bytes).digest('hex'),
    ...{ encoding, delimiter, rows: rows.length, header, headerRow },
    decimalComma: decimalComma ?? null,
    // Two canonical names are what makes a header be taken for one as it stands.
    needsMapping: known < 2,
    unknownColumns: unknown.map((column) => column.header),
  };
}
