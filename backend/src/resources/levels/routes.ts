import { LevelQuestion, LevelReply } from '@tiltwright/shared/schemas/level.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { answerLevel } from './answer-level.ts';

export function levelRoutes(): Route[] {
  return [
    route(
      {
        id: 'askLevel',
        method: 'post',
        path: '/levels',
        tag: 'Questions',
        summary: 'The running angle from a level and shims, and the stack for an angle',
        description:
          'The angle of a run has its shim for sine and the level’s length for radius; of several runs the median counts, less what the level reads with the keel level.',
        may: 'fit.compute',
        body: LevelQuestion,
        bodyExample: {
          readings: {
            runs: [
              { shimMm: 42, contactLengthMm: 600 },
              { shimMm: 45, contactLengthMm: 600 },
              { shimMm: 43, contactLengthMm: 600 },
            ],
            trailerReadingDeg: 0.4,
            bothDirections: true,
          },
          stackFor: { angleDeg: 4, contactLengthMm: 600, coins: 'euro' },
        },
        reply: { status: 200, description: 'The angle and the stacks.', schema: LevelReply },
        cache: noStore,
      },
      ({ body }) => answerLevel(body),
    ),
  ];
}
