import { queryOptions, useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';

import { noOverrides, type DataOverrides } from '#common/chemistry/sourced';
import { ownDataValueList } from '#common/schemas/data-values';
import { api } from '#client/lib/api-client.ts';
import { workspaceKey } from '#client/lib/query-keys.ts';

/** The workspace's own values in place of shipped ones. */
export const dataValuesQuery = (workspace: string) =>
  queryOptions({
    queryKey: [...workspaceKey(workspace), 'data-values'],
    queryFn: ({ signal }) =>
      api.get(`/workspaces/${workspace}/data-values`, { schema: ownDataValueList, signal }),
    staleTime: 60_000,
  });

/**
 * The workspace's own values as the look-ups of common/chemistry take them; shipped values only
 * until they are here, and without a workspace.
 */
export function useDataOverrides(workspace: string | null): DataOverrides {
  const { data } = useQuery({
    ...dataValuesQuery(workspace ?? ''),
    enabled: workspace !== null,
  });
  return useMemo(
    () =>
      data === undefined
        ? noOverrides
        : new Map(data.items.map(({ key, value, note }) => [key, { value, note }])),
    [data],
  );
}
