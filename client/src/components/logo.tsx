import type { JSX } from 'react';

/** The mark: a ring that holds a dot. */
export function LogoMark({ className = 'size-6' }: { className?: string }): JSX.Element {
  return (
    <svg aria-hidden viewBox="0 0 24 24" className={className}>
      <circle cx="8.5" cy="12" r="7" fill="none" stroke="currentColor" strokeWidth="2" />
      <circle cx="17.5" cy="12" r="4.2" className="fill-oppose" />
    </svg>
  );
}

/** Mark and name. */
export function Logo(): JSX.Element {
  return (
    <span className="flex items-center gap-2 text-lead font-bold tracking-[-0.01em]">
      <LogoMark />
      Holdfast
    </span>
  );
}
