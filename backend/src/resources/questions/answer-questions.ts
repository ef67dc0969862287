// Looks up the parts of a question and hands it to the engine.
import { answerClearance } from '@tiltwright/shared/questions/answer-clearance.ts';
import { answerTilt } from '@tiltwright/shared/questions/answer-tilt.ts';
import { standsOnTransom } from '@tiltwright/shared/questions/fill-sensor.ts';
import type { ResolvedParts } from '@tiltwright/shared/questions/parts.ts';
import type { ClearanceQuestion, ClearanceReply } from '@tiltwright/shared/schemas/clearance.ts';
import type { FitQuestion } from '@tiltwright/shared/schemas/fit.ts';
import type { PlacementQuestion } from '@tiltwright/shared/schemas/placement.ts';
import type { TiltQuestion, TiltReply } from '@tiltwright/shared/schemas/tilt.ts';
import { ApiProblem } from '../../errors.ts';
import type { FitJob } from '../../fit-pool/fit-job.ts';
import type { PartLookup } from './part-lookup.ts';

export function askTilt(parts: PartLookup, question: TiltQuestion): TiltReply {
  const found = {
    hull: parts.part('hulls', question.hull, '/hull'),
    mount: question.mount === undefined ? undefined : parts.part('mounts', question.mount, '/mount'),
    lowerUnit: question.lowerUnit === undefined ? undefined : parts.part('lower-units', question.lowerUnit, '/lowerUnit'),
  };
  return answerTilt(question, found, { edition: parts.edition() });
}

export function askClearance(parts: PartLookup, question: ClearanceQuestion): ClearanceReply {
  const found = {
    hull: parts.part('hulls', question.hull, '/hull'),
    lowerUnit: question.lowerUnit === undefined ? undefined : parts.part('lower-units', question.lowerUnit, '/lowerUnit'),
    transducer: parts.part('transducers', question.transducer, '/transducer'),
    mount: question.mount === undefined ? undefined : parts.part('mounts', question.mount, '/mount'),
  };
  return answerClearance(question, found, { edition: parts.edition() });
}

type RigQuestion = Pick<FitQuestion, 'hull' | 'lowerUnits' | 'transducer' | 'mount'>;

function rigParts(parts: PartLookup, question: RigQuestion): ResolvedParts {
  return {
    hull: parts.part('hulls', question.hull, '/hull'),
    lowerUnits: question.lowerUnits.map(({ lowerUnit }, index) => parts.part('lower-units', lowerUnit, `/lowerUnits/${index}/lowerUnit`)),
    transducer: parts.part('transducers', question.transducer, '/transducer'),
    mount: question.mount === undefined ? undefined : parts.part('mounts', question.mount, '/mount'),
  };
}

/** A fit with its parts looked up, ready for whichever thread works it out. @throws ApiProblem unknown-part */
export function fitJob(parts: PartLookup, question: FitQuestion): FitJob {
  return { kind: 'fit', question, parts: rigParts(parts, question), context: { edition: parts.edition() } };
}

/** @throws ApiProblem unknown-part, and invalid-input where there is no transom to search or no side element to search for */
export function placementsJob(parts: PartLookup, question: PlacementQuestion): FitJob {
  const found = rigParts(parts, question);
  if (!standsOnTransom(found.mount, undefined)) throw refused('/mount', 'Places are searched for mounts on the transom.');
  if (!found.transducer.kinds.includes('side')) throw refused('/transducer', 'Places are searched for a side element; this has none.');
  return { kind: 'placements', question, parts: found, context: { edition: parts.edition() } };
}

const refused = (path: string, message: string) => new ApiProblem('invalid-input', message, [{ path, code: 'not-searchable', message }]);
