// The engine beside the page: reckons a check without holding up a moving slider.
import { answerFit } from '@tiltwright/shared/questions/answer-fit.ts';
import type { FitJob, FitResult } from './fit-job.ts';

self.onmessage = ({ data: { id, question, parts, edition } }: MessageEvent<FitJob>) => {
  let result: FitResult;
  try {
    result = { id, answer: answerFit(question, parts, { edition }) };
  } catch {
    result = { id, answer: null };
  }
  self.postMessage(result);
};
