import type { TrimBasis } from '@tiltwright/shared/schemas/answer.ts';
import type { Basis } from '@tiltwright/shared/schemas/catalog-record.ts';

export type AnyBasis = Basis | TrimBasis;

const words: Record<AnyBasis, string> = {
  yours: 'your own measurement',
  measured: 'measured',
  published: 'published',
  blended: 'measured near this speed, worked out between',
  estimated: 'worked out, not measured',
  class: 'usual for this class',
};

/** Where a value comes from, in words that can stand behind it. */
export function basisWords(basis: AnyBasis): string {
  return words[basis];
}
