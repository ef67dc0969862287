// Which tilt gives the wanted attitude at this speed?
import { type CautionCode, cautionCodes, coded } from '../engine/codes.ts';
import { sigmasIn90 } from '../engine/estimate.ts';
import { engineVersion } from '../engine/version.ts';
import type { Assumption, TrimAnswer } from '../schemas/answer.ts';
import type { TiltQuestion, TiltReply } from '../schemas/tilt.ts';
import { trimPointsOf, widenedTrim } from './evaluate.ts';
import { fillTiltScale, standsOnTransom } from './fill-sensor.ts';
import type { AnswerContext, TiltParts } from './parts.ts';
import { middleNumbers, prepare } from './prepare.ts';
import { rounded, tiltAnswer, trimAnswer } from './reply.ts';
import { ownTrim } from './states.ts';

/** The trim does not depend on the sensor; this stands in for it and leaves no assumptions. */
const noSensor = { kinds: [], housingLengthMm: 1, standoffMm: 0 };
const noPlacing = { offsetMm: 0, dropMm: 0, standoffMm: 0, boardMm: 0, rollDeg: 0, yawDeg: 0 };

/** Answers a parsed question whose parts have been looked up. Pure. */
export function answerTilt(question: TiltQuestion, parts: TiltParts, context: AnswerContext): TiltReply {
  const { lowerUnit, hull, mount } = parts;
  const setting = { offsetMm: 0, setbackMm: 0, raiseMm: 0, motorTrimDeg: question.motorTrimDeg, steerDeg: 0 };
  const lowerUnits = lowerUnit ? [lowerUnit] : [];
  const p = prepare({ hull, lowerUnits, transducer: noSensor }, noPlacing, lowerUnit ? [setting] : [], [], question.loadedMassKg);
  const n = middleNumbers(p);
  const own = ownTrim(question, p);
  const trim = trimAnswer(widenedTrim(p, n, { speedKn: question.speedKn, water: question.water, own }, trimPointsOf(p, null)));
  const assumptions: Assumption[] = p.assumptions.filter(({ field }) => (own ? field.startsWith('running.') : !geometryOnly.has(field)));
  const onTransom = mount !== undefined && standsOnTransom(mount, undefined);
  const scale = onTransom ? { transomAngleDeg: n.hull.transomAngleDeg, ...fillTiltScale(mount, assumptions) } : null;
  const angle = p.assumptions.find(({ field }) => field === 'hull.transomAngleDeg');
  if (scale && angle) assumptions.push(angle);
  const cautions: CautionCode[] = trim.basis === 'class' ? ['estimate-only', 'trim-is-class-value'] : ['estimate-only'];
  return {
    ...(question.ref === undefined ? {} : { ref: question.ref }),
    ...rounded({
      trim,
      tilt: tiltAnswer(trim.valueDeg, question.targetDeg, null, scale, intervalOf(trim, question.targetDeg)),
      assumptions,
      cautions: cautions.map((code) => coded(cautionCodes, code)),
    }),
    engineVersion,
    edition: context.edition,
  };
}

/** Figures of a hull that its running trim does not depend on. */
const geometryOnly = new Set(['keelPadMm', 'notchMm', 'transomAngleDeg'].map((field) => `hull.${field}`));

/** The middle 90 % of the needed tilt, were the trim's error normal: quick, where a fit draws samples. */
function intervalOf({ valueDeg, sigmaDeg }: TrimAnswer, targetDeg: number): [number, number] {
  const half = sigmasIn90 * sigmaDeg;
  return [targetDeg - valueDeg - half, targetDeg - valueDeg + half];
}
