import type { JSX, ReactNode } from 'react';

import { Logo } from '#client/components/logo.tsx';
import { LatticeDrawing } from '#client/features/auth/components/lattice-drawing.tsx';

interface AuthFrameProps {
  /** Name of the page, in the browser's title. */
  title: string;
  heading: string;
  lead?: ReactNode;
  children: ReactNode;
}

/** Pages before one is signed in: the form at the left, the lattice at the right. */
export function AuthFrame({ title, heading, lead, children }: AuthFrameProps): JSX.Element {
  return (
    <div className="grid min-h-dvh lg:grid-cols-[minmax(0,1fr)_minmax(0,1.15fr)]">
      <title>{`${title} · Holdfast`}</title>
      <main id="main" tabIndex={-1} className="flex flex-col px-5 py-6 md:px-7">
        <div className="mb-10 lg:mb-0">
          <Logo />
        </div>
        <div className="mx-auto my-auto w-full max-w-95">
          <h1 className="text-title tracking-[-0.02em]">{heading}</h1>
          {lead !== undefined && <div className="mt-2 text-soft">{lead}</div>}
          <div className="mt-6">{children}</div>
        </div>
      </main>
      <aside
        aria-label="About Holdfast"
        className="sticky top-0 hidden h-dvh flex-col justify-center border-l border-line bg-wash p-10 lg:flex"
      >
        <LatticeDrawing className="mx-auto min-h-0 w-full max-w-170 grow" />
        <p className="mx-auto max-w-md pb-6 text-center text-lead text-balance text-soft">
          Decide, together, whether an ionic crystal structure holds.
        </p>
      </aside>
    </div>
  );
}
