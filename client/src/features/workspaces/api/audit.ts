import { keepPreviousData, queryOptions } from '@tanstack/react-query';

import { auditPage } from '#common/schemas/workspace';
import { api } from '#client/lib/api-client.ts';
import { workspaceKey } from '#client/lib/query-keys.ts';

export const auditPageSize = 50;

/** One page of what happened in the workspace, newest first. */
export const auditPageQuery = (workspace: string, page: number) =>
  queryOptions({
    queryKey: [...workspaceKey(workspace), 'audit', page],
    queryFn: ({ signal }) =>
      api.get(`/workspaces/${workspace}/audit`, {
        schema: auditPage,
        query: { page, pageSize: auditPageSize },
        signal,
      }),
    placeholderData: keepPreviousData,
  });
