import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { BatchAnswerLine, BatchQuestionLine, mostBatchLines } from '@tiltwright/shared/schemas/batch.ts';
import { actorId } from '../../auth/actor.ts';
import type { Deps } from '../../deps.ts';
import { ApiProblem } from '../../errors.ts';
import { type Route, route } from '../../http/operation.ts';
import { problemBody, translate } from '../../http/problem.ts';
import { parseBody } from '../../http/validate.ts';
import { answerBatch, plainUnits, sampledUnits } from './answer-batch.ts';
import { batchExample } from './examples.ts';
import { readLines } from './read-lines.ts';

const ndjson = 'application/x-ndjson';
/** A question with every part inline has some 4 KB; the first line may hold a shop's whole shelf. */
const longestLineBytes = 65_536;
const longestFirstLineBytes = 8_388_608;
const batchesAtOnce = 2;

export function batchRoutes({ parts, pool, limits }: Deps): Route[] {
  const running = new Map<string, number>();
  return [
    route(
      {
        id: 'askFits',
        method: 'post',
        path: '/fits/batch',
        tag: 'Questions',
        summary: 'Many fits in one request, a line each',
        description: `NDJSON in and out, in order, up to ${mostBatchLines} lines, answered as they come. The first line may name parts once, \`{ "shared": { "hulls": { "a": … } } }\`; later lines call them \`"#a"\`. Each line gets its answer, or \`{ line, problem }\`; the last line is \`{ "done": true, "count", "problems", "edition" }\`, and without it the answer is not whole. Lines default to no sampled uncertainty. Two batches of one caller may run at a time.`,
        may: 'batch.compute',
        lines: { schema: BatchQuestionLine, example: batchExample },
        reply: { status: 200, description: 'A line a question.', schema: BatchAnswerLine, contentType: ndjson },
        problems: ['invalid-input', 'unsupported-media-type', 'too-many-requests'],
        moreCost: { of: () => 0, words: `${plainUnits} for each line, ${sampledUnits} for a sampled one` },
        // no-transform: compression would hold back the first answers.
        cache: 'no-store, no-transform',
      },
      async ({ actor, req, res }) => {
        if (!req.is(ndjson) || req.headers['content-encoding'] !== undefined)
          throw new ApiProblem('unsupported-media-type', `Send ${ndjson}, not compressed.`);
        const caller = actorId(actor);
        const already = running.get(caller) ?? 0;
        if (already >= batchesAtOnce)
          throw new ApiProblem('too-many-requests', `${batchesAtOnce} batches of yours are running; wait for one to end.`, [], {
            'Retry-After': '5',
          });
        running.set(caller, already + 1);
        try {
          const lines = readLines(req, (n) => (n === 1 ? longestFirstLineBytes : longestLineBytes));
          const answers = await answerBatch(lines, {
            parts,
            pool,
            parse: parseBody,
            problemOf: (error) => problemBody(translate(error), req),
            charge: (units) => limits.chargeMore(req, actor, units),
          });
          res.status(200).type(ndjson);
          await pipeline(Readable.from(answers), res);
        } catch (error) {
          // The caller has gone: there is nobody left to tell.
          if (!res.headersSent) throw error;
          res.destroy();
        } finally {
          const left = (running.get(caller) ?? 1) - 1;
          if (left > 0) running.set(caller, left);
          else running.delete(caller);
        }
      },
    ),
  ];
}
