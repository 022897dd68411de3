import type { JSX } from 'react';

import { classNames } from '#client/lib/class-names.ts';

/** A grey bar in the place of text that is on its way. */
export function Skeleton({ className }: { className?: string }): JSX.Element {
  return (
    <span
      aria-hidden
      className={classNames('animate-sheen block h-4 rounded-control bg-line', className)}
    />
  );
}

/** Several lines on their way, named for screen readers. */
export function SkeletonLines({
  lines = 4,
  label = 'Loading',
}: {
  lines?: number;
  label?: string;
}): JSX.Element {
  return (
    <div role="status" aria-label={label} className="grid gap-4 py-4">
      {Array.from({ length: lines }, (_, index) => (
        <Skeleton key={index} className={index % 3 === 2 ? 'w-2/5' : 'w-4/5'} />
      ))}
    </div>
  );
}
