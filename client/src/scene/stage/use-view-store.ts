import { useEffect, useRef, useState } from 'react';

import { isSameView, type SceneView } from '../model/scene-view.ts';
import { ViewStore } from './view-store.ts';

/** The camera: follows the `view` prop, reports where it came to rest. */
export function useViewStore(
  view: SceneView | null,
  onViewChange: ((view: SceneView) => void) | undefined,
): ViewStore {
  const [store] = useState(() => new ViewStore(view));
  const reported = useRef(view);
  // Through a ref: a new handler must not interrupt a view on its way.
  const report = useRef(onViewChange);
  useEffect(() => {
    report.current = onViewChange;
  });
  useEffect(
    () =>
      store.onSettled((settled) => {
        reported.current = settled;
        report.current?.(settled);
      }),
    [store],
  );
  useEffect(() => {
    const isOwn = reported.current !== null && view !== null && isSameView(view, reported.current);
    if (view !== null && !isOwn && !isSameView(view, store.view)) {
      store.show(view);
    }
  }, [store, view]);
  return store;
}
