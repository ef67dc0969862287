// A part with nothing missing: every number the engine needs, stated or assumed, with its spread. Trade units throughout.

import type { ClassDefault } from '../class-defaults.ts';
import type { Assumption } from '../schemas/answer.ts';
import type { Basis } from '../schemas/catalog-record.ts';
import type { PartValue } from './parts.ts';

export interface Quantity {
  value: number;
  /** One standard deviation in the unit of the value. */
  sigma: number;
  basis: Basis;
}

export type Filled<Name extends string> = Record<Name, Quantity>;

/** A record as it was given, seen as named numbers. */
interface GivenPart {
  values?: Readonly<Record<string, PartValue>>;
  sigmas?: Readonly<Record<string, number>> | undefined;
}

/** Spread of a stated value where nobody stated one, by basis: a share of a length or mass, or degrees (our judgement). */
const shareByBasis: Record<Basis, number> = { measured: 0.01, published: 0.02, estimated: 0.08, class: 0.15 };
const degreesByBasis: Record<Basis, number> = { measured: 0.5, published: 1, estimated: 2, class: 3 };

function spreadOf(field: string, value: number, basis: Basis): number {
  return field.endsWith('Deg') ? degreesByBasis[basis] : Math.abs(value) * shareByBasis[basis];
}

/** Reads one part's numbers in turn and notes what had to be assumed. */
export function partReader(part: object, prefix: string, assumptions: Assumption[]) {
  const given = part as GivenPart & Record<string, unknown>;
  return function read(field: string, fallback: ClassDefault, why: string): Quantity {
    const value = given[field];
    if (typeof value !== 'number') {
      assumptions.push({ field: `${prefix}.${field}`, value: fallback.value, sigma: fallback.sigma, why });
      return { ...fallback, basis: 'class' };
    }
    const source = given.values?.[field];
    const basis = source?.basis ?? 'published';
    const sigma = source?.sigma ?? given.sigmas?.[field] ?? spreadOf(field, value, basis);
    if (basis === 'class') assumptions.push({ field: `${prefix}.${field}`, value, sigma, why: 'Class value of a generic part.' });
    return { value, sigma, basis };
  };
}
