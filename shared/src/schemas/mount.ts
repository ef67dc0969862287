import * as z from 'zod';
import { envelopeFields, identityFields, remarkFields, SourcedValue, sigmasField } from './catalog-record.ts';
import { degrees, knots, listOf, millimetres, oneOf } from './field.ts';
import { hullMaterials } from './material.ts';

export const mountKinds = [
  'transom-bracket',
  'kick-up-bracket',
  'transom-board',
  'through-hull',
  'in-hull',
  'pole',
  'sensor-jack',
  'bow-motor',
] as const;
export type MountKind = (typeof mountKinds)[number];

export const mountFields = {
  ...identityFields,
  kind: oneOf(mountKinds, 'Kind'),
  tiltMinDeg: degrees(-90, 90, 'Least tilt on the scale').optional(),
  tiltMaxDeg: degrees(-90, 90, 'Greatest tilt on the scale').optional(),
  tiltZeroDeg: degrees(
    -45,
    45,
    'Zero of the scale',
    'How far nose-up from square to the transom face the axis stands when the scale reads 0.',
  ).optional(),
  tiltStepDeg: degrees(0, 45, 'Step of the scale').optional(),
  rollMinDeg: degrees(-90, 90, 'Least roll').optional(),
  rollMaxDeg: degrees(-90, 90, 'Greatest roll').optional(),
  heightMinMm: millimetres(-1000, 1000, 'Least height').optional(),
  heightMaxMm: millimetres(-1000, 2000, 'Greatest height').optional(),
  standoffMm: millimetres(0, 1500, 'Standoff', 'From the transom face to the housing’s leading edge, without any board.').optional(),
  boardThicknessMm: millimetres(0, 200, 'Board thickness').optional(),
  plateWidthMm: millimetres(0, 1500, 'Plate width').optional(),
  plateHeightMm: millimetres(0, 1500, 'Plate height').optional(),
  maxSpeedKn: knots(0, 120, 'Greatest speed').optional(),
  hullMaterials: listOf(oneOf(hullMaterials, 'Material'), 8, 'Hull materials').optional(),
  deadriseMinDeg: degrees(0, 30, 'Least deadrise').optional(),
  deadriseMaxDeg: degrees(0, 30, 'Greatest deadrise').optional(),
  housingLengthMaxMm: millimetres(20, 1200, 'Longest housing').optional(),
  housingWidthMaxMm: millimetres(10, 600, 'Widest housing').optional(),
  ...remarkFields,
};

const { maker, model, ...restOfMount } = mountFields;
export const InlineMount = z
  .strictObject({ maker: maker.optional(), model: model.optional(), ...restOfMount, sigmas: sigmasField })
  .meta({ id: 'InlineMount' });
export type InlineMount = z.infer<typeof InlineMount>;

export const Mount = z.strictObject({ ...envelopeFields, ...mountFields }).meta({ id: 'Mount' });
export type Mount = z.infer<typeof Mount>;
export const MountSheet = Mount.extend({ values: z.record(z.string(), SourcedValue) }).meta({ id: 'MountSheet' });
export type MountSheet = z.infer<typeof MountSheet>;
