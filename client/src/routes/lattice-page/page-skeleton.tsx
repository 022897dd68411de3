import type { JSX } from 'react';

import { Skeleton } from '#client/components/skeleton.tsx';

/** The lattice page while its data is on its way: the same layout in grey. */
export function PageSkeleton(): JSX.Element {
  return (
    <div role="status" aria-label="Loading the lattice">
      <h1 className="sr-only">Lattice</h1>
      <Skeleton className="h-8 w-72 max-w-full" />
      <Skeleton className="mt-6 w-96 max-w-full" />
      <div className="mt-6 grid gap-8 wide:grid-cols-[minmax(0,1fr)_minmax(32.5rem,41%)]">
        <Skeleton className="h-[60dvh] opacity-50" />
        <div className="grid content-start gap-4">
          <Skeleton className="h-10 w-3/4" />
          {Array.from({ length: 9 }, (_, index) => (
            <Skeleton key={index} className="h-5" />
          ))}
        </div>
      </div>
    </div>
  );
}
