import { keepPreviousData, queryOptions } from '@tanstack/react-query';

import { storedEvaluation, type EvaluateRequest } from '#common/schemas/evaluation';
import { api } from '#client/lib/api-client.ts';
import { workspaceKey } from '#client/lib/query-keys.ts';

/** The result of a cell under a method. The same question has the same answer forever. */
export const evaluationQuery = (workspace: string, body: EvaluateRequest) =>
  queryOptions({
    queryKey: [...workspaceKey(workspace), 'evaluations', body],
    queryFn: ({ signal }) =>
      api.post(`/workspaces/${workspace}/evaluations`, { schema: storedEvaluation, body, signal }),
    staleTime: Infinity,
    placeholderData: keepPreviousData,
  });
