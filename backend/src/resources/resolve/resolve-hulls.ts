// Stock lists to catalog ids: each name's nearest hulls with a score, and the one that needs no person to look.
import { nameWords } from '@tiltwright/shared/names.ts';
import type { Candidate, NameToResolve, ResolvedName, ResolveOrder } from '@tiltwright/shared/schemas/resolve.ts';
import type { Db } from '../../db/connect.ts';
import { findRecord } from '../catalog/queries.ts';
import type { CatalogSearch } from '../search/search-catalog.ts';
import { type NamedRecord, scoreCandidate } from './score-candidate.ts';

/** Taken without asking from this score on … */
const goodScore = 0.8;
/** … and this far ahead of the next. */
const clearLead = 0.08;
/** Records looked at more closely than the search did. */
const looked = 12;
/** Names between two turns of the event loop: some milliseconds of work. */
const namesATurn = 10;

export async function resolveHulls(db: Db, search: CatalogSearch, { names, candidates }: ResolveOrder): Promise<ResolvedName[]> {
  const resolved: ResolvedName[] = [];
  for (const [index, given] of names.entries()) {
    if (index > 0 && index % namesATurn === 0) await new Promise((resolve) => setImmediate(resolve));
    resolved.push(resolveName(db, search, typeof given === 'string' ? { name: given } : given, candidates));
  }
  return resolved;
}

function resolveName(db: Db, search: CatalogSearch, { ref, name, maker, year }: NameToResolve, most: number): ResolvedName {
  const text = maker === undefined || nameWords(name).join(' ').includes(nameWords(maker).join(' ')) ? name : `${maker} ${name}`;
  const { words, year: yearInName } = splitYear(nameWords(text));
  const wantedYear = year ?? yearInName;
  const found: Candidate[] = [];
  for (const { id, corrected } of search.find(words.join(' '), 'hulls', looked)) {
    const row = findRecord(db, 'hulls', id);
    if (row?.status !== 'published') continue;
    const record: NamedRecord = { ...row, aliases: (row.aliases as string[] | null) ?? [] };
    const { score, why } = scoreCandidate(record, { words, year: wantedYear, corrected, knows: search.knows });
    found.push({ id, maker: row.maker, model: row.model, package: row.package, yearFrom: row.yearFrom, yearTo: row.yearTo, score, why });
  }
  found.sort((a, b) => b.score - a.score);
  const [first, second] = found;
  const sure = first !== undefined && first.score >= goodScore && (second === undefined || first.score - second.score >= clearLead);
  return {
    ...(ref !== undefined && { ref }),
    name,
    best: sure ? first.id : null,
    candidates: found.slice(0, most),
  };
}

/** A lone four-digit number of our time is the model year, the last one where there are several. */
function splitYear(words: readonly string[]): { words: string[]; year: number | null } {
  const isYear = (word: string) => /^(19[5-9]\d|20[0-4]\d)$/.test(word);
  const at = words.findLastIndex(isYear);
  if (at < 0 || words.length === 1) return { words: [...words], year: null };
  return { words: words.filter((_, index) => index !== at), year: Number(words[at]) };
}
