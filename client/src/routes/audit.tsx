import type { JSX } from 'react';

import { NoAccess } from '#client/components/no-access.tsx';
import { Page, PageHeader } from '#client/components/page.tsx';
import { AuditLog } from '#client/features/workspaces/components/audit-log.tsx';
import { useCan, useWorkspace } from '#client/lib/session.ts';

/** /w/:workspace/audit */
export function Component(): JSX.Element {
  const workspace = useWorkspace();
  const can = useCan();
  return (
    <Page title={`Audit log of ${workspace.workspaceName}`} width="reading">
      <PageHeader title="Audit log" />
      {can('audit.read') ? (
        <AuditLog workspace={workspace.workspaceSlug} />
      ) : (
        <NoAccess>Only an owner of {workspace.workspaceName} can read its audit log.</NoAccess>
      )}
    </Page>
  );
}
