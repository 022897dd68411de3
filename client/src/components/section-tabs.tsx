import type { ComponentProps, JSX, ReactNode } from 'react';
import { Link } from 'react-router-dom';

import { classNames } from '#client/lib/class-names.ts';

export interface Section {
  key: string;
  label: ReactNode;
  to: ComponentProps<typeof Link>['to'];
  /** A small raised number, for things that wait. */
  count?: number;
}

interface SectionTabsProps {
  label: string;
  sections: readonly Section[];
  current: string;
  className?: string;
}

/** Sections of a page as a row of plain words under its title; each has an address. */
export function SectionTabs({
  label,
  sections,
  current,
  className,
}: SectionTabsProps): JSX.Element {
  return (
    <nav aria-label={label} className={classNames('border-b border-line', className)}>
      <ul className="-mb-px flex gap-6 overflow-x-auto">
        {sections.map((section) => (
          <li key={section.key}>
            <Link
              to={section.to}
              replace
              preventScrollReset
              aria-current={section.key === current ? 'page' : undefined}
              className="block border-b-2 border-transparent pt-2 pb-2.5 whitespace-nowrap text-soft -outline-offset-2 hover:text-ink aria-[current]:border-ink aria-[current]:font-medium aria-[current]:text-ink"
            >
              {section.label}
              {section.count !== undefined && section.count > 0 && (
                <sup className="ml-0.5 text-oppose">{section.count}</sup>
              )}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
