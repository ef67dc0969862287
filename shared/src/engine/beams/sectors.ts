// From a profile of what is blocked to the words an owner reads: clear share, hidden and thinned sectors.
import type { Owner, Solid } from '../solids/solid.ts';
import { hiddenAbove, leastSectorDeg, thinnedFrom } from '../thresholds.ts';
import { radToDeg } from '../units.ts';
import type { Fan } from './fan.ts';
import { type SlabProfile, shareTaken } from './slab.ts';

export interface Sector {
  /** Depression in the sensor frame. */
  fromDeg: number;
  toDeg: number;
  /** Share of the side's whole two-way weight that lies in it. */
  share: number;
  kind: 'hidden' | 'thinned';
  /** The part that blocks most of it. */
  by: Owner;
}

/** Σ w (1 − blocked) / Σ w, 0 to 1. */
export function clearShare(fan: Fan, blocked: Float64Array): number {
  return Math.min(1, Math.max(0, 1 - shareTaken(fan, blocked)));
}

type Level = 'open' | 'thinned' | 'hidden';

function levelOf(blocked: number): Level {
  if (blocked > hiddenAbove) return 'hidden';
  return blocked >= thinnedFrom ? 'thinned' : 'open';
}

/** Runs of hidden and thinned directions, edges interpolated between the fan's steps; runs under a degree are dropped. */
export function sectorsOf(fan: Fan, profile: SlabProfile, solids: readonly Solid[]): Sector[] {
  const { blocked } = profile;
  const runs: { level: Level; fromDeg: number; toDeg: number }[] = [];
  const extend = (level: Level, fromDeg: number, toDeg: number) => {
    const last = runs.at(-1);
    if (last && last.level === level) last.toDeg = toDeg;
    else runs.push({ level, fromDeg, toDeg });
  };
  for (let i = 0; i + 1 < blocked.length; i++) {
    const a = blocked[i] as number;
    const b = blocked[i + 1] as number;
    const from = radToDeg(fan.depressionsRad[i] as number);
    const to = radToDeg(fan.depressionsRad[i + 1] as number);
    const cuts = [thinnedFrom, hiddenAbove].filter((level) => (a - level) * (b - level) < 0).map((level) => (level - a) / (b - a));
    const edges = [0, ...cuts.sort((x, y) => x - y), 1];
    for (let e = 0; e + 1 < edges.length; e++) {
      const lower = edges[e] as number;
      const upper = edges[e + 1] as number;
      extend(levelOf(a + (b - a) * ((lower + upper) / 2)), from + (to - from) * lower, from + (to - from) * upper);
    }
  }
  return runs.flatMap(({ level, fromDeg, toDeg }) => {
    if (level === 'open' || toDeg - fromDeg < leastSectorDeg) return [];
    const within = (i: number) => {
      const deg = radToDeg(fan.depressionsRad[i] as number);
      return deg >= fromDeg - 1e-9 && deg <= toDeg + 1e-9;
    };
    return [{ fromDeg, toDeg, kind: level, share: weightWithin(fan, within), by: chiefBlocker(fan, profile, solids, within) }];
  });
}

function weightWithin(fan: Fan, within: (step: number) => boolean): number {
  let weight = 0;
  for (let i = 0; i < fan.weights.length; i++) if (within(i)) weight += fan.weights[i] as number;
  return weight / fan.totalWeight;
}

function chiefBlocker(fan: Fan, profile: SlabProfile, solids: readonly Solid[], within: (step: number) => boolean): Owner {
  let most = -1;
  let chief = (solids[0] as Solid).owner;
  profile.bySolid.forEach((own, k) => {
    if (!own) return;
    let taken = 0;
    for (let i = 0; i < own.length; i++) if (within(i)) taken += (fan.weights[i] as number) * (own[i] as number);
    if (taken > most) {
      most = taken;
      chief = (solids[k] as Solid).owner;
    }
  });
  return chief;
}
