// Where each filled field of a record comes from. Most fields of a record share one origin: it is written once, and the
// fields point to it, which makes a record of 20 fields a third as long.
import type { Basis } from '@tiltwright/shared/schemas/catalog-record.ts';
import { customType } from 'drizzle-orm/sqlite-core';

/** Sigma is one standard deviation in the field's own unit. */
export interface Origin {
  basis: Basis;
  sigma: number | null;
  source: string | null;
  sourceDate: string | null;
}

/** By field. */
export type Provenance = Record<string, Origin>;

type Entry = [basis: Basis, sigma: number | null, source: string | null, sourceDate: string | null];
interface Packed {
  origins: Entry[];
  /** Place of a field's origin in the list. */
  of: Record<string, number>;
}

export function packProvenance(provenance: Provenance): string {
  const origins: Entry[] = [];
  const places = new Map<string, number>();
  const of: Record<string, number> = {};
  let [last, lastPlace]: [Origin | undefined, number] = [undefined, 0];
  for (const field in provenance) {
    const origin = provenance[field]!;
    // Fields of one row share the very object.
    if (origin !== last) {
      const entry: Entry = [origin.basis, origin.sigma, origin.source, origin.sourceDate];
      const key = JSON.stringify(entry);
      let place = places.get(key);
      if (place === undefined) {
        place = origins.push(entry) - 1;
        places.set(key, place);
      }
      [last, lastPlace] = [origin, place];
    }
    of[field] = lastPlace;
  }
  return JSON.stringify({ origins, of } satisfies Packed);
}

/** Also reads what was written out in full by earlier versions. */
export function unpackProvenance(text: string): Provenance {
  const kept = JSON.parse(text) as Packed | Provenance;
  if (!Array.isArray(kept.origins)) return kept as Provenance;
  const { origins, of } = kept as Packed;
  const shared = origins.map(([basis, sigma, source, sourceDate]): Origin => ({ basis, sigma, source, sourceDate }));
  const provenance: Provenance = {};
  for (const field in of) provenance[field] = shared[of[field]!]!;
  return provenance;
}

export const provenanceColumn = customType<{ data: Provenance; driverData: string }>({
  dataType: () => 'text',
  toDriver: packProvenance,
  fromDriver: unpackProvenance,
});
