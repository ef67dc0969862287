import * as z from 'zod';
import { envelopeFields, identityFields, remarkFields, SourcedValue, sigmasField } from './catalog-record.ts';
import { count, degrees, horsepower, kilograms, listOf, metres, millimetres, oneOf, ratio } from './field.ts';
import { hullMaterials } from './material.ts';
import { InlineTrimPoint } from './trim-point.ts';

export const hullForms = ['flat', 'shallow-v', 'modified-v', 'deep-v', 'tri-hull', 'pontoon', 'catamaran', 'other'] as const;
export type HullForm = (typeof hullForms)[number];

/** `offset:end_before_transom`, both in mm. */
export const Strake = z
  .string()
  .regex(/^\d{1,4}(\.\d+)?:\d{1,5}(\.\d+)?$/, 'reads like 420:150 (mm off centre : mm it ends ahead of the transom)');

export const hullFields = {
  ...identityFields,
  form: oneOf(hullForms, 'Form'),
  lengthM: metres(1.5, 30, 'Length', 'Length of the hull, without swim platform or motor.'),
  beamM: metres(0.5, 8, 'Beam', 'Greatest width over all.').optional(),
  chineBeamM: metres(0.3, 8, 'Chine beam', 'Width of the bottom between the chines, at the transom.').optional(),
  deadriseDeg: degrees(0, 30, 'Deadrise', 'Angle of the bottom against level, at the transom.').optional(),
  transomAngleDeg: degrees(-5, 30, 'Transom angle', 'How far the top of the transom leans aft of square to the keel line.').optional(),
  transomHeightMm: millimetres(150, 1500, 'Transom height', 'From the keel to where the motor clamps, square to the keel line.').optional(),
  transomWidthMm: millimetres(200, 5000, 'Transom width').optional(),
  keelPadMm: millimetres(0, 1500, 'Keel pad', 'Full width of the flat at the keel; 0 where the bottom is a plain vee.').optional(),
  tabChordMm: millimetres(0, 1000, 'Trim tab chord').optional(),
  tabSpanRatio: ratio(0, 1, 'Trim tab span', 'Span of both tabs together, as a share of the chine beam.').optional(),
  notchMm: millimetres(0, 1500, 'Notch', 'How far the bottom ends ahead of the transom; 0 for none.').optional(),
  steps: count(0, 5, 'Steps').optional(),
  strakes: listOf(Strake, 12, 'Strakes', 'Offset : end before the transom, mm.').optional(),
  material: oneOf(hullMaterials, 'Material').optional(),
  dryMassKg: kilograms(15, 30000, 'Dry mass').optional(),
  loadedMassKg: kilograms(30, 40000, 'Loaded mass', 'As it is really run: motor, fuel, people, gear.').optional(),
  lcgM: metres(0.1, 20, 'Centre of gravity, ahead of the transom').optional(),
  vcgM: metres(-0.5, 4, 'Centre of gravity, above the keel').optional(),
  maxPowerHp: horsepower(0, 2000, 'Greatest power').optional(),
  staticTrimDeg: degrees(-10, 10, 'Trim at rest', 'Bow up is positive.').optional(),
  ...remarkFields,
};

const { maker, model, ...restOfHull } = hullFields;
/** A hull given in a question: names may be left out, the catalog's other rules hold. */
export const InlineHull = z
  .strictObject({
    maker: maker.optional(),
    model: model.optional(),
    ...restOfHull,
    sigmas: sigmasField,
    trimPoints: z.array(InlineTrimPoint).max(200).optional(),
  })
  .meta({ id: 'InlineHull' });
export type InlineHull = z.infer<typeof InlineHull>;

export const Hull = z.strictObject({ ...envelopeFields, ...hullFields }).meta({ id: 'Hull' });
export type Hull = z.infer<typeof Hull>;
export const HullSheet = Hull.extend({ values: z.record(z.string(), SourcedValue) }).meta({ id: 'HullSheet' });
export type HullSheet = z.infer<typeof HullSheet>;
