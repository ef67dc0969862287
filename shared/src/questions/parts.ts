// The parts of a question once every id has been looked up: plain records in trade units, in the shape of an inline part.
// A catalog sheet (record plus `values`) can be passed as it is; fields the engine does not know are left alone.
import type { Basis } from '../schemas/catalog-record.ts';
import type { InlineHull } from '../schemas/hull.ts';
import type { InlineLowerUnit } from '../schemas/lower-unit.ts';
import type { InlineMount } from '../schemas/mount.ts';
import type { InlineTransducer } from '../schemas/transducer.ts';

/** Where one value of a part comes from; `sigma` in the unit of the field, null where nobody stated one. */
export interface PartValue {
  basis: Basis;
  sigma?: number | null;
}

/** `values` by field name; a field without an entry was given by the caller and counts as published. */
interface Sourced {
  values?: Readonly<Record<string, PartValue>>;
}

/** `trimPoints` are the hull's measured running angles, raw, in any order. */
export type HullPart = InlineHull & Sourced;
export type LowerUnitPart = InlineLowerUnit & Sourced;
export type TransducerPart = InlineTransducer & Sourced;
export type MountPart = InlineMount & Sourced;

/** What a fit needs; `lowerUnits[i]` is the part of the question's `lowerUnits[i]`. */
export interface ResolvedParts {
  hull: HullPart;
  lowerUnits: readonly LowerUnitPart[];
  transducer: TransducerPart;
  mount?: MountPart | undefined;
}

/** What a tilt needs. */
export interface TiltParts {
  hull: HullPart;
  mount?: MountPart | undefined;
  lowerUnit?: LowerUnitPart | undefined;
}

/** What a clearance needs. */
export interface ClearanceParts {
  hull: HullPart;
  lowerUnit?: LowerUnitPart | undefined;
  transducer: TransducerPart;
  mount?: MountPart | undefined;
}

/** What the caller knows and the engine does not: the number of the catalog edition the parts were read from. */
export interface AnswerContext {
  edition: number;
}
