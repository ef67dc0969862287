import { answerTilt } from '@tiltwright/shared/questions/answer-tilt.ts';
import type { HullSheet } from '@tiltwright/shared/schemas/hull.ts';
import type { InlineTrimPoint, TrimPoint } from '@tiltwright/shared/schemas/trim-point.ts';

/** The running trim at one speed, as the engine works it out. */
export interface CurvePlace {
  speedKn: number;
  valueDeg: number;
  sigmaDeg: number;
  /** True where no measurement bears on it. */
  estimated: boolean;
}

const places = 61;

/**
 * Running trim from rest to `topKn`, by the same engine that answers on the server, at the hull's own load in fresh water.
 * @param points the hull's measured angles, in any order
 */
export function trimCurve(hull: HullSheet, points: readonly TrimPoint[], topKn: number): CurvePlace[] {
  const part = { ...hull, trimPoints: points.map(bare) };
  return Array.from({ length: places }, (_, i) => {
    const speedKn = (topKn * i) / (places - 1);
    const question = { hull: hull.id, speedKn, targetDeg: 0, motorTrimDeg: 0, water: 'fresh' as const };
    const { trim } = answerTilt(question, { hull: part }, { edition: hull.edition });
    return {
      speedKn,
      valueDeg: trim.valueDeg,
      sigmaDeg: trim.sigmaDeg,
      estimated: trim.basis === 'estimated' || trim.basis === 'class',
    };
  });
}

/** Some knots past the last measurement; without one, what a small planing boat reaches. */
export function topSpeedKn(points: readonly TrimPoint[]): number {
  return points.length === 0 ? 30 : Math.max(10, Math.max(...points.map((point) => point.speedKn)) * 1.15);
}

function bare({ speedKn, trimDeg, sigmaDeg, runs, loadedMassKg, motorTrimDeg }: TrimPoint): InlineTrimPoint {
  return { speedKn, trimDeg, sigmaDeg, runs, loadedMassKg, motorTrimDeg };
}
