import type { HullSheet } from '@tiltwright/shared/schemas/hull.ts';
import { useMemo } from 'react';
import { metaOfField } from '../../../lib/catalog-fields.ts';
import { hullFigure } from '../hull-figure.ts';
import { HullSection } from './hull-section.tsx';
import { TransomProfile } from './transom-profile.tsx';

/** Section and transom to scale, and what of them is only usual. */
export function HullDrawings({ hull }: { hull: HullSheet }) {
  const figure = useMemo(() => hullFigure(hull), [hull]);
  if (!figure) {
    return (
      <p className="max-w-[72ch] text-ink-2">
        The bottom of this boat is no single vee, so its section does not follow from the values below and is not drawn.
      </p>
    );
  }
  const assumed = figure.assumed.map((field) => metaOfField('hulls', field).label.toLowerCase());
  return (
    <>
      <div className="grid gap-6 tablet:grid-cols-2">
        <HullSection figure={figure} />
        <TransomProfile figure={figure} />
      </div>
      {assumed.length > 0 && <p className="pt-2 text-note text-ink-2">Not known, so drawn as usual for its kind: {assumed.join(', ')}.</p>}
    </>
  );
}
