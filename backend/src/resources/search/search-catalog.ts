// Finds records by a few words with slips. Postings come from SQLite's FTS5, ranking from the words themselves.

import { nameWords } from '@tiltwright/shared/names.ts';
import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { Db } from '../../db/connect.ts';
import { currentEdition } from '../catalog/queries.ts';
import { loadVocabulary, type Vocabulary } from './vocabulary.ts';

export interface Finding {
  kind: CatalogTable;
  id: string;
  /** Words of the question that were read as another spelling. */
  corrected: string[];
}

export interface CatalogSearch {
  /** Best first, at most `limit`. */
  find(question: string, kind: CatalogTable | undefined, limit: number): Finding[];
  /** Whether any record has this very word. */
  knows(word: string): boolean;
}

interface Entry {
  kind: CatalogTable;
  recordId: string;
  words: string;
}

/** Candidates that are looked at closely; more would only differ in how badly they match. */
const mostCandidates = 300;
const mostWords = 8;
/** Words of a question that are looked at; a stock list's line may be long. */
const mostTyped = 24;

export function catalogSearch(db: Db): CatalogSearch {
  let vocabulary: Vocabulary | undefined;
  let vocabularyEdition = -1;
  const query = (kinds: string) =>
    db.$client.prepare(
      `SELECT e.kind AS kind, e.record_id AS recordId, e.words AS words FROM search_index i JOIN search_entries e ON e.entry = i.rowid WHERE search_index MATCH ? ${kinds} ORDER BY i.rowid LIMIT ${mostCandidates}`,
    );
  const anyKind = query('');
  const oneKind = query('AND e.kind = ?');

  const present = (): Vocabulary => {
    const edition = currentEdition(db);
    if (!vocabulary || vocabularyEdition !== edition) {
      vocabulary = loadVocabulary(db);
      vocabularyEdition = edition;
    }
    return vocabulary;
  };

  return {
    knows(word) {
      return present().has(word);
    },
    find(question, kind, limit) {
      const known = present();
      // A word that no record has in any spelling (a colour, a trailer) must not hide those that have the others.
      const isKnown = (word: string, index: number, all: string[]) =>
        known.begins(word) ||
        known.readings(word).length > 0 ||
        [all[index - 1], all[index + 1]].some((near, side) => near !== undefined && known.begins(side === 0 ? near + word : word + near));
      const words = nameWords(question).slice(0, mostTyped).filter(isKnown).slice(0, mostWords);
      if (words.length === 0) return [];
      const run = (match: string) => (kind ? oneKind.all(match, kind) : anyKind.all(match)) as Entry[];
      const candidates = new Map<string, Entry>();
      for (const spelling of spellings(words)) {
        const match = spelling.map((word) => alternatives(word, known)).join(' AND ');
        for (const entry of run(match)) candidates.set(entry.recordId, entry);
      }
      // Nothing has all the words: one may be wrong altogether.
      if (candidates.size === 0 && words.length > 1) {
        for (const left of words) {
          const match = words
            .filter((word) => word !== left)
            .map((word) => alternatives(word, known))
            .join(' AND ');
          if (match) for (const entry of run(match)) candidates.set(entry.recordId, entry);
        }
      }
      return rank([...candidates.values()], words, known).slice(0, limit);
    },
  };
}

/** The words as typed, and with each two neighbours joined: `rush cutter` is `rushcutter` to some makers. */
function spellings(words: string[]): string[][] {
  const joined = words.slice(1).map((_, index) => [...words.slice(0, index), words[index]! + words[index + 1]!, ...words.slice(index + 2)]);
  return [words, ...joined];
}

const quoted = (word: string) => `"${word}"`;

function alternatives(word: string, vocabulary: Vocabulary): string {
  const readings = vocabulary.readings(word).map((reading) => quoted(reading.word));
  return `(${[`${quoted(word)} *`, ...readings].join(' OR ')})`;
}

function rank(entries: Entry[], words: string[], vocabulary: Vocabulary): Finding[] {
  const readings = new Map(
    words.map((word) => [word, new Map(vocabulary.readings(word).map((reading) => [reading.word, reading.distance]))]),
  );
  const scored = entries.map((entry) => {
    const own = entry.words.split(' ');
    const corrected: string[] = [];
    let score = 0;
    for (const word of words) {
      const match = bestMatch(word, own, readings.get(word)!);
      score += match.score;
      if (match.corrected) corrected.push(word);
    }
    // Of equal matches the shorter name is the nearer one.
    return { entry, corrected, score: score - own.length / 100 };
  });
  scored.sort(
    (a, b) => b.score - a.score || a.entry.words.localeCompare(b.entry.words) || a.entry.recordId.localeCompare(b.entry.recordId),
  );
  return scored.map(({ entry, corrected }) => ({ kind: entry.kind, id: entry.recordId, corrected }));
}

function bestMatch(word: string, own: string[], readings: Map<string, number>): { score: number; corrected: boolean } {
  if (own.includes(word)) return { score: 4, corrected: false };
  if (own.some((candidate) => candidate.startsWith(word))) return { score: 3, corrected: false };
  const distance = Math.min(...own.map((candidate) => readings.get(candidate) ?? Number.POSITIVE_INFINITY));
  return Number.isFinite(distance) ? { score: 2.5 - distance, corrected: true } : { score: 0, corrected: false };
}
