// Answers that only an edition or the engine can change: their ETag is known before any work, and the last few thousand are kept.
import { createHash } from 'node:crypto';
import { engineVersion } from '@tiltwright/shared/engine/version.ts';
import { LRUCache } from 'mnemonist';
import type { Db } from '../db/connect.ts';

export interface KeptAnswer {
  etag: string;
  body: string;
}

export interface AnswerCache {
  edition(): number;
  /** Entity tag of the answer to an address at the present edition. */
  tagOf(url: string): string;
  find(url: string): KeptAnswer | undefined;
  keep(url: string, edition: number, answer: KeptAnswer): void;
}

const mostAnswers = 4000;
/** Longer answers are rare and dear to keep: at most this many characters each, some 130 MB in all at the very worst. */
const longestAnswer = 16_384;

export function answerCache(db: Db): AnswerCache {
  const newest = db.$client.prepare('SELECT coalesce(max(edition), 0) FROM editions').pluck();
  const kept = new LRUCache<string, KeptAnswer>(mostAnswers);
  let keptEdition = -1;
  const edition = () => newest.get() as number;
  const sync = () => {
    const now = edition();
    if (now !== keptEdition) {
      kept.clear();
      keptEdition = now;
    }
  };
  return {
    edition,
    tagOf: (url) => `${edition()}.${engineVersion}.${createHash('sha256').update(url).digest('base64url').slice(0, 22)}`,
    find(url) {
      sync();
      return kept.get(url);
    },
    keep(url, atEdition, answer) {
      // An edition published while the answer was made is no edition the answer can be kept under.
      if (atEdition === keptEdition && answer.body.length <= longestAnswer) kept.set(url, answer);
    },
  };
}
