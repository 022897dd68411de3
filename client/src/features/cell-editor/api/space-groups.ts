import { queryOptions } from '@tanstack/react-query';

import { spaceGroupDetail, spaceGroupList } from '#common/schemas/symmetry';
import { api } from '#client/lib/api-client.ts';

/** The 530 tabulated settings; they never change. */
export const spaceGroupsQuery = queryOptions({
  queryKey: ['space-groups'],
  queryFn: ({ signal }) => api.get('/space-groups', { schema: spaceGroupList, signal }),
  staleTime: Infinity,
  gcTime: Infinity,
  select: (list) => list.items,
});

/** One setting with its operations. */
export const spaceGroupQuery = (hallNumber: number) =>
  queryOptions({
    queryKey: ['space-groups', hallNumber],
    queryFn: ({ signal }) =>
      api.get(`/space-groups/${hallNumber}`, { schema: spaceGroupDetail, signal }),
    staleTime: Infinity,
    gcTime: Infinity,
  });
