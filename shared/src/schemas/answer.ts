// What every computed answer says about itself, and the pieces that /tilt, /clearance and /fits share.
import * as z from 'zod';
import { Basis } from './catalog-record.ts';

export const trimBases = ['yours', 'measured', 'blended', 'estimated', 'class'] as const;
export type TrimBasis = (typeof trimBases)[number];

export const TrimAnswer = z
  .strictObject({
    valueDeg: z.number().describe('Running trim, bow up positive.'),
    sigmaDeg: z.number().nonnegative(),
    basis: z.enum(trimBases),
    flags: z.array(z.string()),
  })
  .meta({ id: 'TrimAnswer' });
export type TrimAnswer = z.infer<typeof TrimAnswer>;

const interval = z.tuple([z.number(), z.number()]);

export const TiltAnswer = z
  .strictObject({
    neededDeg: z.number().describe('Tilt against the keel line that gives the wanted attitude; nose-up (heel-down) positive.'),
    interval90Deg: interval.nullable(),
    setDeg: z.number().describe('Tilt the answer was computed with: the given one, or the needed one.'),
    attitudeDeg: z.number().describe('Attitude in the water at the set tilt.'),
    bracketSettingDeg: z.number().nullable().describe('The needed tilt on the bracket’s own scale; null without a mount on the transom.'),
    inBracketRange: z.boolean().nullable(),
    wedgeDeg: z
      .number()
      .nullable()
      .describe('Wedge that brings the needed tilt into range: above 0 turns the sensor nose-up; 0 where none is needed.'),
    shimMmPer100: z.number().nonnegative().nullable().describe('Thickness of that wedge, mm per 100 mm of base.'),
  })
  .meta({ id: 'TiltAnswer' });
export type TiltAnswer = z.infer<typeof TiltAnswer>;

export const parts = ['torpedo', 'strut', 'leg', 'plate', 'skeg', 'propeller', 'obstacle', 'hull'] as const;
export type Part = (typeof parts)[number];

export const Sector = z
  .strictObject({
    fromDeg: z.number().describe('Depression in the sensor frame.'),
    toDeg: z.number(),
    share: z.number().describe('Share of the side’s whole pattern weight that lies in this sector.'),
    kind: z.enum(['hidden', 'thinned']),
    by: z.strictObject({
      unit: z.int().nullable().describe('Place of the engine in lowerUnits, from 0; null for an obstacle or the hull.'),
      part: z.enum(parts),
      label: z.string().optional().describe('Label of the obstacle.'),
    }),
  })
  .meta({ id: 'Sector' });
export type Sector = z.infer<typeof Sector>;

export const SideAnswer = z
  .strictObject({
    verdict: z.enum(['clear', 'shaded', 'blocked']),
    clearShare: z.number().min(0).max(1),
    probabilityClear: z.number().min(0).max(1).nullable(),
    sectors: z.array(Sector),
    leastClearanceMm: z
      .number()
      .nullable()
      .describe('Smallest distance of the beam to any part but the hull within 5 m; 0 where something is hit; null where nothing is near.'),
    diffractionMarginMm: z
      .number()
      .nullable()
      .describe('Clearance below which the edge of the beam is still disturbed, at the nearest part.'),
  })
  .meta({ id: 'SideAnswer' });
export type SideAnswer = z.infer<typeof SideAnswer>;

export const ClearanceAnswer = z
  .strictObject({
    port: SideAnswer.nullable(),
    starboard: SideAnswer.nullable(),
    tiltWindowDeg: interval.nullable().describe('Tilts around the set one at which both sides are clear.'),
    nearestClearTiltDeg: z.number().nullable(),
  })
  .meta({ id: 'ClearanceAnswer' });
export type ClearanceAnswer = z.infer<typeof ClearanceAnswer>;

export const Assumption = z
  .strictObject({
    field: z.string().describe('Where the value was missing, e.g. hull.deadriseDeg or lowerUnits.0.swivelAftMm.'),
    value: z.union([z.number(), z.string()]),
    sigma: z.number().nonnegative().nullable(),
    why: z.string(),
  })
  .meta({ id: 'Assumption' });
export type Assumption = z.infer<typeof Assumption>;

export const CodedText = z.strictObject({ code: z.string(), text: z.string() }).meta({ id: 'CodedText' });
export type CodedText = z.infer<typeof CodedText>;

export const RuleOutcome = z
  .strictObject({
    rule: z.string(),
    outcome: z.enum(['ok', 'caution', 'no', 'unknown']),
    text: z.string(),
    basis: z.union([Basis, z.string()]),
  })
  .meta({ id: 'RuleOutcome' });
export type RuleOutcome = z.infer<typeof RuleOutcome>;

/** Stands on every computed answer. */
export const answerFields = {
  assumptions: z.array(Assumption),
  cautions: z.array(CodedText),
  engineVersion: z.string(),
  edition: z.int().nonnegative(),
};
