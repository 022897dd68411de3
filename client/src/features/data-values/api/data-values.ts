import { useMutation, useQueryClient, type UseMutationResult } from '@tanstack/react-query';

import { ownDataValue, type OwnDataValue } from '#common/schemas/data-values';
import type { DataValue } from '#common/schemas/energetics';
import { done } from '#common/schemas/shared';
import { api } from '#client/lib/api-client.ts';
import { dataValuesQuery } from '#client/lib/data-overrides.ts';

const pathOf = (workspace: string, key: string): string =>
  `/workspaces/${workspace}/data-values/${encodeURIComponent(key)}`;

/** Puts the workspace's own value in place of the shipped one. */
export function useSetDataValue(
  workspace: string,
): UseMutationResult<OwnDataValue, unknown, DataValue> {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ key, value, note }: DataValue) =>
      api.put(pathOf(workspace, key), { schema: ownDataValue, body: { value, note } }),
    onSuccess: () => client.invalidateQueries({ queryKey: dataValuesQuery(workspace).queryKey }),
  });
}

/** Goes back to the shipped value. */
export function useRestoreDataValue(
  workspace: string,
): UseMutationResult<{ ok: true }, unknown, { key: string }> {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ key }: { key: string }) => api.delete(pathOf(workspace, key), { schema: done }),
    // Also after a failure: someone else may have gone back already.
    onSettled: () => client.invalidateQueries({ queryKey: dataValuesQuery(workspace).queryKey }),
  });
}
