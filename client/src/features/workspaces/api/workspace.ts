import { useMutation, useQueryClient, type UseMutationResult } from '@tanstack/react-query';
import type { z } from 'zod';

import {
  workspaceDetail,
  type updateWorkspaceRequest,
  type WorkspaceDetail,
} from '#common/schemas/workspace';
import { api } from '#client/lib/api-client.ts';
import { sessionQuery } from '#client/lib/session.ts';

export type WorkspaceChange = z.infer<typeof updateWorkspaceRequest>;

/** Changes name or rules of the workspace; the session carries them, so it is fetched again. */
export function useUpdateWorkspace(
  workspace: string,
): UseMutationResult<WorkspaceDetail, unknown, WorkspaceChange> {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: WorkspaceChange) =>
      api.patch(`/workspaces/${workspace}`, { schema: workspaceDetail, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: sessionQuery.queryKey }),
  });
}
