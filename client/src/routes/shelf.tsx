import type { JSX } from 'react';

import { Page } from '#client/components/page.tsx';
import { Shelf } from '#client/features/shelf/components/shelf.tsx';
import { useWorkspace } from '#client/lib/session.ts';

/** /w/:workspace */
export function Component(): JSX.Element {
  const workspace = useWorkspace();
  return (
    <Page title={workspace.workspaceName}>
      <Shelf workspace={workspace.workspaceSlug} />
    </Page>
  );
}
