// Engine results in the words and units of the answers.
import { sha256 } from '@noble/hashes/sha2';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils';
import type { Side } from '../engine/beams/fan.ts';
import type { SideClearance, TiltWindow } from '../engine/beams/occlusion.ts';
import type { Estimate } from '../engine/estimate.ts';
import { wedgeRise } from '../engine/level.ts';
import type { TrimFlag } from '../engine/trim/estimated-trim.ts';
import type { TrimBasis } from '../engine/trim/running-trim.ts';
import { degToRad, mToMm, radToDeg } from '../engine/units.ts';
import type { ClearanceAnswer, SideAnswer, TiltAnswer, TrimAnswer } from '../schemas/answer.ts';
import type { WantedSides } from '../schemas/fit.ts';
import type { BothSides } from './evaluate.ts';
import type { SideOdds } from './sampling.ts';

/** Answers carry six decimals: far below any measurement, and the same on every machine. */
export function rounded<T>(value: T): T {
  if (typeof value === 'number') return (Math.round(value * 1e6) / 1e6 + 0) as T;
  if (Array.isArray(value)) return value.map(rounded) as T;
  if (value === null || typeof value !== 'object') return value;
  return Object.fromEntries(Object.entries(value).map(([key, inner]) => [key, rounded(inner)])) as T;
}

export const sidesOf = (wanted: WantedSides): readonly Side[] => (wanted === 'both' ? ['port', 'starboard'] : [wanted]);

export function trimAnswer(trim: Estimate<TrimBasis, TrimFlag>): TrimAnswer {
  return { valueDeg: radToDeg(trim.value), sigmaDeg: radToDeg(trim.sigma), basis: trim.basis, flags: [...new Set(trim.flags)] };
}

/** The bracket's own scale: it reads 0 when the sensor is square to the transom face, which is nose-up by the transom angle. */
export interface TiltScale {
  transomAngleDeg: number;
  zeroDeg: number;
  minDeg: number;
  maxDeg: number;
}

/** A gap this wide is closed by no wedge, degrees. */
const steepestWedgeDeg = 80;

/** Tilt, attitude and bracket setting. `setDeg` null takes the needed tilt; `scale` null where no bracket stands on a transom. */
export function tiltAnswer(
  trimDeg: number,
  targetDeg: number,
  setDeg: number | null,
  scale: TiltScale | null,
  interval90Deg: [number, number] | null = null,
): TiltAnswer {
  const neededDeg = targetDeg - trimDeg;
  const set = setDeg ?? neededDeg;
  const base = { neededDeg, interval90Deg, setDeg: set, attitudeDeg: set + trimDeg };
  if (!scale) return { ...base, bracketSettingDeg: null, inBracketRange: null, wedgeDeg: null, shimMmPer100: null };
  const setting = neededDeg - scale.transomAngleDeg - scale.zeroDeg;
  const wedgeDeg = setting > scale.maxDeg ? setting - scale.maxDeg : Math.min(0, setting - scale.minDeg);
  return {
    ...base,
    bracketSettingDeg: setting,
    inBracketRange: wedgeDeg === 0,
    wedgeDeg,
    shimMmPer100: Math.abs(wedgeDeg) < steepestWedgeDeg ? 100 * wedgeRise(degToRad(wedgeDeg)) : null,
  };
}

export function sideAnswer(side: SideClearance, odds: SideOdds | null): SideAnswer {
  return {
    verdict: side.verdict,
    clearShare: side.clearShare,
    probabilityClear: odds?.probabilityClear ?? null,
    sectors: side.sectors,
    leastClearanceMm: side.leastClearanceM === null ? null : mToMm(side.leastClearanceM),
    diffractionMarginMm: side.diffractionMarginM === null ? null : mToMm(side.diffractionMarginM),
  };
}

export function clearanceAnswer(sides: BothSides | null, window: TiltWindow | null, odds: Record<Side, SideOdds> | null): ClearanceAnswer {
  return {
    port: sides && sideAnswer(sides.port, odds?.port ?? null),
    starboard: sides && sideAnswer(sides.starboard, odds?.starboard ?? null),
    tiltWindowDeg: window?.windowRad ? [radToDeg(window.windowRad[0]), radToDeg(window.windowRad[1])] : null,
    nearestClearTiltDeg: window?.nearestClearRad == null ? null : radToDeg(window.nearestClearRad),
  };
}

/** JSON with sorted names: equal things read equal. */
function canonicalJson(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
  if (value === null || typeof value !== 'object') return JSON.stringify(value) ?? 'null';
  const entries = Object.entries(value).filter(([, inner]) => inner !== undefined);
  entries.sort(([a], [b]) => (a < b ? -1 : 1));
  return `{${entries.map(([key, inner]) => `${JSON.stringify(key)}:${canonicalJson(inner)}`).join(',')}}`;
}

/** SHA-256 of what an answer says, hexadecimal. */
export function digestOf(answer: unknown): string {
  return bytesToHex(sha256(utf8ToBytes(canonicalJson(answer))));
}
