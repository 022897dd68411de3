import { useQuery } from '@tanstack/react-query';
import { useMemo, type JSX } from 'react';

import type { Draft, LatticeSummary } from '#common/schemas/lattice';
import { ErrorState } from '#client/components/error-state.tsx';
import { draftQuery } from '#client/features/cell-editor/api/draft.ts';
import { CellForm } from '#client/features/cell-editor/components/cell-form.tsx';
import { EnergyLine } from '#client/features/electrostatics/components/energy-line.tsx';
import { useResolvedCell } from '#client/features/cell-editor/hooks/use-resolved-cell.ts';
import { useLiveEvaluation } from '#client/features/electrostatics/hooks/use-live-evaluation.ts';
import {
  computedSections,
  type LatticeAddress,
} from '#client/features/lattices/hooks/use-lattice-address.ts';
import type { LatticeRef } from '#client/lib/lattice-keys.ts';
import { useCan } from '#client/lib/session.ts';
import { spaceGroupOf } from '#client/routes/lattice-page/frozen-revision.ts';
import { LatticeHeader } from '#client/routes/lattice-page/lattice-header.tsx';
import { LatticeScreen } from '#client/routes/lattice-page/lattice-screen.tsx';
import { PageSkeleton } from '#client/routes/lattice-page/page-skeleton.tsx';

interface UnsavedLatticeProps {
  latticeRef: LatticeRef;
  lattice: LatticeSummary;
  address: LatticeAddress;
  update: (change: Partial<LatticeAddress>) => void;
}

const nobody: ReadonlySet<string> = new Set();

function Loaded({
  latticeRef,
  lattice,
  address,
  update,
  draft,
}: UnsavedLatticeProps & { draft: Draft }): JSX.Element {
  const can = useCan();
  const resolved = useResolvedCell(draft.cell);
  const mayCompute = can('evaluation.run');
  const body = useMemo(
    () =>
      mayCompute && resolved.cell !== null ? { cell: draft.cell, method: draft.method } : null,
    [mayCompute, resolved.cell, draft],
  );
  const live = useLiveEvaluation(latticeRef.workspace, body);
  return (
    <LatticeScreen
      header={
        <LatticeHeader
          name={<h1 className="text-title tracking-[-0.02em]">{lattice.name}</h1>}
          meta={{
            formula: lattice.formula,
            prototype: draft.prototype,
            spaceGroup: spaceGroupOf(resolved, live.evaluation),
            revision: 0,
            state: 'draft',
            isEdited: true,
          }}
          actions={null}
        />
      }
      banner={
        <p className="mt-3 border-l-3 border-line bg-wash px-4 py-2.5">
          {lattice.author.name} is still working on this lattice: no revision is saved yet.
        </p>
      }
      resolved={resolved}
      live={live}
      address={address}
      update={update}
      annotations={[]}
      energetics={{
        workspace: latticeRef.workspace,
        content: draft,
        onModel: null,
      }}
      sections={['cell', ...computedSections, 'sites']}
      mayRemark={false}
      panels={{
        cell: (
          <CellForm
            content={draft}
            resolved={resolved}
            energy={<EnergyLine live={live} />}
            serverProblems={live.problem?.fields ?? []}
            pickedLabels={nobody}
            edit={null}
          />
        ),
      }}
    />
  );
}

/** A lattice that has only a draft, for those who may not edit it. */
export function UnsavedLattice(props: UnsavedLatticeProps): JSX.Element {
  const query = useQuery(draftQuery(props.latticeRef));
  if (query.isPending) {
    return <PageSkeleton />;
  }
  if (query.isError) {
    return <ErrorState error={query.error} onRetry={() => void query.refetch()} />;
  }
  return <Loaded {...props} draft={query.data} />;
}
