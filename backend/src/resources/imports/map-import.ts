// The mapping step: what a file's header suggests, what somebody decided, and how the first rows then read.
import { open } from 'node:fs/promises';
import path from 'node:path';
import { fieldOfColumn, findColumn } from '@tiltwright/shared/csv/columns.ts';
import type { Mapping, MappingSheet } from '@tiltwright/shared/schemas/mapping.ts';
import { and, eq } from 'drizzle-orm';
import type { Config } from '../../config.ts';
import type { Db } from '../../db/connect.ts';
import { mappings } from '../../db/schema/import-work.ts';
import { ApiProblem } from '../../errors.ts';
import { newId } from '../../ids.ts';
import { audit } from '../audit.ts';
import { choicesOf } from './check-import.ts';
import { filledColumns, fingerprint, mappingFaults, missingColumns, relocate, suggestMapping } from './map-columns.ts';
import { type ImportRecord, importOrProblem, setImport } from './queries.ts';
import { mappedReader } from './read-mapped.ts';
import { readHead, readTop } from './read-table.ts';

interface MapDeps {
  db: Db;
  config: Pick<Config, 'uploadsFolder'>;
}

const previewRows = 20;
const topRows = 12;
const firstBytes = 262_144;

/** The import's mapping: saved, remembered from an earlier file of the same header, or suggested by the header's words. */
export async function showMapping(deps: MapDeps, id: string, headerRow?: number): Promise<MappingSheet> {
  const record = importOrProblem(deps.db, id);
  const bytes = await firstOf(deps, record);
  const row = headerRow ?? record.mapping?.headerRow ?? record.headerRow;
  const table = readHead(bytes, { table: record.table, headerRow: row, ...choicesOf(record) }, previewRows);
  if (record.mapping && row === record.mapping.headerRow) return sheet(record, bytes, record.mapping, 'saved');
  const remembered = rememberedMapping(deps.db, record, table.header, row);
  if (remembered) return sheet(record, bytes, remembered, 'remembered');
  return sheet(record, bytes, suggestMapping(record.table, table.header, row, table.unitRow), 'suggested');
}

const mappable = ['uploaded', 'mapped', 'checked', 'failed'];

/**
 * Saves a mapping; the rows are judged by the next check. An incomplete one is kept too, and says what it lacks.
 * @throws ApiProblem wrong-state, no-header, invalid-input
 */
export async function saveMapping(deps: MapDeps, id: string, mapping: Mapping, actor: string): Promise<MappingSheet> {
  const { db } = deps;
  const record = importOrProblem(db, id);
  if (!mappable.includes(record.status)) throw new ApiProblem('wrong-state', `An import that is ${record.status} cannot be mapped.`);
  const bytes = await firstOf(deps, record);
  const { header } = readHead(bytes, { table: record.table, headerRow: mapping.headerRow, ...choicesOf(record) }, previewRows);
  const faults = mappingFaults(record.table, header, mapping);
  if (faults.length > 0) throw new ApiProblem('invalid-input', faults[0]!.message, faults);
  const missing = missingColumns(record.table, mapping);
  const filled = filledColumns(mapping);
  const leftOut = header.filter(
    (text, at) => text !== '' && !mapping.columns.some((column) => column.at === at && (column.to || column.split)),
  );
  db.transaction(
    (tx) => {
      if (!mappable.includes(importOrProblem(db, id).status))
        throw new ApiProblem('wrong-state', 'The import is being checked or published.');
      setImport(tx, id, {
        ...{ mapping, header, headerRow: mapping.headerRow, unknownColumns: leftOut, needsMapping: missing.length > 0 },
        ...{ status: missing.length > 0 ? 'uploaded' : 'mapped', counts: null, checkedRows: 0, problem: null },
      });
      if (missing.length === 0 && filled.length > 0) remember(tx, record, header, mapping, actor);
      audit(tx, actor, 'import.map', id, { columns: filled });
    },
    { behavior: 'immediate' },
  );
  return sheet(importOrProblem(db, id), bytes, mapping, 'saved');
}

function remember(db: Pick<Db, 'insert'>, record: ImportRecord, header: string[], mapping: Mapping, actor: string): void {
  const kept = { mapping: { ...mapping, header }, savedAt: new Date().toISOString(), savedBy: actor };
  db.insert(mappings)
    .values({ id: newId('map'), table: record.table, fingerprint: fingerprint(header), ...kept })
    .onConflictDoUpdate({ target: [mappings.table, mappings.fingerprint], set: kept })
    .run();
}

function rememberedMapping(db: Db, record: ImportRecord, header: readonly string[], headerRow: number): Mapping | undefined {
  const found = db
    .select({ mapping: mappings.mapping })
    .from(mappings)
    .where(and(eq(mappings.table, record.table), eq(mappings.fingerprint, fingerprint(header))))
    .get();
  if (!found) return undefined;
  const { header: its, ...mapping } = found.mapping;
  return relocate(mapping, its, header, headerRow);
}

async function firstOf({ config }: MapDeps, { storedAs }: ImportRecord): Promise<Uint8Array> {
  const file = await open(path.join(config.uploadsFolder, storedAs)).catch(() => {
    throw new ApiProblem('wrong-state', 'The uploaded file is no longer kept; upload it again.');
  });
  try {
    const { bytesRead, buffer } = await file.read(Buffer.alloc(firstBytes + 1), 0, firstBytes + 1, 0);
    return buffer.subarray(0, bytesRead);
  } finally {
    await file.close();
  }
}

function sheet(record: ImportRecord, bytes: Uint8Array, mapping: Mapping, origin: MappingSheet['origin']): MappingSheet {
  const choices = choicesOf(record);
  const table = readHead(bytes, { table: record.table, headerRow: mapping.headerRow, ...choices }, previewRows);
  const reader = mappedReader(record.table, table.header, mapping, { decimalComma: table.decimalComma, fixes: record.fixes });
  const shown = [...reader.columns, ...Object.keys(mapping.constants)];
  const used = new Set(mapping.columns.filter(({ to, split }) => to || split).map(({ at }) => at));
  return {
    top: readTop(bytes, choices, topRows),
    header: table.header,
    mapping,
    origin,
    missing: missingColumns(record.table, mapping),
    leftOut: table.header.filter((text, at) => text !== '' && !used.has(at)),
    preview: table.rows.slice(0, previewRows).map(({ n, cells }) => {
      const reading = reader.read(cells);
      const problems = new Map(reading.errors.map(({ column, message }) => [column, message] as const));
      return {
        n,
        cells: shown.map((column) => ({
          column,
          text: reader.textOf(cells, column) ?? '',
          value: readValue(record, reading, column),
          problem: problems.get(column) ?? null,
        })),
        problems: reading.errors.filter(({ column }) => !shown.includes(column)).map(({ message }) => message),
      };
    }),
  };
}

type Reading = ReturnType<ReturnType<typeof mappedReader>['read']>;

function readValue({ table }: ImportRecord, reading: Reading, name: string): unknown {
  const column = findColumn(table, name);
  const values = reading.values as Record<string, unknown>;
  if (!column)
    return values.yearFrom === undefined && values.yearTo === undefined ? null : [values.yearFrom ?? null, values.yearTo ?? null];
  const { field, role } = column;
  if (role === 'sigma') return reading.sigmas[field] ?? null;
  if (role === 'method') return reading.methods[field] ?? null;
  if (role === 'row') return reading[fieldOfColumn(name) as 'id' | 'method' | 'source' | 'sourceDate'] ?? null;
  return values[field] ?? null;
}
