import type { ComponentType } from 'react';

interface PageModule {
  Component: ComponentType;
}

/**
 * Fetches a page's code when the page is first opened. A failure is thrown while drawing, so that
 * the error boundary of the route shows it: the router itself draws nothing when `lazy` rejects.
 */
export function lazyPage(load: () => Promise<PageModule>): () => Promise<PageModule> {
  return () =>
    load().catch((error: unknown): PageModule => ({
      Component: () => {
        throw error;
      },
    }));
}
