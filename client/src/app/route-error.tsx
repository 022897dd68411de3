import type { JSX } from 'react';
import { isRouteErrorResponse, useRouteError } from 'react-router-dom';

import { ButtonLink } from '#client/components/button.tsx';
import { ErrorState } from '#client/components/error-state.tsx';
import { NotFoundState } from '#client/components/not-found-state.tsx';
import { ApiError } from '#client/lib/api-error.ts';

/** Whether the browser failed to fetch a page's code: after an update, or with no connection. */
function isCodeMissing(error: unknown): boolean {
  return error instanceof TypeError && /import|module|fetch/i.test(error.message);
}

/** What stands in the place of a page that failed; the rest of the screen stays. */
export function RouteError(): JSX.Element {
  const error = useRouteError();
  const isMissing =
    (isRouteErrorResponse(error) || error instanceof ApiError) && error.status === 404;
  if (isMissing) {
    return <NotFoundState />;
  }
  const shown = isCodeMissing(error)
    ? new ApiError(0, 'page.unreachable', 'This page could not be fetched. Load it again.')
    : error;
  return (
    <div>
      <title>Something went wrong · Holdfast</title>
      <h1 className="sr-only">Something went wrong</h1>
      <ErrorState
        error={shown}
        title="This page stopped working"
        onRetry={() => window.location.reload()}
        action={<ButtonLink to="/">To the shelf</ButtonLink>}
      />
    </div>
  );
}

/** The same when nothing of the frame is left. */
export function RootError(): JSX.Element {
  return (
    <main id="main" tabIndex={-1}>
      <RouteError />
    </main>
  );
}
