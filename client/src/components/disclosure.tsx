import { ChevronRight } from 'lucide-react';
import type { JSX, ReactNode } from 'react';

/** A part for those who want to know more: closed at first. */
export function Disclosure({
  title,
  note,
  children,
}: {
  title: string;
  /** In short, beside the title. */
  note?: ReactNode;
  children: ReactNode;
}): JSX.Element {
  return (
    <details className="group border-t border-line">
      <summary className="flex list-none items-baseline gap-2 py-3 marker:hidden hover:text-ink [&::-webkit-details-marker]:hidden">
        <ChevronRight
          aria-hidden
          className="size-4 shrink-0 self-center text-soft transition-transform duration-100 group-open:rotate-90"
        />
        <span className="font-medium whitespace-nowrap">{title}</span>
        {note !== undefined && <span className="text-small text-soft">{note}</span>}
      </summary>
      <div className="pb-5 pl-6">{children}</div>
    </details>
  );
}
