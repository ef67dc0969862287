import * as z from 'zod';
import { envelopeFields, identityFields, remarkFields, SourcedValue, sigmasField } from './catalog-record.ts';
import { decibels, degrees, kilohertz, knots, listOf, millimetres, oneOf } from './field.ts';
import { mountKinds } from './mount.ts';

export const elementKinds = ['side', 'down', 'cone'] as const;
export type ElementKind = (typeof elementKinds)[number];
export const beamLevelWays = ['one', 'two'] as const;

export const transducerFields = {
  ...identityFields,
  housingLengthMm: millimetres(30, 900, 'Housing length', 'Along the boat.').optional(),
  housingWidthMm: millimetres(10, 400, 'Housing width').optional(),
  housingHeightMm: millimetres(5, 300, 'Housing height').optional(),
  kinds: listOf(oneOf(elementKinds, 'Element'), 3, 'Elements'),
  sideFrequencyKhz: kilohertz(20, 3000, 'Side frequency').optional(),
  sideDepressionDeg: degrees(0, 90, 'Side axis depression', 'How far the middle of the side beam points below level.').optional(),
  sideVerticalBeamDeg: degrees(1, 170, 'Side beam, vertical width').optional(),
  sideAlongBeamDeg: degrees(0.05, 20, 'Side beam, along the track').optional(),
  sideApertureMm: millimetres(10, 900, 'Side aperture', 'Length of the radiating face.').optional(),
  beamLevelDb: decibels(-20, -1, 'Beam level', 'Level at which the widths are stated; −3 where blank.').optional(),
  beamLevelWay: oneOf(beamLevelWays, 'Beam level, way', 'One way or two; one where blank.').optional(),
  downFrequencyKhz: kilohertz(20, 3000, 'Down frequency').optional(),
  downAlongBeamDeg: degrees(0.05, 90, 'Down beam, along').optional(),
  downAcrossBeamDeg: degrees(0.05, 170, 'Down beam, across').optional(),
  coneBeamDeg: degrees(1, 120, 'Cone width').optional(),
  mountKinds: listOf(oneOf(mountKinds, 'Mount'), 8, 'Mounts it can use').optional(),
  maxSpeedKn: knots(0, 120, 'Greatest speed').optional(),
  ...remarkFields,
};

const { maker, model, ...restOfTransducer } = transducerFields;
export const InlineTransducer = z
  .strictObject({ maker: maker.optional(), model: model.optional(), ...restOfTransducer, sigmas: sigmasField })
  .meta({ id: 'InlineTransducer' });
export type InlineTransducer = z.infer<typeof InlineTransducer>;

export const Transducer = z.strictObject({ ...envelopeFields, ...transducerFields }).meta({ id: 'Transducer' });
export type Transducer = z.infer<typeof Transducer>;
export const TransducerSheet = Transducer.extend({ values: z.record(z.string(), SourcedValue) }).meta({ id: 'TransducerSheet' });
export type TransducerSheet = z.infer<typeof TransducerSheet>;
