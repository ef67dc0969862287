import type { HullShape } from '@tiltwright/shared/engine/hull.ts';
import { hasPlainBottom, hullShape, valuesOf } from '@tiltwright/shared/engine-input.ts';
import { fillHull } from '@tiltwright/shared/questions/fill-hull.ts';
import type { Assumption } from '@tiltwright/shared/schemas/answer.ts';
import type { HullSheet } from '@tiltwright/shared/schemas/hull.ts';

/** A hull as it can be drawn. */
export interface HullFigure {
  shape: HullShape;
  /** Greatest width over all, for the topsides. */
  beamM: number;
  /** Strakes that reach the transom or end near it, by their distance off the centreline. */
  strakes: readonly { offsetM: number; endsM: number }[];
  /** Fields drawn with a usual value because nobody stated one. */
  assumed: readonly string[];
}

const drawnFields = new Set(['deadriseDeg', 'transomAngleDeg', 'transomHeightMm', 'chineBeamM', 'beamM']);

/** Null for a hull whose bottom is no single vee: a section of it would say what nobody knows. */
export function hullFigure(hull: HullSheet): HullFigure | null {
  if (!hasPlainBottom(hull)) return null;
  const assumptions: Assumption[] = [];
  const filled = fillHull(hull, null, undefined, assumptions);
  const shape = hullShape(valuesOf(filled));
  const assumed = assumptions
    .filter(({ why }) => why !== 'Class value of a generic part.')
    .map(({ field }) => field.replace(/^hull\./, ''))
    .filter((field) => drawnFields.has(field));
  return { shape, beamM: hull.beamM ?? shape.chineBeamM * 1.15, strakes: (hull.strakes ?? []).flatMap(strakeOf), assumed };
}

function strakeOf(text: string): { offsetM: number; endsM: number }[] {
  const [offset, ends] = text.split(':').map(Number);
  if (offset === undefined || ends === undefined || Number.isNaN(offset + ends)) return [];
  return [{ offsetM: offset / 1000, endsM: ends / 1000 }];
}
