// What the engine computes for each table of published values; one entry a table, one case a quantity.
import { absorptionDbPerKm } from '@tiltwright/shared/engine/acoustics/absorption.ts';
import { freshSoundSpeedMps, seaSoundSpeedMps } from '@tiltwright/shared/engine/acoustics/sound-speed.ts';
import { lineHalfWidth, lineIntensity } from '@tiltwright/shared/engine/beams/pattern.ts';
import { plumbOffsetM } from '@tiltwright/shared/engine/frames.ts';
import { heightFromFaceM } from '@tiltwright/shared/engine/hull.ts';
import { angleOfShim, euroCoins, usCoins } from '@tiltwright/shared/engine/level.ts';
import { planingTrim } from '@tiltwright/shared/engine/trim/savitsky.ts';
import { degToRad, gravityMps2, mmToM, mToMm, radToDeg } from '@tiltwright/shared/engine/units.ts';
import { numberIn, type TruthRow } from './truth-table.ts';

export interface Truth {
  /** As the accuracy table calls it. */
  what: string;
  /** How many rows the table has, so that none gets lost. */
  rows: number;
  compute: (row: TruthRow) => number;
}

export const truths = {
  savitsky: { what: 'Planing hulls: trim, drag, wetted length', rows: 12, compute: savitsky },
  'sound-speed': { what: 'Sound speed in water', rows: 4, compute: soundSpeed },
  absorption: { what: 'Absorption of sound', rows: 5, compute: absorption },
  'line-array': { what: 'Pattern of a line element', rows: 8, compute: lineArray },
  shims: { what: 'Thickness of coins', rows: 12, compute: shims },
  angles: { what: 'Angles, plumb lines and shims', rows: 4, compute: angles },
} as const satisfies Record<string, Truth>;

function unknown(row: TruthRow): never {
  throw new Error(`nothing computes ${row.what}`);
}

function savitsky(row: TruthRow): number {
  const n = (column: string) => numberIn(row, column);
  const deadriseRad = degToRad(n('deadrise_deg'));
  const chineBeamM = n('beam_m');
  // Where friction has no arm, the centre of gravity is put at the height friction acts at.
  const vcgM = row.friction_arm === 'no' ? (chineBeamM / 4) * Math.tan(deadriseRad) : n('vcg_m');
  const hull = { massKg: n('weight_n') / gravityMps2, lcgM: n('lcg_m'), vcgM, chineBeamM, deadriseRad };
  const thrust = { armM: n('thrust_arm_m'), inclinationRad: degToRad(n('thrust_deg')) };
  const viscosityM2s = n('density_kgm3') > 1010 ? 1.19e-6 : 1.14e-6;
  const state = planingTrim(hull, thrust, n('speed_mps'), { densityKgM3: n('density_kgm3'), viscosityM2s });
  if (!state) throw new Error('no balance');
  if (row.quantity === 'trim') return radToDeg(state.trimRad);
  if (row.quantity === 'drag') return state.dragN;
  return row.quantity === 'lambda' ? state.wettedLengthRatio : unknown(row);
}

function soundSpeed(row: TruthRow): number {
  const temperatureC = numberIn(row, 'temperature_c');
  if (row.water === 'fresh') return freshSoundSpeedMps(temperatureC);
  return seaSoundSpeedMps(temperatureC, numberIn(row, 'salinity'), numberIn(row, 'depth_m'));
}

function absorption(row: TruthRow): number {
  return absorptionDbPerKm(numberIn(row, 'frequency_khz'), {
    temperatureC: numberIn(row, 'temperature_c'),
    salinity: numberIn(row, 'salinity'),
    depthM: numberIn(row, 'depth_m'),
    acidityPh: numberIn(row, 'ph'),
  });
}

function lineArray(row: TruthRow): number {
  const n = numberIn(row, 'level_db');
  if (row.function === 'half-width') return lineHalfWidth(n, row.way === 'two' ? 'two' : 'one');
  if (row.function === 'full-width') return radToDeg(2 * Math.asin(lineHalfWidth(-3, 'one') / n));
  return row.function === 'sidelobe' ? sidelobeDb(n) : unknown(row);
}

/** Highest level between the zeros n and n + 1 of the pattern, dB. */
function sidelobeDb(n: number): number {
  let highest = 0;
  for (let i = 1; i < 100_000; i++) highest = Math.max(highest, lineIntensity(n + i / 100_000));
  return 10 * Math.log10(highest);
}

function shims(row: TruthRow): number {
  return [...usCoins, ...euroCoins].find(({ id }) => id === row.piece)?.thicknessMm ?? unknown(row);
}

function angles(row: TruthRow): number {
  const a = mmToM(numberIn(row, 'a'));
  const b = numberIn(row, 'b');
  if (row.function === 'plumb') return mToMm(plumbOffsetM(a, degToRad(b)));
  if (row.function === 'shim') return radToDeg(angleOfShim(a, mmToM(b)));
  return row.function === 'face' ? mToMm(heightFromFaceM(a, b)) : unknown(row);
}
