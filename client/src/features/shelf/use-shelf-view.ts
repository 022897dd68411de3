import { useCallback, useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';

import {
  readShelfView,
  writeShelfView,
  type ShelfView,
} from '#client/features/shelf/shelf-view.ts';

/** The view in the address and a way to change it; a change starts again at page one. */
export function useShelfView(): [ShelfView, (change: Partial<ShelfView>) => void] {
  const [params, setParams] = useSearchParams();
  const view = useMemo(() => readShelfView(params), [params]);
  const change = useCallback(
    (part: Partial<ShelfView>) => setParams(writeShelfView({ ...view, page: 1, ...part })),
    [setParams, view],
  );
  return [view, change];
}
