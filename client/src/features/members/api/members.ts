import {
  queryOptions,
  useMutation,
  useQueryClient,
  type UseMutationResult,
} from '@tanstack/react-query';

import type { Role } from '#common/schemas/auth';
import { done } from '#common/schemas/shared';
import { member, memberList, type Member } from '#common/schemas/workspace';
import { api } from '#client/lib/api-client.ts';
import { workspaceKey } from '#client/lib/query-keys.ts';
import { sessionQuery } from '#client/lib/session.ts';

/** Everyone in the workspace. */
export const membersQuery = (workspace: string) =>
  queryOptions({
    queryKey: [...workspaceKey(workspace), 'members'],
    queryFn: ({ signal }) =>
      api.get(`/workspaces/${workspace}/members`, { schema: memberList, signal }),
  });

/** Gives a member another role. */
export function useChangeRole(
  workspace: string,
): UseMutationResult<Member, unknown, { userId: string; role: Role }> {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ userId, role }: { userId: string; role: Role }) =>
      api.patch(`/workspaces/${workspace}/members/${userId}`, { schema: member, body: { role } }),
    onSettled: async () => {
      await client.invalidateQueries({ queryKey: membersQuery(workspace).queryKey });
      // Someone may have changed their own role.
      await client.invalidateQueries({ queryKey: sessionQuery.queryKey });
    },
  });
}

/** Takes a member out of the workspace; also how one leaves it. */
export function useRemoveMember(
  workspace: string,
): UseMutationResult<{ ok: true }, unknown, { userId: string }> {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ userId }: { userId: string }) =>
      api.delete(`/workspaces/${workspace}/members/${userId}`, { schema: done }),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: membersQuery(workspace).queryKey });
    },
  });
}
