// The whole check: one question, one answer. See openapi for the words of every field.
import * as z from 'zod';
import { answerFields, ClearanceAnswer, CodedText, RuleOutcome, TiltAnswer, TrimAnswer } from './answer.ts';
import { InlineHull } from './hull.ts';
import { InlineLowerUnit, rotations } from './lower-unit.ts';
import { InlineMount } from './mount.ts';
import { InlineTransducer } from './transducer.ts';

/** A catalog id, e.g. hul_…; whether it exists is the catalog's to say. */
export const PartId = z.string().min(1).max(80).describe('Id of a catalog record.');
/** A caller's own mark on a question, echoed in its answer. */
export const Ref = z.string().max(200).describe('Echoed in the answer.');

export const waters = ['fresh', 'sea'] as const;
export const wantedSides = ['both', 'port', 'starboard'] as const;
export type WantedSides = (typeof wantedSides)[number];

export const engineFields = {
  offsetMm: z.number().min(-5000).max(5000).default(0).describe('Off the centreline, starboard positive.'),
  setbackMm: z.number().min(0).max(1500).default(0).describe('How far a jack plate or bracket sets the engine aft.'),
  raiseMm: z.number().min(-500).max(800).default(0).describe('How far the engine is raised along the transom.'),
  motorTrimDeg: z
    .number()
    .min(-30)
    .max(110)
    .default(0)
    .describe('0 with the prop shaft parallel to the keel line; swinging aft and up is positive.'),
  steerDeg: z.number().min(-180).max(180).default(0).describe('Positive moves the nose of the lower unit to starboard.'),
};

export const FitEngine = z
  .strictObject({ lowerUnit: z.union([PartId, InlineLowerUnit]), ...engineFields, rotation: z.enum(rotations).optional() })
  .meta({ id: 'FitEngine' });

export const placementFields = {
  offsetMm: z.number().min(-5000).max(5000).describe('Of the sensor off the centreline, starboard positive.'),
  dropMm: z.number().min(-1500).max(1500).describe('Lower leading edge below the local bottom.'),
  standoffMm: z.number().min(0).max(2000).optional().describe('Transom face (or board) to leading edge; the mount’s, else 25.'),
  boardMm: z.number().min(0).max(300).default(0).describe('Thickness of a transom board; added to the standoff.'),
  forwardMm: z.number().min(-3000).max(30000).optional().describe('Ahead of the transom; for through-hull, in-hull, pole and bow mounts.'),
  localBottomMm: z
    .number()
    .min(-1500)
    .max(1500)
    .optional()
    .describe('Bottom at the sensor below the keel line; needed on pontoons, catamarans and stepped hulls, where no vee tells it.'),
  rollDeg: z.number().min(-180).max(180).default(0),
  yawDeg: z.number().min(-180).max(180).default(0),
  tiltDeg: z.number().min(-60).max(60).optional().describe('Set tilt against the keel line, nose-up positive; left out, the needed one.'),
  bracketSettingDeg: z.number().min(-90).max(90).optional().describe('Set tilt on the bracket’s own scale, in place of tiltDeg.'),
};

export const runningFields = {
  speedKn: z.number().min(0).max(100).describe('Through the water.'),
  loadedMassKg: z.number().min(30).max(40000).optional(),
  measuredTrimDeg: z.number().min(-10).max(20).optional().describe('The boat’s own running trim, measured at this speed.'),
  measuredSigmaDeg: z.number().min(0).max(10).optional(),
  water: z.enum(waters).default('fresh'),
};

export const FitObstacle = z
  .strictObject({
    label: z.string().trim().min(1).max(60),
    xMm: z.number().min(-5000).max(30000),
    yMm: z.number().min(-5000).max(5000),
    zMm: z.number().min(-3000).max(3000),
    lengthMm: z.number().positive().max(10000),
    widthMm: z.number().positive().max(10000),
    heightMm: z.number().positive().max(10000),
  })
  .describe('A box in the boat frame, by its middle: +x forward, +y starboard, +z down.')
  .meta({ id: 'FitObstacle' });

export const FitQuestion = z
  .strictObject({
    ref: Ref.optional(),
    hull: z.union([PartId, InlineHull]),
    lowerUnits: z.array(FitEngine).max(6),
    transducer: z.union([PartId, InlineTransducer]),
    mount: z.union([PartId, InlineMount]).optional(),
    placement: z.strictObject(placementFields).refine((p) => p.tiltDeg === undefined || p.bracketSettingDeg === undefined, {
      path: ['bracketSettingDeg'],
      message: 'give tiltDeg or bracketSettingDeg, not both',
    }),
    running: z.strictObject(runningFields),
    alsoAt: z
      .array(
        z.strictObject({
          label: z.string().trim().min(1).max(60),
          speedKn: z.number().min(0).max(100),
          motorTrimDeg: z.number().min(-30).max(110).optional(),
        }),
      )
      .max(8)
      .optional(),
    obstacles: z.array(FitObstacle).max(20).optional(),
    wanted: z.enum(wantedSides).default('both'),
    target: z.strictObject({ attitudeDeg: z.number().min(-45).max(45) }),
    uncertainty: z.enum(['sampled', 'none']).optional().describe('Single questions default to sampled, batch lines to none.'),
  })
  .meta({ id: 'FitQuestion' });
/** As a caller writes it: defaults may be left out. */
export type FitQuestionInput = z.input<typeof FitQuestion>;
/** As the product works with it: defaults filled in. */
export type FitQuestion = z.infer<typeof FitQuestion>;

export const verdicts = ['fits', 'fits-with-care', 'does-not-fit', 'cannot-tell'] as const;
export type Verdict = (typeof verdicts)[number];
export const actions = ['leave', 're-tilt', 'trim-motor-up', 'move', 'add-wedge', 'measure-first', 'choose-another-mount'] as const;
export type Action = (typeof actions)[number];

export const FitAnswer = z
  .strictObject({
    ref: Ref.optional(),
    verdict: z.enum(verdicts),
    reasons: z.array(CodedText),
    action: z.strictObject({ code: z.enum(actions), text: z.string() }),
    compatibility: z.array(RuleOutcome),
    trim: TrimAnswer,
    tilt: TiltAnswer,
    clearance: ClearanceAnswer,
    flow: z.array(RuleOutcome),
    states: z.array(z.strictObject({ label: z.string(), trim: TrimAnswer, attitudeDeg: z.number(), clearance: ClearanceAnswer })),
    dominantInput: z.strictObject({ name: z.string(), shareOfVariance: z.number() }).nullable(),
    nextMeasurement: z
      .strictObject({ name: z.string(), how: z.string(), interval90DegAfter: z.tuple([z.number(), z.number()]) })
      .nullable(),
    ...answerFields,
    answerDigest: z.string().describe('SHA-256 of what the answer says; equal digests mean nothing changed.'),
  })
  .meta({ id: 'FitAnswer' });
export type FitAnswer = z.infer<typeof FitAnswer>;
