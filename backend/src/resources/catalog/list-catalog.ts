import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { Deps } from '../../deps.ts';
import { decodeCursor, page } from '../../http/cursor.ts';
import { toRecord } from './kinds.ts';
import { currentEdition, type ListFilter, listRecords, pickRecords } from './queries.ts';

/** Findings of one question are few; the filter then works on these. */
const mostFindings = 300;

export interface ListQuestion extends ListFilter {
  q?: string | undefined;
  limit: number;
  cursor?: string | undefined;
}

/** A page of one kind, by filter alone or by words with slips, best first. */
export function listCatalog({ db, search }: Deps, kind: CatalogTable, { q, limit, cursor, ...filter }: ListQuestion) {
  const place = decodeCursor(cursor, currentEdition(db));
  if (q === undefined) {
    const { data, next } = page(listRecords(db, kind, filter, limit, place.after), limit, place);
    return { data: data.map((row) => toRecord(kind, row)), next };
  }
  const ids = search.find(q, kind, mostFindings).map((finding) => finding.id);
  const rows = pickRecords(db, kind, ids, filter).slice(place.after, place.after + limit + 1);
  const { data, next } = page(rows, limit, place);
  return { data: data.map((row) => toRecord(kind, row)), next };
}
