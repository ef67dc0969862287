import { QueryClient } from '@tanstack/react-query';
import { isFinal } from './problem.ts';

export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: {
        // The catalog changes with an edition, some times a day at most.
        staleTime: 60_000,
        retry: (failures, error) => failures < 2 && !isFinal(error),
        retryDelay: (attempt) => Math.min(500 * 2 ** attempt, 4000),
        // An offline phone should say so instead of waiting without a word.
        networkMode: 'always',
      },
      mutations: { networkMode: 'always' },
    },
  });
}
