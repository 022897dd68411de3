import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';

import { ApiError, hasCode } from '#client/lib/api-error.ts';
import { endSession } from '#client/lib/session.ts';

const retries = 2;

/** The store of server answers. A session that ended is noticed here, whichever request found out. */
export function createQueryClient(): QueryClient {
  const noticeEnd = (error: unknown): void => {
    if (hasCode(error, 'auth.required')) {
      endSession(client);
    }
  };
  const client = new QueryClient({
    queryCache: new QueryCache({ onError: noticeEnd }),
    mutationCache: new MutationCache({ onError: noticeEnd }),
    defaultOptions: {
      queries: {
        staleTime: 15_000,
        retry: (count, error) => error instanceof ApiError && error.isTransient && count < retries,
        retryDelay: (attempt) => Math.min(600 * 2 ** attempt, 4_000),
      },
    },
  });
  return client;
}
