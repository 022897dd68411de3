import { useQuery } from '@tanstack/react-query';
import type { JSX } from 'react';
import { useParams } from 'react-router-dom';

import { ButtonLink } from '#client/components/button.tsx';
import { ErrorState } from '#client/components/error-state.tsx';
import { NotFoundState } from '#client/components/not-found-state.tsx';
import { Page } from '#client/components/page.tsx';
import { latticeQuery } from '#client/features/lattices/api/lattice.ts';
import { useLatticeAddress } from '#client/features/lattices/hooks/use-lattice-address.ts';
import { hasCode } from '#client/lib/api-error.ts';
import type { LatticeRef } from '#client/lib/lattice-keys.ts';
import { useCan, useWorkspace } from '#client/lib/session.ts';
import { DraftView } from '#client/routes/lattice-page/draft-view.tsx';
import { PageSkeleton } from '#client/routes/lattice-page/page-skeleton.tsx';
import { RevisionView } from '#client/routes/lattice-page/revision-view.tsx';
import { UnsavedLattice } from '#client/routes/lattice-page/unsaved-lattice.tsx';

function Lattice({ latticeRef }: { latticeRef: LatticeRef }): JSX.Element {
  const can = useCan();
  const [address, update] = useLatticeAddress();
  const query = useQuery(latticeQuery(latticeRef));
  if (query.isPending) {
    return (
      <Page title="Lattice">
        <PageSkeleton />
      </Page>
    );
  }
  if (query.isError) {
    const isMissing =
      hasCode(query.error, 'lattice.not_found') || hasCode(query.error, 'request.invalid');
    return (
      <Page title="Lattice">
        <h1 className="sr-only">Lattice</h1>
        {isMissing ? (
          <NotFoundState />
        ) : (
          <ErrorState
            error={query.error}
            onRetry={() => void query.refetch()}
            action={<ButtonLink to={`/w/${latticeRef.workspace}`}>To the shelf</ButtonLink>}
          />
        )}
      </Page>
    );
  }
  const lattice = query.data;
  const view = { latticeRef, lattice, address, update };
  const number = address.revision ?? (can('draft.edit') ? null : lattice.headRevision);
  return (
    <Page title={lattice.name}>
      {number === null && <DraftView {...view} />}
      {number === 0 && <UnsavedLattice {...view} />}
      {number !== null && number > 0 && <RevisionView {...view} number={number} />}
    </Page>
  );
}

/** `/w/:workspace/lattices/:lattice`: the lattice, what binds it, and the talk about it. */
export function Component(): JSX.Element {
  const { lattice = '' } = useParams();
  const { workspaceSlug } = useWorkspace();
  return <Lattice key={lattice} latticeRef={{ workspace: workspaceSlug, latticeId: lattice }} />;
}
