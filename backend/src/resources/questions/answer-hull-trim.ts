import { TiltQuestion } from '@tiltwright/shared/schemas/tilt.ts';
import type { Deps } from '../../deps.ts';
import { askTilt } from './answer-questions.ts';

/** The trim half of a tilt answer. */
export function answerHullTrim({ db }: Deps, hull: string, running: { speedKn: number; loadedMassKg?: number | undefined }) {
  const { tilt: _tilt, ...answer } = askTilt(db, TiltQuestion.parse({ hull, ...running }));
  return answer;
}
