import type { JSX } from 'react';

import { Page } from '#client/components/page.tsx';
import { Members } from '#client/features/members/components/members.tsx';
import { useWorkspace } from '#client/lib/session.ts';

/** /w/:workspace/members */
export function Component(): JSX.Element {
  const workspace = useWorkspace();
  return (
    <Page title={`Members of ${workspace.workspaceName}`} width="reading">
      <Members workspace={workspace} />
    </Page>
  );
}
