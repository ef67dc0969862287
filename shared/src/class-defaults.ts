// What boats, motors, transducers and mounts of a class usually have, in trade units: the values that stand in for what nobody stated.
// Common practice and memory, no single source; one standard deviation is 15 % unless said otherwise.
import type { HullForm } from './schemas/hull.ts';
import type { Drive } from './schemas/lower-unit.ts';

/** A usual value with one standard deviation in the same unit. */
export interface ClassDefault {
  value: number;
  sigma: number;
}

const usualSpread = 0.15;
export const usual = (value: number, sigma = Math.abs(value) * usualSpread): ClassDefault => ({ value, sigma });

/** Middles of the usual ranges of one power class; mm. */
export interface LowerUnitClass {
  /** The class as people name it, hp. */
  label: string;
  propDiameterMm: number;
  torpedoDiameterMm: number;
  torpedoLengthMm: number;
  plateAboveShaftMm: number;
  plateWidthMm: number;
  plateLengthMm: number;
  strutChordMm: number;
  strutThicknessMm: number;
  skegDepthMm: number;
  skegChordMm: number;
}

type Row = readonly [upToHp: number, label: string, ...sizesMm: number[]];

// Up to hp, label, prop Ø, torpedo Ø, torpedo L, plate above shaft, plate W, plate L, strut chord, strut thickness, skeg depth, skeg chord.
const lowerUnitRows: readonly Row[] = [
  [7, '2.5–6 hp', 192.5, 60, 265, 115, 130, 230, 85, 30, 135, 85],
  [22, '8–20 hp', 235, 72.5, 340, 142.5, 170, 305, 107.5, 38.5, 167.5, 120],
  [35, '25–30 hp', 260, 81.5, 390, 155, 190, 350, 130, 44, 182.5, 140],
  [67, '40–60 hp', 277.5, 84, 440, 167.5, 210, 385, 150, 50, 197.5, 160],
  [132, '75–115 hp', 350, 114.5, 540, 202.5, 235, 450, 185, 60, 232.5, 195],
  [212, '150–200 hp', 375, 121.5, 620, 217.5, 260, 505, 210, 68, 257.5, 220],
  [Number.POSITIVE_INFINITY, '225–300 hp', 386, 128, 700, 230, 285, 560, 235, 75, 272.5, 250],
];

/** The class a motor of this power belongs to; between two classes the nearer one. */
export function lowerUnitClass(powerHp: number): LowerUnitClass {
  const row = lowerUnitRows.find(([upToHp]) => powerHp <= upToHp) as Row;
  const [, label, ...sizes] = row;
  const at = (index: number) => sizes[index] as number;
  return {
    label,
    propDiameterMm: at(0),
    torpedoDiameterMm: at(1),
    torpedoLengthMm: at(2),
    plateAboveShaftMm: at(3),
    plateWidthMm: at(4),
    plateLengthMm: at(5),
    strutChordMm: at(6),
    strutThicknessMm: at(7),
    skegDepthMm: at(8),
    skegChordMm: at(9),
  };
}

/** Shaft lengths of the trade: 15, 20, 25 and 30 in, mm. */
export const shaftLengthsMm = [381, 508, 635, 762] as const;

/** The shaft that suits a transom: the nearest of the trade's lengths, mm. */
export function usualShaftMm(transomHeightMm: number): number {
  return shaftLengthsMm.reduce((best, next) => (Math.abs(next - transomHeightMm) < Math.abs(best - transomHeightMm) ? next : best));
}

/** Placement of the leg and its reach, mm and degrees. A sterndrive's tilt axis counts from the transom and from its plate. */
export function legPlacement(drive: Drive): Record<'swivelAftMm' | 'driveshaftAftMm' | 'tiltAxisAftMm' | 'tiltAxisAboveMm', ClassDefault> {
  const sterndrive = drive === 'sterndrive';
  return {
    swivelAftMm: usual(100, 25),
    driveshaftAftMm: usual(150, 35),
    tiltAxisAftMm: sterndrive ? usual(60) : usual(40, 25),
    tiltAxisAboveMm: sterndrive ? usual(250) : usual(15, 25),
  };
}

/** Angles of a motor's travel, degrees. */
export const motorTravel = {
  trimRefTransomDeg: usual(12, 0),
  trimMinDeg: usual(-4, 1),
  trimMaxDeg: usual(16, 2),
  tiltMaxDeg: usual(70, 4),
  steerMaxDeg: usual(30, 3),
};

export const bladeAreaRatio = usual(0.55, 0.08);
/** How far a sterndrive's plate stands below the keel line, mm. */
export const sterndrivePlateBelowKeel = usual(25, 40);

/** Deadrise and the factor k of dry mass = k × length³, by form. Forms without a vee have no deadrise of their own. */
const hullForms: Record<HullForm, { deadrise: ClassDefault | null; massFactor: number }> = {
  flat: { deadrise: usual(1, 1), massFactor: 1.8 },
  'shallow-v': { deadrise: usual(12, 2), massFactor: 2.6 },
  'modified-v': { deadrise: usual(17, 2), massFactor: 3.6 },
  'deep-v': { deadrise: usual(22, 1.5), massFactor: 4.6 },
  'tri-hull': { deadrise: usual(15, 3), massFactor: 3.6 },
  pontoon: { deadrise: null, massFactor: 2.6 },
  catamaran: { deadrise: null, massFactor: 3.6 },
  other: { deadrise: null, massFactor: 2.6 },
};

export const usualDeadrise = (form: HullForm): ClassDefault | null => hullForms[form].deadrise;
export const usualTransomAngle = usual(13, 2);
export const usualStaticTrim = usual(0.5, 0.7);
export const usualBeam = (lengthM: number): ClassDefault => usual(0.4 * lengthM);
export const usualChineBeam = (beamM: number): ClassDefault => usual(0.82 * beamM);
export const usualLcg = (lengthM: number): ClassDefault => usual(0.38 * lengthM, 0.03 * lengthM);
export const usualVcg = (beamM: number): ClassDefault => usual(0.22 * beamM, 0.1);
export const usualDryMass = (form: HullForm, lengthM: number): ClassDefault => {
  const dryKg = hullForms[form].massFactor * lengthM ** 3;
  return usual(dryKg, 0.25 * dryKg);
};
/** Loaded mass from dry mass: 1.25 × dry + 180 kg ± 12 %. */
export const usualLoadedMass = (dryMassKg: number): ClassDefault => {
  const loadedKg = 1.25 * dryMassKg + 180;
  return usual(loadedKg, 0.12 * loadedKg);
};
/** Transom height by the power it carries: 15 in to 25 hp, 20 in to 150 hp, 25 in above; mm. */
export const usualTransomHeight = (powerHp: number): ClassDefault => usual(powerHp <= 25 ? 381 : powerHp <= 150 ? 508 : 635, 15);

export const usualHousing = { housingLengthMm: usual(225), housingWidthMm: usual(52), housingHeightMm: usual(39) };
/** The radiating face as a share of the housing's length. */
export const apertureShare = 0.75;
export const usualSideBeam = {
  sideDepressionDeg: usual(22, 6),
  sideVerticalBeamDeg: usual(52, 6),
  sideAlongBeamDeg: usual(1.2, 0.4),
  sideFrequencyKhz: usual(455),
};
export const usualStandoff = usual(25, 10);
export const usualTiltRange = { tiltMinDeg: -20, tiltMaxDeg: 20 };
