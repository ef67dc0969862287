// Does the beam clear, for one sensor and at most one motor?

import { type CautionCode, cautionCodes, coded } from '../engine/codes.ts';
import { engineVersion } from '../engine/version.ts';
import type { ClearanceQuestion, ClearanceReply } from '../schemas/clearance.ts';
import { clearanceFor, sceneOf, windowFor } from './evaluate.ts';
import type { AnswerContext, ClearanceParts } from './parts.ts';
import { middleNumbers, prepare } from './prepare.ts';
import { clearanceAnswer, rounded, sidesOf } from './reply.ts';
import { isNear } from './verdict.ts';

/** Answers a parsed question whose parts have been looked up. Pure. */
export function answerClearance(question: ClearanceQuestion, parts: ClearanceParts, context: AnswerContext): ClearanceReply {
  const { setbackMm, raiseMm, motorTrimDeg, steerDeg, engineOffsetMm, tiltDeg } = question;
  const { lowerUnit, ...rest } = parts;
  const engines = lowerUnit ? [{ offsetMm: engineOffsetMm, setbackMm, raiseMm, motorTrimDeg, steerDeg }] : [];
  const p = prepare({ ...rest, lowerUnits: lowerUnit ? [lowerUnit] : [] }, question, engines, question.obstacles ?? [], undefined);
  const n = middleNumbers(p);
  const scene = sceneOf(p, n);
  const wanted = sidesOf(question.wanted);
  const sides = clearanceFor(p, n, scene, tiltDeg);
  const clear = sides !== null && wanted.every((side) => sides[side].verdict === 'clear');
  const window = sides && windowFor(p, n, scene, tiltDeg, wanted, clear);
  const cautions: CautionCode[] = ['estimate-only'];
  if (sides && wanted.some((side) => isNear(sides[side]))) cautions.push('near-a-part');
  const used = p.assumptions.filter(({ field }) => !trimOnly.has(field));
  return {
    ...(question.ref === undefined ? {} : { ref: question.ref }),
    ...rounded({
      clearance: clearanceAnswer(sides, window, null),
      assumptions: used,
      cautions: cautions.map((code) => coded(cautionCodes, code)),
    }),
    engineVersion,
    edition: context.edition,
  };
}

/** Figures of a hull that only its running trim depends on. */
const trimOnly = new Set(['dryMassKg', 'loadedMassKg', 'lcgM', 'vcgM', 'staticTrimDeg'].map((field) => `hull.${field}`));
