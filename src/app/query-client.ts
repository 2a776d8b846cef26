import { QueryClient } from '@tanstack/react-query';
import { OfflineError, ProblemError } from '../http/client.ts';

const TRIES = 2;

/** Failure policy in one place: refusals are answers, only an absent or busy server is tried again. */
function worthRetrying(failures: number, error: Error): boolean {
  if (failures >= TRIES) return false;
  if (error instanceof OfflineError) return true;
  return error instanceof ProblemError && error.problem.status === 503;
}

export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: { retry: worthRetrying, staleTime: 15_000, refetchOnWindowFocus: false },
      mutations: { retry: false },
    },
  });
}
