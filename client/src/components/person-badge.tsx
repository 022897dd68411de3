import type { JSX } from 'react';

import { classNames } from '#client/lib/class-names.ts';

interface PersonBadgeProps {
  name: string;
  initials: string;
  /** The name beside the round; else it is read aloud only. */
  isNamed?: boolean;
  tone?: 'ink' | 'plain';
  /** The name stands beside it already. */
  isDecorative?: boolean;
}

/** The round with a person's initials. */
export function PersonBadge({
  name,
  initials,
  isNamed = false,
  tone = 'plain',
  isDecorative = false,
}: PersonBadgeProps): JSX.Element {
  return (
    <span className="inline-flex min-w-0 shrink-0 items-center gap-2">
      <span
        aria-hidden
        title={isNamed ? undefined : name}
        className={classNames(
          'grid size-[30px] shrink-0 place-items-center rounded-full text-small font-medium tracking-tight',
          tone === 'ink' ? 'bg-ink text-paper' : 'border border-line bg-raised text-ink',
        )}
      >
        {initials}
      </span>
      {!isDecorative && <span className={isNamed ? 'truncate' : 'sr-only'}>{name}</span>}
    </span>
  );
}
