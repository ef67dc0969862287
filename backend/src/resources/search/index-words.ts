// What a record can be found by.
import { nameWords, normaliseName } from '@tiltwright/shared/names.ts';

/** Words of maker, model, package and aliases, and each name's words joined: `Rush Cutter` is also found as `rushcutter`. */
export function indexWords(names: readonly (string | null | undefined)[]): string {
  const words = new Set<string>();
  for (const name of names) {
    if (!name) continue;
    for (const word of nameWords(name)) words.add(word);
    for (const piece of name.split(/\s+/)) if (normaliseName(piece)) words.add(normaliseName(piece));
    const pieces = name.split(/\s+/).map(normaliseName).filter(Boolean);
    pieces.slice(1).forEach((piece, index) => {
      words.add(pieces[index]! + piece);
    });
  }
  return [...words].join(' ');
}
