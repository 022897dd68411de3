import { useMutation, useQueryClient, type UseMutationResult } from '@tanstack/react-query';

import { sessionState, type SessionState, type SetupRequest } from '#common/schemas/auth';
import { api } from '#client/lib/api-client.ts';
import { sessionQuery } from '#client/lib/session.ts';

/** Makes the first owner and their workspace on an empty server, and signs them in. */
export function useSetUp(): UseMutationResult<SessionState, unknown, SetupRequest> {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: SetupRequest) => api.post('/setup', { schema: sessionState, body }),
    onSuccess: (state) => client.setQueryData(sessionQuery.queryKey, state),
  });
}
