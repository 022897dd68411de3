import type { JSX } from 'react';
import { Navigate } from 'react-router-dom';

import { EmptyState } from '#client/components/empty-state.tsx';
import { Page } from '#client/components/page.tsx';
import { readLastWorkspace } from '#client/lib/last-workspace.ts';
import { useCurrentUser } from '#client/lib/session.ts';

/** `/`: the workspace seen last, else the first one. */
export function Home(): JSX.Element {
  const { memberships } = useCurrentUser();
  const last = readLastWorkspace();
  const target = memberships.find((one) => one.workspaceSlug === last) ?? memberships[0];
  if (target !== undefined) {
    return <Navigate to={`/w/${target.workspaceSlug}`} replace />;
  }
  return (
    <Page title="No workspace">
      <h1 className="sr-only">No workspace</h1>
      <EmptyState title="You belong to no workspace yet">
        Ask the owner of your group’s workspace for an invitation, and open the link they send.
      </EmptyState>
    </Page>
  );
}
