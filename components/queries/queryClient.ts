import { QueryClient } from '@tanstack/react-query';
import { isPassing, type ApiError } from '../api/problem';
import { staleTimes } from './staleTimes';

declare module '@tanstack/react-query' {
  interface Register {
    defaultError: ApiError;
  }
}

const TRIES = 2;

/** Retries only what may pass by itself (network, timeout, 5xx), twice; never a mutation. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: {
        staleTime: staleTimes.working,
        retry: (failures, error) => failures < TRIES && isPassing(error),
        refetchOnWindowFocus: false,
      },
      // Without a network an act fails at once and says so, instead of waiting unseen for its return.
      mutations: { retry: false, networkMode: 'always' },
    },
  });
}
