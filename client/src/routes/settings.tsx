import type { JSX } from 'react';
import { Link } from 'react-router-dom';

import { NoAccess } from '#client/components/no-access.tsx';
import { Page, PageHeader } from '#client/components/page.tsx';
import { WorkspaceSettings } from '#client/features/workspaces/components/workspace-settings.tsx';
import { useCan, useWorkspace } from '#client/lib/session.ts';

/** /w/:workspace/settings */
export function Component(): JSX.Element {
  const workspace = useWorkspace();
  const can = useCan();
  return (
    <Page title={`Settings of ${workspace.workspaceName}`} width="reading">
      <PageHeader title="Settings" />
      {can('workspace.update') ? (
        <>
          <WorkspaceSettings workspace={workspace} />
          <p className="border-t border-line py-6">
            <Link
              to={`/w/${workspace.workspaceSlug}/data`}
              className="underline decoration-line underline-offset-4 hover:decoration-ink"
            >
              Data values
            </Link>
            : what the computations take from tables, and values of our own in their place.
          </p>
        </>
      ) : (
        <NoAccess>Only an owner of {workspace.workspaceName} can change its settings.</NoAccess>
      )}
    </Page>
  );
}
