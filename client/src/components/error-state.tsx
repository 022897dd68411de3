import { CircleAlert, TriangleAlert } from 'lucide-react';
import type { JSX, ReactNode } from 'react';

import { Button } from '#client/components/button.tsx';
import { ApiError, messageOf } from '#client/lib/api-error.ts';
import { classNames } from '#client/lib/class-names.ts';

interface ErrorStateProps {
  error: unknown;
  onRetry?: () => void;
  title?: string;
  action?: ReactNode;
}

/** Where something should stand that could not be fetched: what happened, and a way on. */
export function ErrorState({
  error,
  onRetry,
  title = 'This could not be shown',
  action,
}: ErrorStateProps): JSX.Element {
  const requestId = error instanceof ApiError ? error.requestId : null;
  return (
    <div role="alert" className="px-4 py-16 text-center">
      <TriangleAlert aria-hidden className="mx-auto mb-3 size-7 text-fails" strokeWidth={1.6} />
      <h2 className="text-lead">{title}</h2>
      <p className="mx-auto mt-1 max-w-md text-soft">{messageOf(error)}</p>
      {requestId !== null && (
        <p className="mt-2 text-small text-soft">
          Quote this number when asking for help: {requestId}
        </p>
      )}
      <div className="mt-5 flex justify-center gap-2">
        {onRetry !== undefined && <Button onClick={onRetry}>Try again</Button>}
        {action}
      </div>
    </div>
  );
}

/** A failure in one line, inside a form or dialog; nothing when there is none. */
export function InlineError({
  error,
  className,
}: {
  /** A thrown error, or the message itself. */
  error: unknown;
  className?: string;
}): JSX.Element | null {
  if (error === null || error === undefined) {
    return null;
  }
  return (
    <p
      role="alert"
      className={classNames(
        'flex gap-2 rounded-control border border-fails bg-raised px-3 py-2',
        className,
      )}
    >
      <CircleAlert aria-hidden className="mt-1 size-4 shrink-0 text-fails" />
      <span>{typeof error === 'string' ? error : messageOf(error)}</span>
    </p>
  );
}
