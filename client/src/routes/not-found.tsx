import type { JSX } from 'react';

import { NotFoundState } from '#client/components/not-found-state.tsx';

/** Any address that is no page. */
export function Component(): JSX.Element {
  return (
    <main id="main" tabIndex={-1}>
      <h1 className="sr-only">Not found</h1>
      <NotFoundState />
    </main>
  );
}
