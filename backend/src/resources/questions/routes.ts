import { ClearanceQuestion, ClearanceReply, clearanceFields } from '@tiltwright/shared/schemas/clearance.ts';
import { FitAnswer, FitQuestion, PartId, Ref } from '@tiltwright/shared/schemas/fit.ts';
import { PlacementQuestion, PlacementReply } from '@tiltwright/shared/schemas/placement.ts';
import { TiltQuestion, TiltReply, tiltFields } from '@tiltwright/shared/schemas/tilt.ts';
import type { Response } from 'express';
import * as z from 'zod';
import type { Deps } from '../../deps.ts';
import { noStore, type Route, revalidate, route } from '../../http/operation.ts';
import { askClearance, askTilt, fitJob, placementsJob } from './answer-questions.ts';
import { clearanceExample, fitExample, placementsExample, tiltExample } from './examples.ts';

const tag = 'Questions';
const may = 'fit.compute';
const problems = ['unknown-part'] as const;

export function questionRoutes({ parts, pool }: Deps): Route[] {
  return [
    route(
      {
        id: 'getTilt',
        method: 'get',
        path: '/tilt',
        tag,
        summary: 'The tilt a hull of the catalog needs at a speed',
        description:
          'Needed tilt = wanted attitude − running trim. Nose-up (heel-down) is positive. With `mount`, also the setting on its scale.',
        may,
        query: z.strictObject({ hull: PartId, mount: PartId.optional(), lowerUnit: PartId.optional(), ref: Ref.optional(), ...tiltFields }),
        reply: { status: 200, description: 'Trim and tilt.', schema: TiltReply },
        problems,
        byEdition: true,
        cache: revalidate,
      },
      ({ query }) => askTilt(parts, query),
    ),
    route(
      {
        id: 'askTilt',
        method: 'post',
        path: '/tilt',
        tag,
        summary: 'The tilt a hull needs at a speed, parts inline or by id',
        may,
        body: TiltQuestion,
        bodyExample: tiltExample,
        reply: { status: 200, description: 'Trim and tilt.', schema: TiltReply },
        problems,
        cache: noStore,
      },
      ({ body }) => askTilt(parts, body),
    ),
    route(
      {
        id: 'getClearance',
        method: 'get',
        path: '/clearance',
        tag,
        summary: 'What the lower unit hides from each side, by catalog ids',
        may,
        query: z.strictObject({
          hull: PartId,
          lowerUnit: PartId.optional(),
          transducer: PartId,
          mount: PartId.optional(),
          ref: Ref.optional(),
          ...clearanceFields,
        }),
        reply: { status: 200, description: 'Both sides.', schema: ClearanceReply },
        problems,
        byEdition: true,
        cache: revalidate,
      },
      ({ query }) => askClearance(parts, query),
    ),
    route(
      {
        id: 'askClearance',
        method: 'post',
        path: '/clearance',
        tag,
        summary: 'What the lower unit hides from each side, parts inline or by id',
        may,
        body: ClearanceQuestion,
        bodyExample: clearanceExample,
        reply: { status: 200, description: 'Both sides.', schema: ClearanceReply },
        problems,
        cache: noStore,
      },
      ({ body }) => askClearance(parts, body),
    ),
    route(
      {
        id: 'askFit',
        method: 'post',
        path: '/fits',
        tag,
        summary: 'The whole check of one fit',
        description:
          'Trim at the speed, the tilt it needs, what each side can see and what hides it, and what to do. A part is a catalog id or an inline record; missing values fall back to class defaults, named in `assumptions`. An estimate, not an approval; not for navigation.',
        may,
        body: FitQuestion,
        bodyExample: fitExample,
        reply: { status: 200, description: 'The answer.', schema: FitAnswer },
        problems,
        cost: 2,
        moreCost: { of: ({ body }) => (body.uncertainty === 'none' ? 0 : 18), words: '18 more with sampled uncertainty' },
        cache: noStore,
      },
      async ({ body, res }) => sendText(res, await pool.answer([fitJob(parts, body)])),
    ),
    route(
      {
        id: 'askPlacements',
        method: 'post',
        path: '/placements',
        tag,
        summary: 'Where on the transom it could go',
        description:
          'The best three distinct places and the whole map of offsets, drops and tilts; only among existing holes or along a board where these are given, and by least change where something is mounted already. An estimate, not an approval; not for navigation.',
        may,
        body: PlacementQuestion,
        bodyExample: placementsExample,
        reply: { status: 200, description: 'The places.', schema: PlacementReply },
        problems,
        cost: 100,
        cache: noStore,
      },
      async ({ body, res }) => sendText(res, await pool.answer([placementsJob(parts, body)])),
    ),
  ];
}

/** The pool answers in JSON already. */
function sendText(res: Response, [text]: string[]): undefined {
  res.type('json').send(text);
}
