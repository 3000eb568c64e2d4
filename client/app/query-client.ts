import { QueryClient } from '@tanstack/react-query';
import { OfflineError, ProblemError } from '#client/api/request.ts';

const RETRIES = 2;

/** Trying again helps when there was no answer or the server was not ready, never when it said no. */
function isPassing(error: Error): boolean {
  return (
    error instanceof OfflineError ||
    (error instanceof ProblemError && (error.status === 502 || error.status === 503))
  );
}

export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: {
        staleTime: 15_000,
        networkMode: 'always',
        retry: (failures, error) => failures < RETRIES && isPassing(error),
      },
      mutations: { networkMode: 'always', retry: false },
    },
  });
}
