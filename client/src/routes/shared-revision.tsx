import { useQuery } from '@tanstack/react-query';
import type { JSX } from 'react';
import { Link, useParams } from 'react-router-dom';

import type { SharedRevision } from '#common/schemas/sharing';
import { ButtonLink } from '#client/components/button.tsx';
import { Logo } from '#client/components/logo.tsx';
import { EmptyState } from '#client/components/empty-state.tsx';
import { ErrorState } from '#client/components/error-state.tsx';
import { Page } from '#client/components/page.tsx';
import { CellForm } from '#client/features/cell-editor/components/cell-form.tsx';
import { EnergyLine } from '#client/features/electrostatics/components/energy-line.tsx';
import { useResolvedCell } from '#client/features/cell-editor/hooks/use-resolved-cell.ts';
import {
  computedSections,
  useLatticeAddress,
} from '#client/features/lattices/hooks/use-lattice-address.ts';
import { sharedReportAddress } from '#client/features/report/api/report.ts';
import { sharedRevisionQuery } from '#client/features/sharing/api/shares.ts';
import { ApiError } from '#client/lib/api-error.ts';
import { formatDay, formatExact } from '#client/lib/relative-age.ts';
import { frozenEvaluation, metaOfRevision } from '#client/routes/lattice-page/frozen-revision.ts';
import { LatticeHeader } from '#client/routes/lattice-page/lattice-header.tsx';
import { LatticeScreen } from '#client/routes/lattice-page/lattice-screen.tsx';
import { PageSkeleton } from '#client/routes/lattice-page/page-skeleton.tsx';

const nobody: ReadonlySet<string> = new Set();

function Provenance({ shared }: { shared: SharedRevision }): JSX.Element {
  const { revision, workspaceName, expiresAt } = shared;
  return (
    <p className="mt-3 border-l-3 border-ink bg-wash px-4 py-2.5 text-small">
      Revision {revision.number} by {revision.author.name}, {workspaceName}, saved{' '}
      <time dateTime={revision.createdAt}>{formatExact(revision.createdAt)}</time>. Exactly as it
      was saved; it can be read, not changed.
      {expiresAt !== null && ` The link ends ${formatDay(expiresAt)}.`}
      {revision.note !== '' && <span className="mt-1 block text-body">“{revision.note}”</span>}
    </p>
  );
}

function Shown({ shared, token }: { shared: SharedRevision; token: string }): JSX.Element {
  const { revision } = shared;
  const [address, update] = useLatticeAddress();
  const resolved = useResolvedCell(revision.cell);
  return (
    <LatticeScreen
      header={
        <LatticeHeader
          name={<h1 className="text-title tracking-[-0.02em]">{revision.latticeName}</h1>}
          meta={metaOfRevision(revision, resolved)}
          actions={
            <ButtonLink to={sharedReportAddress(token)} reloadDocument download>
              Report as PDF
            </ButtonLink>
          }
        />
      }
      banner={<Provenance shared={shared} />}
      resolved={resolved}
      live={frozenEvaluation(revision)}
      address={address}
      update={update}
      annotations={[]}
      energetics={{ workspace: null, content: revision, onModel: null }}
      sections={['cell', ...computedSections, 'sites']}
      mayRemark={false}
      panels={{
        cell: (
          <CellForm
            content={revision}
            resolved={resolved}
            energy={<EnergyLine live={frozenEvaluation(revision)} />}
            serverProblems={revision.evaluationProblem?.fields ?? []}
            pickedLabels={nobody}
            edit={null}
          />
        ),
      }}
    />
  );
}

function Content({ token }: { token: string }): JSX.Element {
  const query = useQuery(sharedRevisionQuery(token));
  if (query.isPending) {
    return (
      <Page title="Shared revision">
        <PageSkeleton />
      </Page>
    );
  }
  if (query.isError) {
    const isGone =
      query.error instanceof ApiError && (query.error.status === 404 || query.error.status === 400);
    return (
      <Page title="Shared revision">
        <h1 className="sr-only">Shared revision</h1>
        {isGone ? (
          <EmptyState title="This link shows nothing">
            It was withdrawn, is out of date, or is not complete. Ask whoever sent it for a new one.
          </EmptyState>
        ) : (
          <ErrorState error={query.error} onRetry={() => void query.refetch()} />
        )}
      </Page>
    );
  }
  return (
    <Page title={query.data.revision.latticeName}>
      <Shown shared={query.data} token={token} />
    </Page>
  );
}

/** `/s/:token`: one frozen revision for someone without an account. */
export function Component(): JSX.Element {
  const { token = '' } = useParams();
  return (
    <div className="flex min-h-dvh flex-col">
      <header className="flex h-14 items-center gap-4 border-b border-line px-4 md:px-7">
        <Logo />
        <span className="text-soft">shared revision</span>
        <Link to="/methods" className="ml-auto text-small underline-offset-4 hover:underline">
          Methods
        </Link>
      </header>
      <main id="main" tabIndex={-1} className="grow">
        <Content key={token} token={token} />
      </main>
    </div>
  );
}
