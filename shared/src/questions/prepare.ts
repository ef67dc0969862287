// From resolved parts and a question's settings to one set of numbers in trade units that the engine can be asked with.
import { type EngineNumbers, type Numbers, type ObstacleNumbers, valuesOf } from '../engine-input.ts';
import type { Assumption } from '../schemas/answer.ts';
import { type FilledHull, fillHull } from './fill-hull.ts';
import { type FilledLowerUnit, fillLowerUnit } from './fill-lower-unit.ts';
import { type FilledTransducer, fillStandoff, fillTransducer, standsOnTransom } from './fill-sensor.ts';
import type { Quantity } from './filled.ts';
import type { ResolvedParts } from './parts.ts';

/** Where a sensor is put, as the questions say it; what is left out is filled in here. */
export interface Placing {
  offsetMm: number;
  dropMm: number;
  standoffMm?: number | undefined;
  boardMm: number;
  forwardMm?: number | undefined;
  rollDeg: number;
  yawDeg: number;
  localBottomMm?: number | undefined;
}

export interface Prepared {
  parts: ResolvedParts;
  hull: FilledHull;
  lowerUnits: FilledLowerUnit[];
  transducer: FilledTransducer;
  standoffMm: Quantity;
  /** Null on a transom. */
  forwardMm: Quantity | null;
  placing: Placing;
  engines: EngineNumbers[];
  obstacles: readonly ObstacleNumbers[];
  /** False for a sensor inside the hull, which looks through its bottom. */
  hullHides: boolean;
  assumptions: Assumption[];
}

/** One draw of everything uncertain; the middle values to begin with. */
export interface FitNumbers {
  hull: Numbers<FilledHull>;
  lowerUnits: readonly Numbers<FilledLowerUnit>[];
  transducer: Numbers<FilledTransducer>;
  engines: readonly EngineNumbers[];
  standoffMm: number;
  forwardMm: number | null;
  offsetMm: number;
  dropMm: number;
  rollDeg: number;
  yawDeg: number;
}

export function prepare(
  parts: ResolvedParts,
  placing: Placing,
  engines: readonly EngineNumbers[],
  obstacles: readonly ObstacleNumbers[],
  loadedMassKg: number | undefined,
): Prepared {
  const assumptions: Assumption[] = [];
  const powers = parts.lowerUnits.map(({ powerHp }) => powerHp);
  const hull = fillHull(parts.hull, powers.length > 0 ? Math.max(...powers) : null, loadedMassKg, assumptions);
  const lowerUnits = parts.lowerUnits.map((unit, index) => fillLowerUnit(unit, index, hull.transomHeightMm.value, assumptions));
  const transducer = fillTransducer(parts.transducer, assumptions);
  const onTransom = standsOnTransom(parts.mount, placing.forwardMm);
  return {
    parts,
    hull,
    lowerUnits,
    transducer,
    standoffMm: onTransom ? fillStandoff(placing.standoffMm, parts.mount, assumptions) : { value: 0, sigma: 0, basis: 'class' },
    forwardMm: onTransom ? null : forwardOf(parts, placing.forwardMm, assumptions),
    placing,
    engines: [...engines],
    obstacles,
    hullHides: parts.mount?.kind !== 'in-hull',
    assumptions,
  };
}

/** Where mounts off the transom usually stand, as a share of the hull's length ahead of it (common practice, no source). */
const usualForwardShare = { 'in-hull': 0.1, 'through-hull': 0.25, pole: 0.5, 'bow-motor': 1 } as const;

function forwardOf(parts: ResolvedParts, asked: number | undefined, assumptions: Assumption[]): Quantity {
  if (asked !== undefined) return { value: asked, sigma: 10, basis: 'measured' };
  const share = usualForwardShare[(parts.mount?.kind ?? 'pole') as keyof typeof usualForwardShare];
  const lengthMm = parts.hull.lengthM * 1000;
  const quantity = { value: share * lengthMm, sigma: 0.1 * lengthMm };
  assumptions.push({ field: 'placement.forwardMm', ...quantity, why: 'Usual place of such a mount.' });
  return { ...quantity, basis: 'class' };
}

export function middleNumbers(p: Prepared): FitNumbers {
  return {
    hull: valuesOf(p.hull),
    lowerUnits: p.lowerUnits.map(valuesOf),
    transducer: valuesOf(p.transducer),
    engines: p.engines,
    standoffMm: p.standoffMm.value,
    forwardMm: p.forwardMm?.value ?? null,
    offsetMm: p.placing.offsetMm,
    dropMm: p.placing.dropMm,
    rollDeg: p.placing.rollDeg,
    yawDeg: p.placing.yawDeg,
  };
}
