// Which words of the catalog a word of the question may mean. Slips are looked for in the vocabulary,
// never in the rows: a few thousand words stand for all records.
import { SymSpell } from 'mnemonist';
import type { Db } from '../../db/connect.ts';

export interface Reading {
  word: string;
  /** Optimal string alignment distance: insertions, deletions, substitutions, neighbours swapped. */
  distance: number;
}

export interface Vocabulary {
  /** Catalog words within two slips of a whole word, or whose beginning is within one slip of it; best first. */
  readings(word: string): Reading[];
  has(word: string): boolean;
  /** Whether any word of the catalog begins with it. */
  begins(word: string): boolean;
}

/** Beginnings shorter than this are within a slip of too much to be of use. */
const shortestBeginning = 4;

export function loadVocabulary(db: Db): Vocabulary {
  const rows = db.$client.prepare('SELECT term FROM search_vocabulary').all() as { term: string }[];
  const whole = new SymSpell({ maxDistance: 2, verbosity: 2 });
  const beginnings = new SymSpell({ maxDistance: 1, verbosity: 2 });
  const wordsByBeginning = new Map<string, string[]>();
  for (const { term } of rows) {
    // Digits are read as they stand: 14 and 16 are two boats, not a slip. Words of the question are of letters or of digits,
    // so that joined names like `kido12`, of which a large catalog has a hundred thousand, are nobody's slip either.
    if (/\p{N}/u.test(term)) continue;
    whole.add(term);
    for (let length = shortestBeginning; length < term.length; length++) {
      const beginning = term.slice(0, length);
      const words = wordsByBeginning.get(beginning);
      if (words) words.push(term);
      else {
        wordsByBeginning.set(beginning, [term]);
        beginnings.add(beginning);
      }
    }
  }
  const sorted = rows.map(({ term }) => term).sort();
  const every = new Set(sorted);
  return {
    has: (word) => every.has(word),
    begins(word) {
      let low = 0;
      let high = sorted.length;
      while (low < high) {
        const middle = (low + high) >> 1;
        if (sorted[middle]! < word) low = middle + 1;
        else high = middle;
      }
      return sorted[low]?.startsWith(word) ?? false;
    },
    readings(word) {
      if (word.length < 3 || /^\p{N}+$/u.test(word)) return [];
      const found = new Map<string, number>();
      const note = (reading: string, distance: number) => found.set(reading, Math.min(distance, found.get(reading) ?? 9));
      const allowed = word.length >= 6 ? 2 : 1;
      for (const { term, distance } of whole.search(word)) if (distance <= allowed) note(term, distance);
      if (word.length >= shortestBeginning) {
        for (const { term, distance } of beginnings.search(word))
          for (const full of wordsByBeginning.get(term) ?? []) note(full, distance + 0.5);
      }
      return [...found]
        .map(([reading, distance]) => ({ word: reading, distance }))
        .sort((a, b) => a.distance - b.distance || a.word.localeCompare(b.word))
        .slice(0, 24);
    },
  };
}
