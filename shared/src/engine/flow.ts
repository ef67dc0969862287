// The water around the sensor: how it is met, and whether the face stays wet. Every limit here is common practice without a source.
import { mToMm, radToDeg } from './units.ts';

export const flowRules = {
  'edge-below-bottom':
    'How far the leading edge stands below the local bottom: 3 to 6 mm on glass-fibre, 6 to 9 mm on aluminium; spray past 12 mm.',
  'tilt-for-flow': 'Nose-up by 2 to 5° (heel down) keeps the flow clean at speed; nose-down digs air and throws spray.',
  'propeller-distance': 'A side-looking unit stands at least 380 mm from the propeller’s axis and 50 mm outside its swing.',
  'blade-side': 'The side of the descending blade is preferred (starboard for a right-hand propeller); this is disputed.',
  'strake-distance': 'At least 75 mm sideways from strakes, steps, rivet rows and intakes.',
  'roll-level': 'Rolled by no more than 2°.',
  'side-speed': 'Side-looking work is done at 3 to 10 km/h.',
  wash: 'Going astern or turning, the wash hides more than the blades do.',
  'down-attitude': 'A down-looking fan may lean by half its along-track width, a cone by a quarter of its width.',
  immersion: 'At speed the water leaves the transom along the bottom line; the face is wet where it lies below that line continued aft.',
} as const;
export type FlowRule = keyof typeof flowRules;

export type Outcome = 'ok' | 'caution' | 'no' | 'unknown';

export interface FlowOutcome {
  rule: FlowRule;
  outcome: Outcome;
  text: string;
}

const found = (rule: FlowRule, outcome: Outcome, text: string): FlowOutcome => ({ rule, outcome, text });
const mm = (m: number) => `${Math.round(mToMm(m))} mm`;
const deg = (rad: number) => `${radToDeg(rad).toFixed(1)}°`;

const sprayFromM = 0.012;
const edgeRanges = { 'glass-fibre': [0.003, 0.006], aluminium: [0.006, 0.009], other: [0.003, 0.009] } as const;

/** Leading edge below the local bottom, m, on a transom of this material. */
export function edgeBelowBottom(dropM: number, material: keyof typeof edgeRanges | null): FlowOutcome {
  const rule = 'edge-below-bottom';
  const [least, most] = edgeRanges[material ?? 'other'];
  const range = `${mm(least)} to ${mm(most)} is usual${material === null ? '' : ' on this material'}`;
  if (dropM > sprayFromM) return found(rule, 'caution', `${mm(dropM)} below the bottom: spray is likely past 12 mm; ${range}.`);
  // A millimetre either way is within what a rule reads.
  if (dropM < least - 0.001) return found(rule, 'caution', `${mm(dropM)} below the bottom may run in air; ${range}.`);
  if (dropM > most + 0.001) return found(rule, 'caution', `${mm(dropM)} below the bottom may throw spray; ${range}.`);
  return found(rule, 'ok', `${mm(dropM)} below the bottom; ${range}.`);
}

/** Above this the flow counts as fast, m/s: 10 km/h. */
export const fastFromMps = 10 / 3.6;

/** Set tilt against the keel line, radians, at the fastest stated speed. */
export function tiltForFlow(tiltRad: number, fastestMps: number): FlowOutcome {
  const rule = 'tilt-for-flow';
  if (fastestMps <= fastFromMps) return found(rule, 'ok', 'Slow enough that the tilt does not trouble the flow.');
  const tiltDeg = radToDeg(tiltRad);
  if (tiltDeg < 0)
    return found(rule, 'caution', `Nose-down by ${deg(-tiltRad)}: at speed it digs air and throws spray; +2 to +5° flows clean.`);
  if (tiltDeg < 2) return found(rule, 'ok', `Nose-up by ${deg(tiltRad)}: flows, +2 to +5° flows clean.`);
  if (tiltDeg <= 5.5) return found(rule, 'ok', `Nose-up by ${deg(tiltRad)}: flows clean.`);
  return found(rule, 'caution', `Nose-up by ${deg(tiltRad)}: more than the +2 to +5° that flow clean.`);
}

/** Sideways distance of a side-looking unit from the nearest propeller's axis, and that propeller's radius, m. */
export function propellerDistance(sidewaysM: number, propRadiusM: number): FlowOutcome {
  const least = Math.max(0.38, propRadiusM + 0.05);
  const text = `${mm(sidewaysM)} sideways from the propeller’s axis; at least ${mm(least)} is usual.`;
  return found('propeller-distance', sidewaysM >= least - 0.0005 ? 'ok' : 'caution', text);
}

/** Which side of the nearest propeller the sensor stands on. Either side passes: the preference is disputed. */
export function bladeSide(rotation: 'right' | 'left' | 'dual' | null, sensorToStarboard: boolean): FlowOutcome {
  const rule = 'blade-side';
  if (rotation === null) return found(rule, 'unknown', 'The propeller’s rotation was not stated.');
  if (rotation === 'dual') return found(rule, 'ok', 'Counter-rotating propellers have no quiet side.');
  const descending = (rotation === 'right') === sensorToStarboard;
  return found(
    rule,
    'ok',
    descending ? 'On the side of the descending blade, which is preferred.' : 'Not on the preferred side; this is disputed.',
  );
}

/** Sideways distance to the nearest strake, m; Infinity where there are none, null where nobody said. */
export function strakeDistance(sidewaysM: number | null): FlowOutcome {
  const rule = 'strake-distance';
  if (sidewaysM === null) return found(rule, 'unknown', 'Strakes were not stated; keep 75 mm away from them.');
  if (sidewaysM === Number.POSITIVE_INFINITY) return found(rule, 'ok', 'No strakes.');
  return found(rule, sidewaysM >= 0.075 ? 'ok' : 'caution', `${mm(sidewaysM)} sideways from the nearest strake; at least 75 mm is usual.`);
}

export function rollLevel(rollRad: number): FlowOutcome {
  return found('roll-level', Math.abs(radToDeg(rollRad)) <= 2 ? 'ok' : 'caution', `Rolled by ${deg(rollRad)}; level within 2° is usual.`);
}

/** Stated speeds through the water, m/s, of a rig with a side element. */
export function sideSpeed(speedsMps: readonly number[]): FlowOutcome {
  const works = speedsMps.some((speed) => speed >= 3 / 3.6 - 1e-9 && speed <= fastFromMps + 1e-9);
  const text = works ? 'A stated speed lies within 3 to 10 km/h.' : 'No stated speed lies within 3 to 10 km/h, where side-looking works.';
  return found('side-speed', works ? 'ok' : 'caution', text);
}

export function wash(): FlowOutcome {
  return found('wash', 'ok', 'Going astern or turning, expect the wash to hide more than the blades do.');
}

/** A down-looking element: its along-track width and whether it is a cone, radians; attitudes at the stated speeds, nose-up positive. */
export function downAttitude(widthRad: number | null, cone: boolean, attitudesRad: readonly number[]): FlowOutcome {
  const rule = 'down-attitude';
  if (widthRad === null) return found(rule, 'unknown', 'The width of the down-looking beam was not stated.');
  const limit = widthRad / (cone ? 4 : 2);
  const worst = attitudesRad.reduce((most, attitude) => (Math.abs(attitude) > Math.abs(most) ? attitude : most), 0);
  const text = `Leans by up to ${deg(Math.abs(worst))} at the stated speeds; ${deg(limit)} leaves the bottom within the beam.`;
  return found(rule, Math.abs(worst) <= limit ? 'ok' : 'caution', text);
}

/** Depth of the two ends of the face below the bottom line continued aft, m, at the fastest stated speed. */
export function immersion(depthsM: readonly [number, number], fastestMps: number): FlowOutcome {
  const rule = 'immersion';
  if (fastestMps <= fastFromMps) return found(rule, 'ok', 'Slow enough that the water closes behind the transom.');
  const [least, most] = [Math.min(...depthsM), Math.max(...depthsM)];
  if (least >= 0) return found(rule, 'ok', `The whole face lies below the water line at speed, by ${mm(least)} at least.`);
  if (most <= 0) return found(rule, 'caution', `The face lies ${mm(-most)} above the water line at speed: it runs dry.`);
  return found(rule, 'caution', `One end of the face lies ${mm(-least)} above the water line at speed.`);
}
