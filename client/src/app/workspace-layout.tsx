import { useEffect, type JSX } from 'react';
import { Outlet, useParams } from 'react-router-dom';

import { NotFoundState } from '#client/components/not-found-state.tsx';
import { rememberWorkspace } from '#client/lib/last-workspace.ts';
import { useOptionalWorkspace } from '#client/lib/session.ts';

/** Pages of one workspace; for a stranger they do not exist. */
export function WorkspaceLayout(): JSX.Element {
  const { workspace: slug } = useParams();
  const workspace = useOptionalWorkspace();
  const isMember = workspace !== null;
  useEffect(() => {
    if (isMember && slug !== undefined) {
      rememberWorkspace(slug);
    }
  }, [isMember, slug]);
  return isMember ? (
    <Outlet key={slug} />
  ) : (
    <>
      <h1 className="sr-only">Not found</h1>
      <NotFoundState />
    </>
  );
}
