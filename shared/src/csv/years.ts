// Model years: 2015, 2015-18, 2015–2018, 2019+, up to 2018.
import { type CellError, quoted, refused } from './cell.ts';

export interface Years {
  /** Null where the range is open below. */
  from: number | null;
  /** Null where the range is open above: still made. */
  to: number | null;
}

export type YearsResult = { ok: true; value: Years } | CellError;

const dash = '\\s*(?:[-\\u2010-\\u2015\\u2212]|to|through|thru|until)\\s*';
const one = /^(?:my\s?)?(\d{4})(?:\.0+)?$/i;
const full = new RegExp(`^(?:my\\s?)?(\\d{4})${dash}(\\d{4})$`, 'i');
const short = new RegExp(`^(\\d{4})${dash}'?(\\d{2})$`, 'i');
const open =
  /^(?:(?:since|from)\s+)?(\d{4})\s*(?:\+|[-\u2010-\u2015\u2212]|(?:[-\u2010-\u2015\u2212]\s*|to\s+)?(?:present|today|now|current|on|onwards?))$/i;
const since = /^(?:since|from)\s+(\d{4})$/i;
const upTo = /^(?:(?:up\s+to|until|to)\s+|[-\u2010-\u2015\u2212]\s*)(\d{4})$/i;
const twoDigits = new RegExp(`^'?(\\d{2})(?:${dash}'?(\\d{2}))?$`);

const longestYears = 40;

/**
 * Reads model years. A single year is its own first and last.
 * Two figures after the dash are a year of the same century when they are later than the first year's; else they could be a month.
 */
export function readYears(text: string): YearsResult {
  const t = text.trim().replace(/\u2019/g, "'");
  if (t.length > longestYears) return refused('bad-years', `${quoted(t)} does not read as model years such as 2015, 2015-18 or 2019+.`);
  const single = one.exec(t);
  if (single) return inRange(Number(single[1]), Number(single[1]), t);
  const pair = full.exec(t);
  if (pair) return inRange(Number(pair[1]), Number(pair[2]), t);
  const brief = short.exec(t);
  if (brief) return readBrief(Number(brief[1]), Number(brief[2]), t);
  const from = open.exec(t) ?? since.exec(t);
  if (from) return inRange(Number(from[1]), null, t);
  const to = upTo.exec(t);
  if (to) return inRange(null, Number(to[1]), t);
  const old = twoDigits.exec(t);
  if (old) return refused('bad-years', `${quoted(t)} does not say the century.`, [century(old[1]) + (old[2] ? `-${century(old[2])}` : '')]);
  const years = t.match(/\b(?:19|20)\d{2}\b/g);
  return refused('bad-years', `${quoted(t)} does not read as model years such as 2015, 2015-18 or 2019+.`, years ?? undefined);
}

function century(twoFigures: string | undefined): string {
  // Model years to come stay few: 60 and later can only be the last century in this trade.
  return `${Number(twoFigures) >= 60 ? '19' : '20'}${twoFigures}`;
}

function readBrief(from: number, twoFigures: number, text: string): YearsResult {
  const sameCentury = Math.floor(from / 100) * 100 + twoFigures;
  if (sameCentury > from) return inRange(from, sameCentury, text);
  const couldMean = sameCentury === from ? [String(from)] : [`${from}-${sameCentury + 100}`, `${from}`];
  return refused('bad-years', `${quoted(text)} could mean years or a month; write both years in full.`, couldMean);
}

function inRange(from: number | null, to: number | null, text: string): YearsResult {
  for (const year of [from, to]) {
    if (year !== null && (year < 1900 || year > 2100)) return refused('out-of-range', `${year} is not a year from 1900 to 2100.`);
  }
  if (from !== null && to !== null && from > to) {
    return refused('years-order', `${quoted(text)} ends before it begins.`, [`${to}-${from}`]);
  }
  return { ok: true, value: { from, to } };
}
