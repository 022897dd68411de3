import { Search } from 'lucide-react';
import type { JSX } from 'react';
import { Link } from 'react-router-dom';

import { PersonMenu } from '#client/app/person-menu.tsx';
import { LatticeSearch } from '#client/components/lattice-search.tsx';
import { WaitingPill } from '#client/app/waiting-pill.tsx';
import { WorkspaceMenu } from '#client/app/workspace-menu.tsx';
import { Logo, LogoMark } from '#client/components/logo.tsx';
import { useOptionalWorkspace } from '#client/lib/session.ts';

/** The bar on top: mark, workspace, search, what waits, person. */
export function TopBar(): JSX.Element {
  const workspace = useOptionalWorkspace();
  return (
    <header className="sticky top-0 z-30 flex h-14 shrink-0 items-center gap-3 border-b border-line bg-paper px-4 md:gap-5 md:px-7 print:hidden">
      <Link to="/" aria-label="Holdfast, to the shelf" className="rounded-control">
        <span className="max-md:hidden">
          <Logo />
        </span>
        <LogoMark className="size-7 md:hidden" />
      </Link>
      <WorkspaceMenu />
      <span className="grow" />
      {workspace !== null && (
        <>
          <LatticeSearch
            workspace={workspace.workspaceSlug}
            className="w-full max-w-105 max-md:hidden"
          />
          <Link
            to={`/w/${workspace.workspaceSlug}#search`}
            aria-label="Find a lattice"
            className="grid size-9 place-items-center rounded-control text-soft hover:bg-wash md:hidden"
          >
            <Search aria-hidden className="size-5" />
          </Link>
          <WaitingPill workspace={workspace} />
        </>
      )}
      <PersonMenu />
    </header>
  );
}
