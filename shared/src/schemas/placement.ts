// Where a sensor could go: the best three places and the whole map.
import * as z from 'zod';
import { answerFields } from './answer.ts';
import { engineFields, FitEngine, FitObstacle, PartId, placementFields, Ref, runningFields, wantedSides } from './fit.ts';
import { InlineHull } from './hull.ts';
import { InlineMount } from './mount.ts';
import { InlineTransducer } from './transducer.ts';

const { standoffMm, boardMm, localBottomMm, rollDeg, yawDeg } = placementFields;
const offset = engineFields.offsetMm.unwrap();
const hole = z.strictObject({ offsetMm: offset, dropMm: placementFields.dropMm });

export const PlacementQuestion = z
  .strictObject({
    ref: Ref.optional(),
    hull: z.union([PartId, InlineHull]),
    lowerUnits: z.array(FitEngine).max(6),
    transducer: z.union([PartId, InlineTransducer]),
    mount: z.union([PartId, InlineMount]).optional(),
    placement: z.strictObject({ standoffMm, boardMm, localBottomMm, rollDeg, yawDeg }).prefault({}),
    running: z.strictObject(runningFields),
    obstacles: z.array(FitObstacle).max(20).optional(),
    wanted: z.enum(wantedSides).default('both'),
    target: z.strictObject({ attitudeDeg: z.number().min(-45).max(45) }),
    holes: z.array(hole).min(1).max(40).optional().describe('Only these places: holes that are there already.'),
    board: z
      .strictObject({ fromOffsetMm: offset, toOffsetMm: offset })
      .optional()
      .describe('Only along this board, from port to starboard.'),
    mounted: hole
      .extend({ tiltDeg: z.number().min(-60).max(60) })
      .optional()
      .describe('What is there now: less change ranks higher.'),
  })
  .meta({ id: 'PlacementQuestion' });
export type PlacementQuestion = z.infer<typeof PlacementQuestion>;

const place = z.strictObject({
  offsetMm: z.number(),
  dropMm: z.number(),
  tiltDeg: z.number(),
  clearShare: z.strictObject({ port: z.number(), starboard: z.number() }),
  bracketSettingDeg: z.number().nullable(),
  wedgeDeg: z.number().nullable(),
  flowCautions: z.array(z.string()).describe('Rules of the water flow that call for care here.'),
  tolerance: z.int().describe('How many of the four neighbouring tilts and offsets are clear too.'),
  passes: z.boolean().describe('Whether the wanted sides are clear here.'),
});

export const PlacementReply = z
  .strictObject({
    ref: Ref.optional(),
    best: z.array(place).max(3),
    map: z.strictObject({
      offsetsMm: z.array(z.number()),
      dropsMm: z.array(z.number()),
      tiltsDeg: z.array(z.number()),
      port: z.array(z.number()).describe('Clear share by place: offset slowest, tilt fastest.'),
      starboard: z.array(z.number()),
    }),
    neededTiltDeg: z.number(),
    ...answerFields,
  })
  .meta({ id: 'PlacementReply' });
export type PlacementReply = z.infer<typeof PlacementReply>;
