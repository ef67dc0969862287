// From a saved boat's question to the page's state.
import type { FitQuestionInput } from '@tiltwright/shared/schemas/fit.ts';
import { type FitState, standardState } from './fit-state.ts';

/** The state of a saved question: what the page has no input for is named in `unread`, so that nothing is dropped silently. */
export function stateOfQuestion(question: FitQuestionInput): { state: FitState; unread: string[] } {
  const unread: string[] = [];
  const state: FitState = { ...standardState };
  readHull(question, state, unread);
  readMotors(question, state, unread);
  readSensor(question, state, unread);
  const { placement, running } = question;
  Object.assign(state, pick(placement, ['offsetMm', 'dropMm', 'boardMm', 'standoffMm', 'localBottomMm', 'tiltDeg']));
  if (placement.bracketSettingDeg !== undefined) unread.push('placement.bracketSettingDeg');
  if (placement.forwardMm !== undefined) unread.push('placement.forwardMm');
  if (placement.rollDeg) unread.push('placement.rollDeg');
  if (placement.yawDeg) unread.push('placement.yawDeg');
  state.scanKn = running.speedKn;
  Object.assign(state, pick(running, ['water', 'loadedMassKg', 'measuredTrimDeg']));
  const [also, ...more] = question.alsoAt ?? [];
  if (also) {
    state.cruiseKn = also.speedKn;
    state.cruiseMotorTrimDeg = also.motorTrimDeg ?? null;
  }
  if (more.length > 0) unread.push('alsoAt');
  if (question.obstacles && question.obstacles.length > 0) unread.push('obstacles');
  state.wanted = question.wanted ?? standardState.wanted;
  state.targetDeg = question.target.attitudeDeg;
  return { state, unread };
}

function readHull({ hull }: FitQuestionInput, state: FitState, unread: string[]) {
  if (typeof hull === 'string') {
    state.hull = hull;
    return;
  }
  const names = ['form', 'lengthM', 'deadriseDeg', 'transomAngleDeg', 'transomHeightMm'] as const;
  Object.assign(state, pick(hull, names));
  unread.push(...others(hull, names).map((name) => `hull.${name}`));
}

function readMotors({ lowerUnits }: FitQuestionInput, state: FitState, unread: string[]) {
  const [first, second, ...more] = lowerUnits;
  state.motors = !first ? 'none' : second ? 'two' : 'one';
  if (!first) return;
  if (typeof first.lowerUnit === 'string') state.motor = first.lowerUnit;
  else {
    const names = ['drive', 'powerHp', 'shaftLengthMm'] as const;
    Object.assign(state, pick(first.lowerUnit, ['powerHp', 'shaftLengthMm']));
    unread.push(...others(first.lowerUnit, names).map((name) => `lowerUnits.0.${name}`));
  }
  Object.assign(state, pick(first, ['motorTrimDeg', 'steerDeg', 'setbackMm', 'raiseMm']));
  if (second) state.motorOffsetMm = Math.abs(second.offsetMm ?? standardState.motorOffsetMm);
  else if (first.offsetMm) unread.push('lowerUnits.0.offsetMm');
  if (more.length > 0) unread.push('lowerUnits');
}

function readSensor({ transducer, mount }: FitQuestionInput, state: FitState, unread: string[]) {
  if (typeof transducer === 'string') state.sensor = transducer;
  else {
    if (transducer.housingLengthMm !== undefined) state.housingLengthMm = transducer.housingLengthMm;
    unread.push(...others(transducer, ['kinds', 'housingLengthMm']).map((name) => `transducer.${name}`));
  }
  if (typeof mount === 'string') state.mount = mount;
  else if (mount) unread.push('mount');
}

function pick<T extends object, K extends keyof T>(from: T, names: readonly K[]): Partial<Pick<T, K>> {
  return Object.fromEntries(names.filter((name) => from[name] !== undefined).map((name) => [name, from[name]])) as Partial<Pick<T, K>>;
}

function others(from: object, names: readonly string[]): string[] {
  return Object.keys(from).filter((name) => !names.includes(name));
}
