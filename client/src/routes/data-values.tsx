import type { JSX } from 'react';

import { Page, PageHeader } from '#client/components/page.tsx';
import { DataValues } from '#client/features/data-values/components/data-values.tsx';
import { useCan, useWorkspace } from '#client/lib/session.ts';

/** /w/:workspace/data */
export function Component(): JSX.Element {
  const { workspaceName, workspaceSlug } = useWorkspace();
  const mayEdit = useCan()('data.override');
  return (
    <Page title={`Data values of ${workspaceName}`} className="mx-auto w-full max-w-6xl">
      <PageHeader title="Data values" />
      <p className="mt-2 max-w-3xl text-soft">
        What the computations take from tables, and where each value comes from. A value of our own
        stands in place of the shipped one for everyone in {workspaceName}, and is marked as ours
        wherever it is used.
        {!mayEdit && ' Owners and crystallographers can put values of our own here.'}
      </p>
      <DataValues workspace={workspaceSlug} mayEdit={mayEdit} />
    </Page>
  );
}
