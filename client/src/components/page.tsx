import type { JSX, ReactNode } from 'react';

import { classNames } from '#client/lib/class-names.ts';

interface PageProps {
  /** Name of the page, for the browser's title. */
  title: string;
  width?: 'full' | 'reading';
  className?: string;
  children: ReactNode;
}

/** The frame of a page below the top bar: paddings, width, document title. */
export function Page({ title, width = 'full', className, children }: PageProps): JSX.Element {
  return (
    <div
      className={classNames(
        'px-4 pt-6 pb-16 md:px-7',
        width === 'reading' && 'mx-auto w-full max-w-4xl',
        className,
      )}
    >
      <title>{`${title} · Holdfast`}</title>
      {children}
    </div>
  );
}

interface PageHeaderProps {
  title: ReactNode;
  /** Beside or below the title: formula, group, state. */
  meta?: ReactNode;
  actions?: ReactNode;
}

/** Title of a page with what stands beside it and its buttons. */
export function PageHeader({ title, meta, actions }: PageHeaderProps): JSX.Element {
  return (
    <header className="flex flex-wrap items-end gap-x-4 gap-y-3">
      <h1 className="text-title tracking-[-0.02em]">{title}</h1>
      {meta !== undefined && (
        <div className="flex flex-wrap items-center gap-x-3.5 gap-y-1 pb-1 text-soft">{meta}</div>
      )}
      {actions !== undefined && <div className="ml-auto flex gap-2">{actions}</div>}
    </header>
  );
}
