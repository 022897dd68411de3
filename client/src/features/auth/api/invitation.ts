import {
  queryOptions,
  useMutation,
  useQueryClient,
  type UseMutationResult,
} from '@tanstack/react-query';
import type { z } from 'zod';

import {
  invitationPreview,
  sessionState,
  type acceptInvitationRequest,
  type SessionState,
} from '#common/schemas/auth';
import { api } from '#client/lib/api-client.ts';
import { sessionQuery } from '#client/lib/session.ts';

export type AcceptInvitation = z.infer<typeof acceptInvitationRequest>;

/** What an invitation says before it is accepted. */
export const invitationQuery = (token: string) =>
  queryOptions({
    queryKey: ['invitations', token],
    queryFn: ({ signal }) =>
      api.get(`/invitations/${encodeURIComponent(token)}`, { schema: invitationPreview, signal }),
    staleTime: Infinity,
  });

/** Accepts it, with a new account or as the person signed in. */
export function useAcceptInvitation(
  token: string,
): UseMutationResult<SessionState, unknown, AcceptInvitation> {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: AcceptInvitation) =>
      api.post(`/invitations/${encodeURIComponent(token)}/accept`, { schema: sessionState, body }),
    onSuccess: (state) => client.setQueryData(sessionQuery.queryKey, state),
  });
}
