// One question to work out, and its answer as the JSON text that is sent: text crosses threads cheaper than objects.
import { answerFit } from '@tiltwright/shared/questions/answer-fit.ts';
import { answerPlacements } from '@tiltwright/shared/questions/answer-placements.ts';
import type { AnswerContext, ResolvedParts } from '@tiltwright/shared/questions/parts.ts';
import type { FitQuestion } from '@tiltwright/shared/schemas/fit.ts';
import type { PlacementQuestion } from '@tiltwright/shared/schemas/placement.ts';

interface Resolved {
  parts: ResolvedParts;
  context: AnswerContext;
}
export type FitJob = Resolved & ({ kind: 'fit'; question: FitQuestion } | { kind: 'placements'; question: PlacementQuestion });

export function answerJob(job: FitJob): string {
  switch (job.kind) {
    case 'fit':
      return JSON.stringify(answerFit(job.question, job.parts, job.context));
    case 'placements':
      return JSON.stringify(answerPlacements(job.question, job.parts, job.context));
    default:
      return job satisfies never;
  }
}
