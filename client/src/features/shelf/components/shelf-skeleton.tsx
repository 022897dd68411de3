import type { JSX } from 'react';

import { Skeleton } from '#client/components/skeleton.tsx';

/** Rows on their way. */
export function ShelfSkeleton(): JSX.Element {
  return (
    <div role="status" aria-label="Loading the lattices" className="border-t border-line">
      {Array.from({ length: 8 }, (_, index) => (
        <div key={index} className="flex h-13 items-center gap-8 border-b border-line">
          <Skeleton className="w-1/4" />
          <Skeleton className="w-16" />
          <Skeleton className="w-24 max-md:hidden" />
          <Skeleton className="ml-auto w-32" />
          <Skeleton className="w-20 max-md:hidden" />
        </div>
      ))}
    </div>
  );
}
