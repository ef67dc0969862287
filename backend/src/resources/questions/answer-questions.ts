// Looks up the parts of a question and hands it to the engine.

import { answerClearance } from '@tiltwright/shared/questions/answer-clearance.ts';
import { answerFit } from '@tiltwright/shared/questions/answer-fit.ts';
import { answerTilt } from '@tiltwright/shared/questions/answer-tilt.ts';
import type { ClearanceQuestion, ClearanceReply } from '@tiltwright/shared/schemas/clearance.ts';
import type { FitAnswer, FitQuestion } from '@tiltwright/shared/schemas/fit.ts';
import type { TiltQuestion, TiltReply } from '@tiltwright/shared/schemas/tilt.ts';
import type { Db } from '../../db/connect.ts';
import { currentEdition } from '../catalog/queries.ts';
import { resolvePart } from './resolve-parts.ts';

export function askTilt(db: Db, question: TiltQuestion): TiltReply {
  const parts = {
    hull: resolvePart(db, 'hulls', question.hull, '/hull'),
    mount: question.mount === undefined ? undefined : resolvePart(db, 'mounts', question.mount, '/mount'),
    lowerUnit: question.lowerUnit === undefined ? undefined : resolvePart(db, 'lower-units', question.lowerUnit, '/lowerUnit'),
  };
  return answerTilt(question, parts, { edition: currentEdition(db) });
}

export function askClearance(db: Db, question: ClearanceQuestion): ClearanceReply {
  const parts = {
    hull: resolvePart(db, 'hulls', question.hull, '/hull'),
    lowerUnit: question.lowerUnit === undefined ? undefined : resolvePart(db, 'lower-units', question.lowerUnit, '/lowerUnit'),
    transducer: resolvePart(db, 'transducers', question.transducer, '/transducer'),
    mount: question.mount === undefined ? undefined : resolvePart(db, 'mounts', question.mount, '/mount'),
  };
  return answerClearance(question, parts, { edition: currentEdition(db) });
}

export function askFit(db: Db, question: FitQuestion): FitAnswer {
  const parts = {
    hull: resolvePart(db, 'hulls', question.hull, '/hull'),
    lowerUnits: question.lowerUnits.map(({ lowerUnit }, index) =>
      resolvePart(db, 'lower-units', lowerUnit, `/lowerUnits/${index}/lowerUnit`),
    ),
    transducer: resolvePart(db, 'transducers', question.transducer, '/transducer'),
    mount: question.mount === undefined ? undefined : resolvePart(db, 'mounts', question.mount, '/mount'),
  };
  return answerFit(question, parts, { edition: currentEdition(db) });
}
