// The fate of a row about a hull's running angle at one speed.
import type { RowReading } from '@tiltwright/shared/csv/read-row.ts';
import { normaliseName } from '@tiltwright/shared/names.ts';
import type { RowResolution } from '@tiltwright/shared/schemas/import.ts';
import type { Db } from '../../db/connect.ts';
import { trimPointFields } from '../editions/trim-point-writer.ts';
import { anyYears, failed, incomingOf, type Judge, type Judgement, seenRows, settle, yearWords } from './judge-row.ts';
import { mergeValues } from './merge-values.ts';
import { findTrimPoint, findTrimPointById, storedRecords, yearsOf } from './stored.ts';

/** Hull + speed + condition + source. */
export const trimPointKey = (speedKn: number, condition: string | undefined, source: string | null) =>
  [speedKn, normaliseName(condition ?? ''), normaliseName(source ?? '')].join('|');

const hullNames = ['hullMaker', 'hullModel', 'hullPackage', 'hullYear'];

interface PointValues {
  hullMaker?: string;
  hullModel?: string;
  hullPackage?: string;
  hullYear?: number;
  speedKn?: number;
  condition?: string;
}

export function trimPointJudge(db: Db, readAgain: (n: number) => RowReading): Judge {
  const hulls = storedRecords(db, 'hulls');
  const seen = seenRows(readAgain);
  return { judge, noteDone: (n, key) => seen.note(n, key, anyYears) };

  function judge(n: number, reading: RowReading, resolution: RowResolution | null): Judgement {
    const values = reading.values as PointValues;
    const name = nameOf(values) || `row ${n}`;
    if (reading.errors.length > 0) return failed(name, reading);

    const year = { from: values.hullYear ?? null, to: values.hullYear ?? null };
    const found = hulls.matching(values.hullMaker ?? '', values.hullModel ?? '', values.hullPackage, year);
    if (found.length === 0)
      return failed(name, reading, {
        column: 'hull_model',
        value: values.hullModel ?? '',
        code: 'unknown-hull',
        message: 'No published hull has this maker, model, package and year.',
      });
    if (found.length > 1)
      return failed(name, reading, {
        column: 'hull_year',
        value: String(values.hullYear ?? ''),
        code: 'ambiguous-hull',
        message: `Several hulls have this name; state hull_year: ${found.map((hull) => yearWords(yearsOf(hull.values)) || 'all years').join(', ')}.`,
      });

    const hullId = found[0]!.id;
    const key = trimPointKey(values.speedKn!, values.condition, reading.source ?? null);
    const point = reading.id ? findTrimPointById(db, reading.id) : findTrimPoint(db, hullId, key);
    if (reading.id && !point)
      return failed(name, reading, {
        column: 'id',
        value: reading.id,
        code: 'unknown-id',
        message: `There is no trim point ${reading.id}; leave the cell blank for a new one.`,
      });
    const rowKey = `${hullId} ${key}`;
    return seen.repeated(n, rowKey, anyYears, name, reading, 'speed_kn') ?? settlePoint(name, reading, point, hullId, key, resolution);
  }
}

type Point = ReturnType<typeof findTrimPoint>;

function settlePoint(
  name: string,
  reading: RowReading,
  point: Point,
  hullId: string,
  key: string,
  resolution: RowResolution | null,
): Judgement {
  // A withdrawn point comes back as if it were new, under its old id.
  const stands = point?.status === 'published' ? point : undefined;
  const stored = stands && { values: statedCells(stands), provenance: provenanceOf(stands) };
  const merge = mergeValues(stored, incomingOf(reading), hullNames, resolution);
  Object.assign(merge.write.values, { hullId, matchKey: key });
  return settle(name, reading, point?.id ?? null, `${hullId} ${key}`, merge, stands === undefined);
}

const nameOf = ({ hullMaker, hullModel, hullPackage, hullYear, speedKn }: PointValues) =>
  [hullMaker, hullModel, hullPackage, hullYear, speedKn === undefined ? '' : `${speedKn} kn`].filter(Boolean).join(' ');

const statedCells = (point: NonNullable<Point>) =>
  Object.fromEntries(trimPointFields.flatMap((field) => (point[field] === null ? [] : [[field, point[field]]])));
const provenanceOf = (point: NonNullable<Point>) =>
  Object.fromEntries(
    trimPointFields.map((field) => [field, { basis: point.basis, sigma: null, source: point.source, sourceDate: point.sourceDate }]),
  );
