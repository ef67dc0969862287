// From numbers to a verdict, its reasons and one thing to do.

import type { Side } from '../engine/beams/fan.ts';
import { actionTexts, coded, type ReasonCode, reasonCodes } from '../engine/codes.ts';
import { clearFrom, shadedFrom, sureFrom } from '../engine/thresholds.ts';
import type { TiltAnswer } from '../schemas/answer.ts';
import type { Action, Verdict } from '../schemas/fit.ts';
import type { BothSides } from './evaluate.ts';
import type { SideOdds } from './sampling.ts';

/** What the verdict is drawn from. */
export interface Findings {
  faults: readonly ReasonCode[];
  sides: BothSides | null;
  /** What the draws say of each side; null without sampling, when the middle values speak for themselves. */
  odds: Record<Side, SideOdds> | null;
  wanted: readonly Side[];
  tilt: TiltAnswer;
  /** Whether setting the needed tilt would gain anything an owner could see. */
  reTiltGains: boolean;
  /** Whether the wanted sides clear, or at least are no longer blocked, at some setting within reach. */
  reach: { unblocked: boolean; clearByMotorTrim: boolean; clearByTilt: boolean };
  /** Whether some rule of compatibility says no, or calls for care. */
  rules: { no: boolean; caution: boolean };
}

export interface Judgement {
  verdict: Verdict;
  reasons: { code: ReasonCode; text: string }[];
  action: { code: Action; text: string };
}

export function judge(f: Findings): Judgement {
  const codes: ReasonCode[] = [...f.faults];
  const wanted = f.sides ? f.wanted.map((side) => (f.sides as BothSides)[side]) : [];
  if (!f.sides) codes.push('no-side-element');
  if (wanted.some(({ verdict }) => verdict === 'blocked')) codes.push(f.reach.unblocked ? 'side-blocked' : 'blocked-at-every-setting');
  if (wanted.some(({ verdict }) => verdict === 'shaded')) codes.push('side-shaded');
  if (f.tilt.inBracketRange === false) codes.push('tilt-out-of-range');
  if (wanted.some(isNear)) codes.push('near-a-part');
  const odds = f.odds ? f.wanted.map((side) => (f.odds as Record<Side, SideOdds>)[side]) : [];
  if (odds.some(({ interval90: [low, high] }) => low < shadedFrom && high >= clearFrom)) codes.push('blocked-or-clear');
  if (odds.some(({ probabilityClear }, i) => wanted[i]?.verdict === 'clear' && probabilityClear < sureFrom)) codes.push('maybe-not-clear');
  if (f.rules.no) codes.push('rule-says-no');
  if (f.rules.caution) codes.push('rule-calls-for-care');
  const verdict = verdictOf(f, codes);
  if (codes.length === 0) codes.push('all-clear');
  const action = actionOf(f, verdict, codes);
  return { verdict, reasons: codes.map((code) => coded(reasonCodes, code)), action: { code: action, text: actionTexts[action] } };
}

/** An unblocked beam that passes nearer to a part than the diffraction margin. */
export function isNear(side: BothSides['port']): boolean {
  const { leastClearanceM, diffractionMarginM } = side;
  return leastClearanceM !== null && diffractionMarginM !== null && leastClearanceM < diffractionMarginM;
}

function verdictOf(f: Findings, codes: readonly ReasonCode[]): Verdict {
  // A placement that cannot be is no ground for a no; a bottom nobody described is no excuse for one.
  if (f.faults.some((fault) => fault !== 'local-bottom-unknown')) return 'cannot-tell';
  if (f.rules.no) return 'does-not-fit';
  if (f.faults.length > 0) return 'cannot-tell';
  if (codes.includes('blocked-at-every-setting')) return 'does-not-fit';
  if (codes.includes('blocked-or-clear')) return 'cannot-tell';
  return codes.every((code) => code === 'no-side-element') ? 'fits' : 'fits-with-care';
}

function actionOf(f: Findings, verdict: Verdict, codes: readonly ReasonCode[]): Action {
  if (verdict === 'cannot-tell') return 'measure-first';
  if (verdict === 'does-not-fit') return f.rules.no ? 'choose-another-mount' : 'move';
  const freed: Action = f.reach.clearByMotorTrim ? 'trim-motor-up' : f.reach.clearByTilt ? 're-tilt' : 'move';
  if (codes.includes('side-blocked')) return freed;
  if (codes.includes('tilt-out-of-range')) return 'add-wedge';
  if (codes.includes('side-shaded')) return freed;
  return f.reTiltGains ? 're-tilt' : 'leave';
}
