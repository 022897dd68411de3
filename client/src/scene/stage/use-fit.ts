import { useLayoutEffect, type RefObject } from 'react';

import { fittedView, type FitSubject } from '../model/fit-view.ts';
import type { ViewStore } from './view-store.ts';

/** Keeps the block fitted to the stage for as long as nobody has moved the camera. */
export function useFit(
  stage: RefObject<HTMLElement | null>,
  store: ViewStore,
  { block, ionScale, bounds }: FitSubject,
): void {
  useLayoutEffect(() => {
    const element = stage.current;
    if (element === null) {
      return;
    }
    const fit = (): void => {
      const { clientWidth: width, clientHeight: height } = element;
      if (width > 0 && height > 0) {
        store.fit = (view) => fittedView(view, { block, ionScale, bounds }, width / height);
        store.refit();
      }
    };
    fit();
    const observer = new ResizeObserver(fit);
    observer.observe(element);
    return () => observer.disconnect();
  }, [stage, store, block, ionScale, bounds]);
}
