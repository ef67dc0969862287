import { TiltQuestion } from '@tiltwright/shared/schemas/tilt.ts';
import { askTilt } from './answer-questions.ts';
import type { PartLookup } from './part-lookup.ts';

/** The trim half of a tilt answer. */
export function answerHullTrim(parts: PartLookup, hull: string, running: { speedKn: number; loadedMassKg?: number | undefined }) {
  const { tilt: _tilt, ...answer } = askTilt(parts, TiltQuestion.parse({ hull, ...running }));
  return answer;
}
