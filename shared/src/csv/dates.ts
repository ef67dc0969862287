// Dates of a source, kept as precisely as they are stated: 2024, 2024-05, 2024-05-17 (ISO 8601).
import { type CellError, type CellFilled, filled, quoted, refused } from './cell.ts';

const months = 'january february march april may june july august september october november december'.split(' ');

/** 1 to 12 for a month's English name or its first three or more letters; 0 for another word. */
function monthOf(word: string): number {
  return months.findIndex((name) => name.startsWith(word.toLowerCase())) + 1;
}

function date(year: number, month: number | undefined, day: number | undefined, text: string): CellFilled<string> | CellError {
  const exists =
    year >= 1900 &&
    year <= 2100 &&
    (month === undefined || (month >= 1 && month <= 12)) &&
    (day === undefined || (day >= 1 && day <= new Date(Date.UTC(year, month as number, 0)).getUTCDate()));
  if (!exists) return refused('bad-date', `${quoted(text)} is not a date that exists between 1900 and 2100.`);
  return filled([String(year), ...[month, day].filter((n) => n !== undefined).map((n) => String(n).padStart(2, '0'))].join('-'));
}

/** Reads a date. Day and month in figures with strokes are read only where they can't be swapped; with points the day stands first. */
export function readDate(tidied: string): CellFilled<string> | CellError {
  const iso = /^(\d{4})(?:-(\d{1,2})(?:-(\d{1,2}))?)?$/.exec(tidied);
  if (iso) return date(Number(iso[1]), iso[2] ? Number(iso[2]) : undefined, iso[3] ? Number(iso[3]) : undefined, tidied);
  const stamp = /^(\d{4})-(\d{2})-(\d{2})[T ]\d{2}:\d{2}/.exec(tidied);
  if (stamp) return date(Number(stamp[1]), Number(stamp[2]), Number(stamp[3]), tidied);
  const points = /^(\d{1,2})\.\s?(\d{1,2})\.\s?(\d{4})$/.exec(tidied);
  if (points) return date(Number(points[3]), Number(points[2]), Number(points[1]), tidied);
  const strokes = /^(\d{1,2})[/-](\d{1,2})[/-](\d{4})$/.exec(tidied);
  if (strokes) return readStrokes(Number(strokes[1]), Number(strokes[2]), Number(strokes[3]), tidied);
  const named = /^(?:(\d{1,2})\.?\s+)?([a-z]{3,9})\.?\s+(\d{4})$/i.exec(tidied);
  if (named && monthOf(named[2] as string)) {
    return date(Number(named[3]), monthOf(named[2] as string), named[1] ? Number(named[1]) : undefined, tidied);
  }
  return refused('bad-date', `${quoted(tidied)} does not read as a date such as 2024-05-17, 2024-05 or 2024.`);
}

function readStrokes(a: number, b: number, year: number, text: string): CellFilled<string> | CellError {
  if (a > 12 || a === b) return date(year, b, a, text);
  if (b > 12) return date(year, a, b, text);
  const [dayFirst, monthFirst] = [date(year, b, a, text), date(year, a, b, text)];
  const couldMean = [dayFirst, monthFirst].flatMap((d) => (d.ok ? [d.value] : []));
  return refused('ambiguous-date', `${quoted(text)} could mean ${couldMean.join(' or ')}.`, couldMean);
}
