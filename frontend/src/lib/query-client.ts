import { QueryClient } from '@tanstack/react-query';
import { isApiError } from './api-error';

const retriesOfReads = 2;

/** Only a read whose answer never came is asked again by itself; a refusal is an answer. */
function mayRetry(failures: number, error: unknown): boolean {
  return (
    failures < retriesOfReads &&
    (isApiError(error, 'offline') || isApiError(error, 'slow') || isApiError(error, 'busy'))
  );
}

/** The page's cache. What changes is told by the socket, so half a minute counts as fresh. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      // `always`: without a signal the page says so at once and shows the last known, instead of waiting in silence.
      queries: { staleTime: 30_000, gcTime: 10 * 60_000, retry: mayRetry, networkMode: 'always' },
      mutations: { retry: false, networkMode: 'always' },
    },
  });
}
