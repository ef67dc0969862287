// Do mount, hull, transducer and motor go together at all? One outcome a rule, each with its reason.
import type { Outcome } from '../engine/flow.ts';
import { hasPlainBottom } from '../engine-input.ts';
import type { RuleOutcome, TiltAnswer } from '../schemas/answer.ts';
import type { FitQuestion } from '../schemas/fit.ts';
import type { MountPart, PartValue } from './parts.ts';
import type { FitNumbers, Prepared } from './prepare.ts';
import { swingGapMm } from './swing.ts';

export const compatibilityRules = {
  'mount-kind': 'The transducer can be used on this kind of mount.',
  'hull-material': 'The mount may be fixed to this hull’s material.',
  'deadrise-range': 'The deadrise lies within the mount’s range; a through-hull unit needs a fairing above about 10°.',
  'tilt-range': 'The needed setting lies within the bracket’s scale.',
  'roll-range': 'The roll lies within the mount’s range.',
  'height-range': 'The drop below the bottom lies within the mount’s range of height.',
  'plate-fits': 'The mount’s plate finds room on the transom, clear of strakes.',
  'housing-fits': 'The housing fits the bracket.',
  'mount-speed': 'The stated speeds lie within what the mount is made for.',
  'transducer-speed': 'The stated speeds lie within what the transducer is made for.',
  'engine-swing': 'Sensor and engine do not meet at full steer and tilt.',
  'shaft-length': 'The shaft suits the transom: within 25 mm good, within 50 mm with care.',
  'local-bottom': 'On a stepped, pontoon or catamaran bottom a transom unit needs the local bottom stated.',
} as const;
export type CompatibilityRule = keyof typeof compatibilityRules;

type Found = { rule: CompatibilityRule; outcome: Outcome; text: string; basis: string };
type Part = { values?: Readonly<Record<string, PartValue>> };

const practice = 'common practice';
const basisOf = (part: Part, field: string): string => part.values?.[field]?.basis ?? 'published';

export function compatibilityOutcomes(question: FitQuestion, p: Prepared, n: FitNumbers, tilt: TiltAnswer): RuleOutcome[] {
  const { mount } = p.parts;
  const found: (Found | null)[] = [
    ...(mount ? mountRules(question, p, n, mount, tilt) : []),
    transducerSpeed(question, p),
    engineSwing(p, n, tilt.setDeg),
    ...p.parts.lowerUnits.map((_, i) => shaftLength(p, n, i)),
    localBottom(p),
  ];
  return found.filter((one) => one !== null).map((one) => softened(p, one));
}

/** What the deciding quantity of a rule is called among the assumptions. */
const decidedBy: Partial<Record<CompatibilityRule, RegExp>> = {
  'deadrise-range': /^hull\.deadriseDeg$/,
  'plate-fits': /^hull\.(chineBeamM|transomHeightMm)$/,
  'housing-fits': /^transducer\.housingLengthMm$/,
  'shaft-length': /^(hull\.transomHeightMm|lowerUnits\.\d+\.shaftLengthMm)$/,
};

/** A class default widens an answer, it does not say no: where one decides, the rule is unknown until somebody measures. */
function softened(p: Prepared, one: Found): Found {
  const assumed = one.outcome === 'no' ? p.assumptions.find(({ field }) => decidedBy[one.rule]?.test(field)) : undefined;
  return assumed ? { ...one, outcome: 'unknown', text: `${one.text} That rests on a class value: measure it.`, basis: 'class' } : one;
}

function mountRules(question: FitQuestion, p: Prepared, n: FitNumbers, mount: MountPart, tilt: TiltAnswer): (Found | null)[] {
  const { hull, transducer } = p.parts;
  return [
    member('mount-kind', mount.kind, transducer.mountKinds, basisOf(transducer, 'mountKinds'), 'The transducer', 'mounts'),
    member('hull-material', hull.material, mount.hullMaterials, basisOf(mount, 'hullMaterials'), 'The mount', 'hull materials'),
    deadrise(n.hull.deadriseDeg, mount),
    tiltRange(tilt, mount),
    within('roll-range', n.rollDeg, mount.rollMinDeg, mount.rollMaxDeg, '°', 'rolled', basisOf(mount, 'rollMaxDeg'), 'no'),
    within('height-range', n.dropMm, mount.heightMinMm, mount.heightMaxMm, ' mm', 'below the bottom', basisOf(mount, 'heightMaxMm'), 'no'),
    plateFits(p, n, mount),
    housingFits(p, mount),
    speedLimit('mount-speed', question, mount.maxSpeedKn, basisOf(mount, 'maxSpeedKn'), 'no'),
  ];
}

function member(
  rule: CompatibilityRule,
  value: string | undefined,
  allowed: readonly string[] | undefined,
  basis: string,
  who: string,
  what: string,
): Found {
  if (value === undefined || allowed === undefined) return { rule, outcome: 'unknown', text: `${who}’s ${what} were not stated.`, basis };
  const fits = allowed.includes(value);
  return { rule, outcome: fits ? 'ok' : 'no', text: `${who} ${fits ? 'allows' : 'does not allow'} ${value}.`, basis };
}

function within(
  rule: CompatibilityRule,
  value: number,
  least: number | undefined,
  most: number | undefined,
  unit: string,
  word: string,
  basis: string,
  outside: Outcome,
): Found | null {
  if (least === undefined && most === undefined) return null;
  const short = least !== undefined && value < least - 1e-9;
  const long = most !== undefined && value > most + 1e-9;
  const text = `${round(value)}${unit} ${word}; the mount takes ${round(least ?? 0)} to ${most === undefined ? 'any' : round(most)}${unit}.`;
  return { rule, outcome: short || long ? outside : 'ok', text, basis };
}

const round = (value: number) => Math.round(value * 10) / 10;

/** Above this a through-hull unit needs a fairing block, degrees. */
const fairingAboveDeg = 10;

function deadrise(deadriseDeg: number, mount: MountPart): Found | null {
  const rule = 'deadrise-range';
  if (mount.deadriseMinDeg !== undefined || mount.deadriseMaxDeg !== undefined) {
    return within(rule, deadriseDeg, mount.deadriseMinDeg, mount.deadriseMaxDeg, '°', 'deadrise', basisOf(mount, 'deadriseMaxDeg'), 'no');
  }
  if (mount.kind !== 'through-hull') return null;
  const steep = deadriseDeg > fairingAboveDeg;
  const text = steep ? `${round(deadriseDeg)}° deadrise: a through-hull unit needs a fairing.` : 'Flat enough for a through-hull unit.';
  return { rule, outcome: steep ? 'caution' : 'ok', text, basis: practice };
}

function tiltRange(tilt: TiltAnswer, mount: MountPart): Found | null {
  if (tilt.inBracketRange === null) return null;
  const text = tilt.inBracketRange
    ? `The needed setting, ${round(tilt.bracketSettingDeg ?? 0)}°, is on the scale.`
    : `The needed setting, ${round(tilt.bracketSettingDeg ?? 0)}°, is off the scale by ${round(Math.abs(tilt.wedgeDeg ?? 0))}°; a wedge closes the gap.`;
  return { rule: 'tilt-range', outcome: tilt.inBracketRange ? 'ok' : 'caution', text, basis: basisOf(mount, 'tiltMaxDeg') };
}

function plateFits(p: Prepared, n: FitNumbers, mount: MountPart): Found | null {
  const { plateWidthMm, plateHeightMm } = mount;
  if (p.forwardMm !== null || plateWidthMm === undefined) return null;
  const rule = 'plate-fits';
  const basis = basisOf(mount, 'plateWidthMm');
  const halfMm = plateWidthMm / 2;
  const offset = Math.abs(n.offsetMm);
  const edgeMm = (p.parts.hull.transomWidthMm ?? n.hull.chineBeamM * 1000) / 2;
  if (offset + halfMm > edgeMm)
    return { rule, outcome: 'no', text: `The plate stands ${round(offset + halfMm - edgeMm)} mm past the transom’s edge.`, basis };
  if (plateHeightMm !== undefined && plateHeightMm > n.hull.transomHeightMm) {
    return {
      rule,
      outcome: 'no',
      text: `The plate is ${round(plateHeightMm - n.hull.transomHeightMm)} mm taller than the transom.`,
      basis,
    };
  }
  const met = (p.parts.hull.strakes ?? []).some((strake) => Math.abs(Number(strake.split(':')[0]) - offset) < halfMm);
  if (met) return { rule, outcome: 'caution', text: 'A strake runs into the plate’s width.', basis };
  return { rule, outcome: 'ok', text: 'The plate finds room on the transom.', basis };
}

function housingFits(p: Prepared, mount: MountPart): Found | null {
  const { housingLengthMaxMm, housingWidthMaxMm } = mount;
  if (housingLengthMaxMm === undefined && housingWidthMaxMm === undefined) return null;
  const rule = 'housing-fits';
  const basis = basisOf(mount, 'housingLengthMaxMm');
  const long = p.transducer.housingLengthMm.value - (housingLengthMaxMm ?? Number.POSITIVE_INFINITY);
  const wide = (p.parts.transducer.housingWidthMm ?? 0) - (housingWidthMaxMm ?? Number.POSITIVE_INFINITY);
  const over = Math.max(long, wide);
  const text =
    over > 0 ? `The housing is ${round(over)} mm too ${long >= wide ? 'long' : 'wide'} for the bracket.` : 'The housing fits the bracket.';
  return { rule, outcome: over > 0 ? 'no' : 'ok', text, basis };
}

function speedLimit(
  rule: CompatibilityRule,
  question: FitQuestion,
  limitKn: number | undefined,
  basis: string,
  outside: Outcome,
): Found | null {
  if (limitKn === undefined) return null;
  const fastest = Math.max(question.running.speedKn, ...(question.alsoAt ?? []).map(({ speedKn }) => speedKn));
  return {
    rule,
    outcome: fastest > limitKn ? outside : 'ok',
    text: `Run at up to ${round(fastest)} kn; made for ${round(limitKn)} kn.`,
    basis,
  };
}

function transducerSpeed(question: FitQuestion, p: Prepared): Found | null {
  const { transducer } = p.parts;
  return speedLimit('transducer-speed', question, transducer.maxSpeedKn, basisOf(transducer, 'maxSpeedKn'), 'caution');
}

/** A gap narrower than this is too near for a steered motor in a chop, mm. */
const narrowGapMm = 20;

function engineSwing(p: Prepared, n: FitNumbers, setDeg: number): Found | null {
  if (p.forwardMm !== null || p.engines.length === 0) return null;
  const gap = swingGapMm(p, n, setDeg, narrowGapMm);
  const outcome = gap <= 0 ? 'no' : gap < narrowGapMm ? 'caution' : 'ok';
  const text = {
    no: 'The engine meets the sensor as it is steered or tilted.',
    caution: `The engine passes the sensor within ${round(gap)} mm as it is steered or tilted.`,
    ok: 'The engine swings clear of the sensor.',
  }[outcome];
  return { rule: 'engine-swing', outcome, text, basis: 'estimated' };
}

function shaftLength(p: Prepared, n: FitNumbers, i: number): Found | null {
  const unit = p.parts.lowerUnits[i];
  if (unit?.drive !== 'outboard') return null;
  // A jack plate that lifts the engine takes the place of transom height.
  const heightMm = n.hull.transomHeightMm + (n.engines[i]?.raiseMm ?? 0);
  const off = (n.lowerUnits[i] as FitNumbers['lowerUnits'][number]).shaftLengthMm - heightMm;
  const outcome = Math.abs(off) <= 25 ? 'ok' : Math.abs(off) <= 50 ? 'caution' : 'no';
  const text = `The shaft is ${round(Math.abs(off))} mm ${off < 0 ? 'shorter' : 'longer'} than the transom${heightMm === n.hull.transomHeightMm ? ' is' : ', with the engine raised, is'} high.`;
  return { rule: 'shaft-length', outcome, text, basis: practice };
}

function localBottom(p: Prepared): Found | null {
  if (p.forwardMm !== null || hasPlainBottom(p.parts.hull)) return null;
  const stated = p.placing.localBottomMm !== undefined;
  const text = stated ? 'The local bottom is stated.' : 'State how far the bottom at the sensor lies below the keel line.';
  return { rule: 'local-bottom', outcome: stated ? 'ok' : 'unknown', text, basis: practice };
}
