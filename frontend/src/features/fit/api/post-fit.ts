import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import type { FitAnswer, FitQuestion } from '@tiltwright/shared/schemas/fit.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

function postFit(question: FitQuestion, signal?: AbortSignal): Promise<FitAnswer> {
  // The client's types for what is read turn pairs into lists; the answer itself is what the schema says.
  return bodyOf(api.POST('/fits', { body: question, signal })) as Promise<FitAnswer>;
}

/** The answer to one question; the last one stays while the next is on its way, and a question that is overtaken is cancelled. */
const fitQuery = (question: FitQuestion) =>
  queryOptions({
    queryKey: ['fit', question],
    queryFn: ({ signal }) => postFit(question, signal),
    placeholderData: keepPreviousData,
  });

export function useFit(question: FitQuestion) {
  return useQuery(fitQuery(question));
}
