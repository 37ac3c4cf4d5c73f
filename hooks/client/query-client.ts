import { QueryClient } from '@tanstack/react-query';
import { ApiError } from '@/hooks/client/api-error';

const MOST_RETRIES = 2;

/** Tries again only what may work a moment later; an answer that refuses is final. */
function mayRetry(failures: number, error: Error): boolean {
  const isPassing = error instanceof ApiError && (error.code === 'unreachable' || error.code === 'unavailable');
  return isPassing && failures < MOST_RETRIES;
}

/** The client's copy of what the server said. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      // 'always': without a connection a screen says so at once, instead of waiting for one in silence.
      queries: { retry: mayRetry, staleTime: 30_000, networkMode: 'always' },
      mutations: { retry: false, networkMode: 'always' },
    },
  });
}
