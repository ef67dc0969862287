// How well a catalog record answers to a shop's name, and why.
import { nameWords, normaliseName } from '@tiltwright/shared/names.ts';

export interface NamedRecord {
  maker: string;
  model: string;
  package: string | null;
  aliases: readonly string[];
  yearFrom: number | null;
  yearTo: number | null;
}

interface Wanted {
  words: readonly string[];
  year: number | null;
  /** Words of the question that the search read as another spelling. */
  corrected: readonly string[];
  /** Whether the catalog has the word at all: a colour or a trailer says little about which hull it is. */
  knows: (word: string) => boolean;
}

interface Scored {
  score: number;
  why: string[];
}

const slipWorth = 0.8;
const beginningWorth = 0.85;
/** A number is the model more than any word is. */
const numberWeight = 2;
/** A word no record has is noise rather than another hull's name. */
const noiseWeight = 0.15;
const wrongYear = 0.5;
/** Words of the record's model that the name leaves out cost less than words of the name that the record lacks. */
const leftOutShare = 0.25;

export function scoreCandidate(record: NamedRecord, { words, year, corrected, knows }: Wanted): Scored {
  const why: string[] = [];
  const makerWords = spellings([record.maker]);
  const modelWords = spellings([record.model, record.package, ...record.aliases]);
  const own = new Set([...makerWords, ...modelWords]);
  const joined = normaliseName([record.maker, record.model, record.package].filter(Boolean).join(''));

  let found = 0;
  let all = 0;
  const missing: string[] = [];
  for (const word of words) {
    const isNumber = /^\p{N}+$/u.test(word);
    // A lone letter stands in nearly every name; as a piece of one it says nothing.
    const isPiece = word.length > 3 && joined.includes(word);
    const weight = isNumber ? numberWeight : own.has(word) || isPiece || (word.length > 1 && knows(word)) ? 1 : noiseWeight;
    all += weight;
    if (own.has(word)) found += weight;
    else if (corrected.includes(word)) {
      found += weight * slipWorth;
      why.push(`“${word}” is read as another spelling`);
    } else if (word.length > 2 && !/^\p{N}/u.test(word) && [...own].some((mine) => mine.startsWith(word))) found += weight * beginningWorth;
    else if (isPiece) found += weight;
    else missing.push(word);
  }
  let score = all === 0 ? 0 : found / all;
  if (missing.length > 0) why.push(`not of this hull: ${missing.join(', ')}`);
  else why.push('every word agrees');

  const said = words.join('');
  const unsaid = nameWords(record.model).filter((word) => !words.includes(word) && !said.includes(word) && !isCorrected(word, corrected));
  if (unsaid.length > 0) {
    score *= 1 - (leftOutShare * unsaid.length) / nameWords(record.model).length;
    why.push(`the model is also called ${unsaid.join(' ')}`);
  }
  if (year !== null) {
    const fits = (record.yearFrom === null || record.yearFrom <= year) && (record.yearTo === null || year <= record.yearTo);
    why.push(fits ? `built in ${year}` : `not built in ${year}`);
    if (!fits) score *= wrongYear;
  }
  return { score: Math.round(Math.max(0, Math.min(1, score)) * 1000) / 1000, why };
}

function spellings(names: readonly (string | null)[]): string[] {
  return names.flatMap((name) => {
    if (!name) return [];
    const pieces = name.split(/\s+/).map(normaliseName).filter(Boolean);
    return [...nameWords(name), ...pieces, ...pieces.slice(1).map((piece, index) => pieces[index]! + piece)];
  });
}

/** A misspelt word stands for one of about its length. */
const isCorrected = (word: string, corrected: readonly string[]) =>
  corrected.some((slip) => Math.abs(slip.length - word.length) <= 2 && slip[0] === word[0]);
