import type { JSX, ReactNode } from 'react';

interface EmptyStateProps {
  title: string;
  children?: ReactNode;
  /** What to do about it. */
  action?: ReactNode;
}

/** A lattice with one place still open: nothing is here yet. */
function OpenPlace(): JSX.Element {
  return (
    <svg aria-hidden viewBox="0 0 96 64" className="mx-auto mb-4 h-16 w-24">
      <path
        d="M20 18h28M48 18h28M20 46h28M48 46h28M20 18v28M76 18v28"
        className="stroke-line"
        strokeWidth="2"
      />
      <circle cx="20" cy="18" r="7" className="fill-bind" />
      <circle cx="76" cy="18" r="7" className="fill-bind" />
      <circle cx="48" cy="46" r="7" className="fill-bind" />
      <circle cx="20" cy="46" r="5" className="fill-oppose" />
      <circle cx="76" cy="46" r="5" className="fill-oppose" />
      <circle
        cx="48"
        cy="18"
        r="5.5"
        className="fill-paper stroke-ink"
        strokeWidth="1.5"
        strokeDasharray="2.6 2.4"
      />
    </svg>
  );
}

/** Says that there is nothing yet, why, and what to do. */
export function EmptyState({ title, children, action }: EmptyStateProps): JSX.Element {
  return (
    <div className="px-4 py-16 text-center">
      <OpenPlace />
      <h2 className="text-lead">{title}</h2>
      {children !== undefined && (
        <div className="mx-auto mt-1 max-w-md text-pretty text-soft">{children}</div>
      )}
      {action !== undefined && <div className="mt-5 flex justify-center gap-2">{action}</div>}
    </div>
  );
}
