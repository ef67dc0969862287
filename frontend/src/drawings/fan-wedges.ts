// A side's fan cut into what is clear, thinned and hidden, in depression below the sensor's own horizontal.
import type { Side } from '@tiltwright/shared/engine/beams/fan.ts';
import type { Vec3 } from '@tiltwright/shared/engine/vec3.ts';

/** What stands in a sector's way, in words, e.g. "strut" or "skeg of the port motor". */
export interface FanSector {
  fromDeg: number;
  toDeg: number;
  kind: 'hidden' | 'thinned';
  /** Share of the side's whole pattern weight, 0 to 1. */
  share: number;
  by: string;
}

export interface FanWedge {
  fromDeg: number;
  toDeg: number;
  kind: 'clear' | 'hidden' | 'thinned';
  share: number | null;
  by: string | null;
}

/**
 * Cuts [fromDeg, toDeg] at the sectors' edges; what no sector covers is clear.
 * Sectors are taken in order of depression and cut to the fan; where two overlap the deeper one begins where the first ends.
 */
export function fanWedges(fromDeg: number, toDeg: number, sectors: readonly FanSector[]): FanWedge[] {
  const wedges: FanWedge[] = [];
  let reached = fromDeg;
  for (const sector of [...sectors].sort((a, b) => a.fromDeg - b.fromDeg)) {
    const start = Math.max(reached, sector.fromDeg);
    const end = Math.min(toDeg, sector.toDeg);
    if (end <= start) continue;
    if (start > reached) wedges.push({ fromDeg: reached, toDeg: start, kind: 'clear', share: null, by: null });
    wedges.push({ fromDeg: start, toDeg: end, kind: sector.kind, share: sector.share, by: sector.by });
    reached = end;
  }
  if (reached < toDeg) wedges.push({ fromDeg: reached, toDeg, kind: 'clear', share: null, by: null });
  return wedges;
}

/** Direction of a depression in the sensor frame: starboard positive across, down positive. */
export function fanDirection(side: Side, depressionDeg: number): Vec3 {
  const depression = (depressionDeg * Math.PI) / 180;
  return [0, (side === 'starboard' ? 1 : -1) * Math.cos(depression), Math.sin(depression)];
}

/** Depressions from one edge to the other, ends included, no more than `stepDeg` apart: enough that an arc looks round. */
export function arcDepressions(fromDeg: number, toDeg: number, stepDeg = 2): number[] {
  const steps = Math.max(1, Math.ceil((toDeg - fromDeg) / stepDeg));
  return Array.from({ length: steps + 1 }, (_, i) => fromDeg + ((toDeg - fromDeg) * i) / steps);
}
