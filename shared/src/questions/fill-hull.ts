// A hull with nothing missing.
import {
  usual,
  usualBeam,
  usualChineBeam,
  usualDeadrise,
  usualDryMass,
  usualLcg,
  usualLoadedMass,
  usualStaticTrim,
  usualTransomAngle,
  usualTransomHeight,
  usualVcg,
} from '../class-defaults.ts';
import type { Assumption } from '../schemas/answer.ts';
import { type Filled, partReader } from './filled.ts';
import type { HullPart } from './parts.ts';

export const hullQuantities = [
  'deadriseDeg',
  'transomAngleDeg',
  'transomHeightMm',
  'chineBeamM',
  'keelPadMm',
  'notchMm',
  'loadedMassKg',
  'lcgM',
  'vcgM',
  'staticTrimDeg',
] as const;
export type FilledHull = Filled<(typeof hullQuantities)[number]>;

/** `powerHp` is the greatest engine's, null without one; `loadedMassKg` is the question's own, which wins. */
export function fillHull(hull: HullPart, powerHp: number | null, loadedMassKg: number | undefined, assumptions: Assumption[]): FilledHull {
  const read = partReader(hull, 'hull', assumptions);
  const form = `Usual for a ${hull.form} hull.`;
  const deadriseDeg = read('deadriseDeg', usualDeadrise(hull.form) ?? usual(0, 0), form);
  const transomAngleDeg = read('transomAngleDeg', usualTransomAngle, form);
  const power = powerHp ?? hull.maxPowerHp ?? 60;
  const transomHeightMm = read('transomHeightMm', usualTransomHeight(power), `Usual transom for ${power} hp.`);
  const needsBeam = hull.chineBeamM === undefined || hull.vcgM === undefined;
  const beamM = needsBeam ? read('beamM', usualBeam(hull.lengthM), 'Usual beam for this length.').value : 0;
  return {
    deadriseDeg,
    transomAngleDeg,
    transomHeightMm,
    chineBeamM: read('chineBeamM', usualChineBeam(beamM), 'Usual share of the beam.'),
    keelPadMm: read('keelPadMm', usual(0, 0), 'No flat at the keel was stated.'),
    notchMm: read('notchMm', usual(0, 0), 'No notch was stated.'),
    loadedMassKg: loadedMass(hull, loadedMassKg, assumptions),
    lcgM: read('lcgM', usualLcg(hull.lengthM), 'Usual balance for this length.'),
    vcgM: read('vcgM', usualVcg(beamM), 'Usual for this beam.'),
    staticTrimDeg: read('staticTrimDeg', usualStaticTrim, 'Usual trim at rest.'),
  };
}

function loadedMass(hull: HullPart, asked: number | undefined, assumptions: Assumption[]) {
  if (asked !== undefined) return { value: asked, sigma: 0.05 * asked, basis: 'published' as const };
  const read = partReader(hull, 'hull', assumptions);
  if (hull.loadedMassKg !== undefined) return read('loadedMassKg', usual(hull.loadedMassKg), '');
  const dry = read('dryMassKg', usualDryMass(hull.form, hull.lengthM), 'Usual for this form and length.');
  const loaded = usualLoadedMass(dry.value);
  const sigma = Math.hypot(loaded.sigma, 1.25 * dry.sigma);
  return read('loadedMassKg', { value: loaded.value, sigma }, 'Hull, motor, fuel, people and gear as usual for this dry mass.');
}
