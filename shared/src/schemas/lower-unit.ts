import * as z from 'zod';
import { envelopeFields, identityFields, remarkFields, SourcedValue, sigmasField } from './catalog-record.ts';
import { degrees, horsepower, millimetres, oneOf, ratio } from './field.ts';

export const drives = ['outboard', 'sterndrive', 'kicker', 'electric'] as const;
export type Drive = (typeof drives)[number];
export const rotations = ['right', 'left', 'dual'] as const;
export type Rotation = (typeof rotations)[number];

export const lowerUnitFields = {
  ...identityFields,
  drive: oneOf(drives, 'Drive'),
  powerHp: horsepower(0.1, 1000, 'Power'),
  shaftLengthMm: millimetres(
    200,
    1100,
    'Shaft length',
    'From the clamp to the anti-ventilation plate: 381, 508, 635 or 762 mm for 15, 20, 25 or 30 in.',
  ).optional(),
  plateBelowKeelMm: millimetres(
    -300,
    600,
    'Plate below keel',
    'Sterndrive only: how far the anti-ventilation plate stands below the keel line.',
  ).optional(),
  rotation: oneOf(rotations, 'Rotation', 'Seen from astern, going ahead.').optional(),
  propDiameterMm: millimetres(80, 700, 'Propeller diameter').optional(),
  propAxialMm: millimetres(5, 400, 'Propeller depth along the shaft').optional(),
  propAftMm: millimetres(0, 900, 'Propeller aft', 'Its middle, aft of the driveshaft axis.').optional(),
  bladeAreaRatio: ratio(0.05, 1, 'Blade area ratio').optional(),
  torpedoDiameterMm: millimetres(20, 400, 'Torpedo diameter').optional(),
  torpedoLengthMm: millimetres(80, 1600, 'Torpedo length').optional(),
  torpedoNoseForwardMm: millimetres(0, 1000, 'Torpedo nose forward', 'Of the driveshaft axis.').optional(),
  plateAboveShaftMm: millimetres(30, 600, 'Plate above shaft', 'Anti-ventilation plate above the prop-shaft line.').optional(),
  plateLengthMm: millimetres(50, 1200, 'Plate length').optional(),
  plateWidthMm: millimetres(30, 800, 'Plate width').optional(),
  plateThicknessMm: millimetres(1, 60, 'Plate thickness').optional(),
  plateForwardMm: millimetres(-300, 800, 'Plate forward', 'Its leading edge, ahead of the driveshaft axis.').optional(),
  strutChordMm: millimetres(20, 600, 'Strut chord').optional(),
  strutThicknessMm: millimetres(8, 250, 'Strut thickness').optional(),
  legChordMm: millimetres(20, 800, 'Leg chord').optional(),
  legThicknessMm: millimetres(8, 400, 'Leg thickness').optional(),
  skegDepthMm: millimetres(0, 700, 'Skeg depth', 'Its lower edge below the prop-shaft line.').optional(),
  skegChordMm: millimetres(5, 700, 'Skeg chord').optional(),
  skegThicknessMm: millimetres(1, 60, 'Skeg thickness').optional(),
  skegAftMm: millimetres(-400, 600, 'Skeg aft', 'Its middle, aft of the driveshaft axis.').optional(),
  swivelAftMm: millimetres(-50, 500, 'Swivel axis aft', 'Of the clamp point.').optional(),
  driveshaftAftMm: millimetres(-50, 700, 'Driveshaft aft', 'Of the clamp point.').optional(),
  tiltAxisAftMm: millimetres(-200, 500, 'Tilt axis aft', 'Of the clamp point.').optional(),
  tiltAxisAboveMm: millimetres(-300, 500, 'Tilt axis above', 'The clamp point.').optional(),
  trimRefTransomDeg: degrees(-5, 30, 'Trim reference', 'Transom angle at which the trim limits are stated.').optional(),
  trimMinDeg: degrees(-30, 10, 'Least trim').optional(),
  trimMaxDeg: degrees(-5, 60, 'Greatest trim under power').optional(),
  tiltMaxDeg: degrees(0, 110, 'Full tilt').optional(),
  steerMaxDeg: degrees(0, 180, 'Greatest steering angle').optional(),
  ...remarkFields,
};

const { maker, model, ...restOfLowerUnit } = lowerUnitFields;
export const InlineLowerUnit = z
  .strictObject({ maker: maker.optional(), model: model.optional(), ...restOfLowerUnit, sigmas: sigmasField })
  .meta({ id: 'InlineLowerUnit' });
export type InlineLowerUnit = z.infer<typeof InlineLowerUnit>;

export const LowerUnit = z.strictObject({ ...envelopeFields, ...lowerUnitFields }).meta({ id: 'LowerUnit' });
export type LowerUnit = z.infer<typeof LowerUnit>;
export const LowerUnitSheet = LowerUnit.extend({ values: z.record(z.string(), SourcedValue) }).meta({ id: 'LowerUnitSheet' });
export type LowerUnitSheet = z.infer<typeof LowerUnitSheet>;
