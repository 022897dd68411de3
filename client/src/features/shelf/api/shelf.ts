import { keepPreviousData, queryOptions } from '@tanstack/react-query';

import { shelfPage } from '#common/schemas/lattice';
import { shelfPageSize, type ShelfView } from '#client/features/shelf/shelf-view.ts';
import { api } from '#client/lib/api-client.ts';
import { latticesKey } from '#client/lib/query-keys.ts';

/** One page of the shelf. */
export const shelfPageQuery = (workspace: string, view: ShelfView) =>
  queryOptions({
    queryKey: [...latticesKey(workspace), 'shelf', view],
    queryFn: ({ signal }) =>
      api.get(`/workspaces/${workspace}/lattices`, {
        schema: shelfPage,
        query: { ...view, deleted: view.deleted || undefined, pageSize: shelfPageSize },
        signal,
      }),
    placeholderData: keepPreviousData,
  });
