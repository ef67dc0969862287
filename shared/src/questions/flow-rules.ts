// The rules of the water around one placed sensor.
import * as flow from '../engine/flow.ts';
import { toBoat } from '../engine/frames.ts';
import { bottomZM } from '../engine/hull.ts';
import { degToRad, knToMps, mmToM } from '../engine/units.ts';
import * as input from '../engine-input.ts';
import type { HullPart } from '../questions/parts.ts';
import type { RuleOutcome } from '../schemas/answer.ts';
import type { FitQuestion } from '../schemas/fit.ts';
import type { Scene } from './evaluate.ts';
import type { FitNumbers, Prepared } from './prepare.ts';

const basis = 'common practice';

/** `attitudesDeg` at every stated speed, nose-up positive. */
export function flowOutcomes(
  question: FitQuestion,
  p: Prepared,
  n: FitNumbers,
  scene: Scene,
  setDeg: number,
  attitudesDeg: readonly number[],
): RuleOutcome[] {
  const { kinds } = p.parts.transducer;
  const speeds = [question.running.speedKn, ...(question.alsoAt ?? []).map(({ speedKn }) => speedKn)].map(knToMps);
  const fastest = Math.max(...speeds);
  const found: flow.FlowOutcome[] = [];
  if (p.forwardMm === null) {
    found.push(flow.edgeBelowBottom(mmToM(n.dropMm), materialOf(p.parts.hull)));
    found.push(flow.tiltForFlow(degToRad(setDeg), fastest));
    found.push(flow.strakeDistance(nearestStrakeM(p.parts.hull, n.offsetMm)));
    found.push(flow.immersion(faceDepths(p, n, scene, setDeg), fastest));
  }
  found.push(flow.rollLevel(degToRad(n.rollDeg)));
  if (kinds.includes('side')) {
    found.push(...propellerRules(question, p, n));
    found.push(flow.sideSpeed(speeds));
    if (p.engines.length > 0) found.push(flow.wash());
  }
  const attitudes = attitudesDeg.map(degToRad);
  if (kinds.includes('down')) found.push(flow.downAttitude(radOrNull(p.parts.transducer.downAlongBeamDeg), false, attitudes));
  if (kinds.includes('cone')) found.push(flow.downAttitude(radOrNull(p.parts.transducer.coneBeamDeg), true, attitudes));
  return found.map((outcome) => ({ ...outcome, basis }));
}

const radOrNull = (angleDeg: number | undefined) => (angleDeg === undefined ? null : degToRad(angleDeg));

export function materialOf({ material }: HullPart): 'glass-fibre' | 'aluminium' | 'other' | null {
  if (material === undefined) return null;
  if (material === 'glass-fibre' || material === 'composite') return 'glass-fibre';
  return material === 'aluminium' ? 'aluminium' : 'other';
}

/** Strakes stand on both sides of the keel. */
export function nearestStrakeM({ strakes }: HullPart, offsetMm: number): number | null {
  if (strakes === undefined) return null;
  const gaps = strakes.map((strake) => Math.abs(Number(strake.split(':')[0]) - Math.abs(offsetMm)));
  return gaps.length === 0 ? Number.POSITIVE_INFINITY : mmToM(Math.min(...gaps));
}

function faceDepths(p: Prepared, n: FitNumbers, scene: Scene, setDeg: number): [number, number] {
  const hull = input.hullShape(n.hull, p.placing.localBottomMm);
  const pose = scene.poseAt(degToRad(setDeg));
  const half = mmToM(n.transducer.sideApertureMm) / 2;
  const depth = (along: number) => {
    const [, y, z] = toBoat(pose, [along, 0, 0]);
    return z - bottomZM(hull, y);
  };
  return [depth(half), depth(-half)];
}

function propellerRules(question: FitQuestion, p: Prepared, n: FitNumbers): flow.FlowOutcome[] {
  const nearest = p.engines
    .map(({ offsetMm }, i) => ({ i, sidewaysMm: n.offsetMm - offsetMm }))
    .sort((a, b) => Math.abs(a.sidewaysMm) - Math.abs(b.sidewaysMm))[0];
  if (!nearest) return [];
  const { i, sidewaysMm } = nearest;
  const radiusM = mmToM((n.lowerUnits[i] as FitNumbers['lowerUnits'][number]).propDiameterMm) / 2;
  const rotation = question.lowerUnits[i]?.rotation ?? p.parts.lowerUnits[i]?.rotation ?? null;
  return [flow.propellerDistance(mmToM(Math.abs(sidewaysMm)), radiusM), flow.bladeSide(rotation, sidewaysMm > 0)];
}
