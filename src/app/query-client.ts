import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { ApiError } from '../api/client';
import { keys } from '../api/keys';

/** Keeps the server's answers; when one says that the session is over, whoever is shown as signed in no longer is. */
export function createQueryClient(): QueryClient {
  const client = new QueryClient({
    queryCache: new QueryCache({ onError: noticeSignedOut }),
    mutationCache: new MutationCache({ onError: noticeSignedOut }),
    defaultOptions: {
      queries: {
        // What the server refuses it refuses again; what did not reach it may.
        retry: (failures, error) =>
          failures < 2 && !(error instanceof ApiError && error.status >= 400 && error.status < 500),
        staleTime: 10_000,
      },
    },
  });
  function noticeSignedOut(error: Error): void {
    if (error instanceof ApiError && error.code === 'not-signed-in') client.setQueryData(keys.me, null);
  }
  return client;
}
