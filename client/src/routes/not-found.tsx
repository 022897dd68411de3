import type { JSX } from 'react';

import { NotFoundState } from '#client/components/not-found-state.tsx';

/** Replaced in the next commit by the page itself. */
export function Component(): JSX.Element {
  return <NotFoundState />;
}
