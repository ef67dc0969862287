// A lower unit with nothing missing.
import {
  bladeAreaRatio,
  legPlacement,
  lowerUnitClass,
  motorTravel,
  sterndrivePlateBelowKeel,
  usual,
  usualShaftMm,
} from '../class-defaults.ts';
import type { Assumption } from '../schemas/answer.ts';
import { type Filled, partReader } from './filled.ts';
import type { LowerUnitPart } from './parts.ts';

export const lowerUnitQuantities = [
  'shaftLengthMm',
  'plateBelowKeelMm',
  'propDiameterMm',
  'propAxialMm',
  'propAftMm',
  'bladeAreaRatio',
  'torpedoDiameterMm',
  'torpedoLengthMm',
  'torpedoNoseForwardMm',
  'plateAboveShaftMm',
  'plateLengthMm',
  'plateWidthMm',
  'plateThicknessMm',
  'plateForwardMm',
  'strutChordMm',
  'strutThicknessMm',
  'legChordMm',
  'legThicknessMm',
  'skegDepthMm',
  'skegChordMm',
  'skegThicknessMm',
  'skegAftMm',
  'swivelAftMm',
  'driveshaftAftMm',
  'tiltAxisAftMm',
  'tiltAxisAboveMm',
  'trimRefTransomDeg',
  'trimMinDeg',
  'trimMaxDeg',
  'tiltMaxDeg',
  'steerMaxDeg',
] as const;
export type FilledLowerUnit = Filled<(typeof lowerUnitQuantities)[number]>;

const unused = { value: 0, sigma: 0, basis: 'class' } as const;

/** `index` counts engines from 0; the shaft defaults to the one that suits the transom. */
export function fillLowerUnit(unit: LowerUnitPart, index: number, transomHeightMm: number, assumptions: Assumption[]): FilledLowerUnit {
  const read = partReader(unit, `lowerUnits.${index}`, assumptions);
  const sizes = lowerUnitClass(unit.powerHp);
  const why = `Usual for ${sizes.label} motors.`;
  const size = (field: Exclude<keyof typeof sizes, 'label'>) => read(field, usual(sizes[field]), why);
  const sterndrive = unit.drive === 'sterndrive';
  const propDiameterMm = size('propDiameterMm');
  const torpedoLengthMm = size('torpedoLengthMm');
  const plateLengthMm = size('plateLengthMm');
  const strutChordMm = size('strutChordMm');
  const strutThicknessMm = size('strutThicknessMm');
  const skegChordMm = size('skegChordMm');
  const placement = legPlacement(unit.drive);
  const shaft = () => read('shaftLengthMm', usual(usualShaftMm(transomHeightMm), 10), 'The shaft that suits this transom.');
  const ofTorpedo = 'Usual share of the torpedo length.';
  return {
    shaftLengthMm: sterndrive ? unused : shaft(),
    plateBelowKeelMm: sterndrive ? read('plateBelowKeelMm', sterndrivePlateBelowKeel, 'Usual for sterndrives.') : unused,
    propDiameterMm,
    propAxialMm: read('propAxialMm', usual(0.24 * propDiameterMm.value), 'Usual share of the propeller diameter.'),
    propAftMm: read('propAftMm', usual(0.48 * torpedoLengthMm.value), ofTorpedo),
    bladeAreaRatio: read('bladeAreaRatio', bladeAreaRatio, 'Usual for three blades.'),
    torpedoDiameterMm: size('torpedoDiameterMm'),
    torpedoLengthMm,
    torpedoNoseForwardMm: read('torpedoNoseForwardMm', usual(0.42 * torpedoLengthMm.value), ofTorpedo),
    plateAboveShaftMm: size('plateAboveShaftMm'),
    plateLengthMm,
    plateWidthMm: size('plateWidthMm'),
    plateThicknessMm: read('plateThicknessMm', usual(8), why),
    plateForwardMm: read('plateForwardMm', usual(0.35 * plateLengthMm.value), 'Usual share of the plate length.'),
    strutChordMm,
    strutThicknessMm,
    legChordMm: read('legChordMm', usual(1.15 * strutChordMm.value), 'Usual against the strut.'),
    legThicknessMm: read('legThicknessMm', usual(1.6 * strutThicknessMm.value), 'Usual against the strut.'),
    skegDepthMm: size('skegDepthMm'),
    skegChordMm,
    skegThicknessMm: read('skegThicknessMm', usual(12), why),
    skegAftMm: read('skegAftMm', usual(0.1 * skegChordMm.value), 'Usual share of the skeg chord.'),
    swivelAftMm: read('swivelAftMm', placement.swivelAftMm, why),
    driveshaftAftMm: read('driveshaftAftMm', placement.driveshaftAftMm, why),
    tiltAxisAftMm: read('tiltAxisAftMm', placement.tiltAxisAftMm, why),
    tiltAxisAboveMm: read('tiltAxisAboveMm', placement.tiltAxisAboveMm, why),
    trimRefTransomDeg: read('trimRefTransomDeg', motorTravel.trimRefTransomDeg, 'Trim limits are usually stated for this transom angle.'),
    trimMinDeg: read('trimMinDeg', motorTravel.trimMinDeg, why),
    trimMaxDeg: read('trimMaxDeg', motorTravel.trimMaxDeg, why),
    tiltMaxDeg: read('tiltMaxDeg', motorTravel.tiltMaxDeg, why),
    steerMaxDeg: read('steerMaxDeg', motorTravel.steerMaxDeg, why),
  };
}
