import { QueryClient } from '@tanstack/react-query';
import { ApiProblem } from './api-problem.ts';

/** Only what may pass by itself is tried again: no reply at all, or a server that is away. Never a refusal. */
export function mayRetry(failures: number, error: unknown): boolean {
  const passing = error instanceof ApiProblem && (error.status === 0 || error.status >= 500);
  return passing && failures < 2;
}

/**
 * The cache of server data. Answers stay fresh for half a minute; every save invalidates what it changed. Without signal
 * everything is tried all the same, so that a page says what is wrong, or uses what it kept, and never waits in silence.
 */
export function createQueryClient(): QueryClient {
  const networkMode = 'always';
  return new QueryClient({
    defaultOptions: {
      queries: { retry: mayRetry, staleTime: 30_000, networkMode, refetchOnReconnect: true },
      mutations: { retry: false, networkMode },
    },
  });
}
