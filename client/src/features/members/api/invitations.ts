import {
  queryOptions,
  useMutation,
  useQueryClient,
  type UseMutationResult,
} from '@tanstack/react-query';
import type { z } from 'zod';

import {
  createdInvitation,
  invitationList,
  type createInvitationRequest,
} from '#common/schemas/auth';
import { done } from '#common/schemas/shared';
import { api } from '#client/lib/api-client.ts';
import { workspaceKey } from '#client/lib/query-keys.ts';

export type CreateInvitation = z.infer<typeof createInvitationRequest>;
export type CreatedInvitation = z.infer<typeof createdInvitation>;

/** Invitations that nobody has accepted yet. */
export const invitationsQuery = (workspace: string) =>
  queryOptions({
    queryKey: [...workspaceKey(workspace), 'invitations'],
    queryFn: ({ signal }) =>
      api.get(`/workspaces/${workspace}/invitations`, { schema: invitationList, signal }),
  });

/** Makes an invitation; its token is in this answer and never again. */
export function useCreateInvitation(
  workspace: string,
): UseMutationResult<CreatedInvitation, unknown, CreateInvitation> {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: CreateInvitation) =>
      api.post(`/workspaces/${workspace}/invitations`, { schema: createdInvitation, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: invitationsQuery(workspace).queryKey }),
  });
}

/** Makes a pending invitation void. */
export function useWithdrawInvitation(
  workspace: string,
): UseMutationResult<{ ok: true }, unknown, { id: string }> {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id }: { id: string }) =>
      api.delete(`/workspaces/${workspace}/invitations/${id}`, { schema: done }),
    onSuccess: () => client.invalidateQueries({ queryKey: invitationsQuery(workspace).queryKey }),
  });
}
