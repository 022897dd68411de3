import { useMutation, useQueryClient, type UseMutationResult } from '@tanstack/react-query';

import { sessionState, type SessionState, type SignInRequest } from '#common/schemas/auth';
import { api } from '#client/lib/api-client.ts';
import { sessionQuery } from '#client/lib/session.ts';

/** Signs in; the session in the store changes, and with it what the pages show. */
export function useSignIn(): UseMutationResult<SessionState, unknown, SignInRequest> {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: SignInRequest) => api.post('/session', { schema: sessionState, body }),
    onSuccess: (state) => {
      client.removeQueries({ predicate: (query) => query.queryKey[0] !== 'session' });
      client.setQueryData(sessionQuery.queryKey, state);
    },
  });
}
