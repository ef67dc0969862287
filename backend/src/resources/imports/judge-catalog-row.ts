// The fate of a row about a hull, lower unit, transducer or mount.
import type { RowReading } from '@tiltwright/shared/csv/read-row.ts';
import { hardRules } from '@tiltwright/shared/csv/row-rules.ts';
import { matchKey } from '@tiltwright/shared/names.ts';
import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { RowResolution } from '@tiltwright/shared/schemas/import.ts';
import type { Db } from '../../db/connect.ts';
import type { StoredRecord } from '../editions/record-table.ts';
import { anyYears, failed, incomingOf, type Judge, type Judgement, seenRows, settle, yearWords } from './judge-row.ts';
import { mergeValues } from './merge-values.ts';
import { storedRecords, yearsOf } from './stored.ts';

/** A record found by its name keeps its own spelling of it; only an id says that the name itself is to change. */
const nameFields = ['maker', 'model', 'package'];
const nothing: string[] = [];

export function catalogJudge(db: Db, kind: CatalogTable, readAgain: (n: number) => RowReading): Judge {
  const stored = storedRecords(db, kind);
  const seen = seenRows(readAgain);
  return { judge, noteDone };

  function judge(n: number, reading: RowReading, resolution: RowResolution | null): Judgement {
    const { maker = '', model = '', package: pack } = reading.values as { maker?: string; model?: string; package?: string };
    const years = yearsOf(reading.values);
    const name = [maker, model, pack, yearWords(years)].filter(Boolean).join(' ') || `row ${n}`;
    if (reading.errors.length > 0) return failed(name, reading);

    const found = reading.id ? byId(reading.id) : stored.matching(maker, model, pack, years);
    if (reading.id && found.length === 0)
      return failed(name, reading, {
        column: 'id',
        value: reading.id,
        code: 'unknown-id',
        message: `There is no published record ${reading.id}; leave the cell blank for a new one.`,
      });
    if (found.length > 1)
      return failed(name, reading, {
        column: 'year_from',
        value: yearWords(years),
        code: 'ambiguous-years',
        message: `Several records of this name overlap these years: ${found.map((record) => yearWords(yearsOf(record.values)) || 'all years').join(', ')}.`,
      });

    const record = found[0];
    const key = record?.id ?? matchKey(maker, model, pack);
    return (
      seen.repeated(n, key, record ? anyYears : years, name, reading, 'model') ?? settleRecord(kind, name, reading, record, key, resolution)
    );
  }

  function byId(id: string): StoredRecord[] {
    const record = stored.byId(id);
    return record?.status === 'published' ? [record] : [];
  }

  function noteDone(n: number, key: string, reading: RowReading): void {
    // Keys of unknown names have bars between their parts; ids of records have none.
    seen.note(n, key, key.includes('|') ? yearsOf(reading.values) : anyYears);
  }
}

function settleRecord(
  kind: CatalogTable,
  name: string,
  reading: RowReading,
  record: StoredRecord | undefined,
  key: string,
  resolution: RowResolution | null,
): Judgement {
  const merge = mergeValues(record, incomingOf(reading), record && !reading.id ? nameFields : nothing, resolution);
  if (record && merge.changes.length > 0) {
    const breaches = hardRules(kind, { ...record.values, ...merge.write.values });
    if (breaches.length > 0) {
      const problems = breaches.map((breach) => ({ ...breach, message: `With the stored values: ${breach.message}`, value: '' }));
      return { ...failed(name, reading, ...problems), rowKey: key };
    }
  }
  return settle(name, reading, record?.id ?? null, key, merge, record === undefined);
}
