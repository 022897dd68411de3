import { useQuery } from '@tanstack/react-query';
import type { JSX } from 'react';

import type { RevisionSummary } from '#common/schemas/lattice';
import { Button } from '#client/components/button.tsx';
import { CertainText } from '#client/components/chem/certain-number.tsx';
import { FormulaText } from '#client/components/chem/formula-text.tsx';
import { EmptyState } from '#client/components/empty-state.tsx';
import { ErrorState } from '#client/components/error-state.tsx';
import { PersonBadge } from '#client/components/person-badge.tsx';
import { RelativeTime } from '#client/components/relative-time.tsx';
import { SkeletonLines } from '#client/components/skeleton.tsx';
import { StateBadge } from '#client/components/state-badge.tsx';
import { COULOMB_RELATIVE_UNCERTAINTY } from '#common/units/constants';
import { revisionsQuery } from '#client/features/lattices/api/revisions.ts';
import { classNames } from '#client/lib/class-names.ts';
import type { LatticeRef } from '#client/lib/lattice-keys.ts';

interface HistorySectionProps {
  latticeRef: LatticeRef;
  /** Revision that is shown now; null while a draft is. */
  shown: number | null;
  onOpen: (number: number) => void;
  /** Null where the person may not edit. */
  onStartDraft: ((number: number) => void) | null;
}

/** Who did what with it after it was saved. */
function Decision({ revision }: { revision: RevisionSummary }): JSX.Element | null {
  const { decidedBy, decidedAt, submittedBy, submittedAt, decisionReason, state } = revision;
  if (decidedBy !== null && decidedAt !== null && (state === 'accepted' || state === 'returned')) {
    return (
      <p className="text-small text-soft">
        {state} by {decidedBy.name} <RelativeTime at={decidedAt} />
        {decisionReason !== null && decisionReason !== '' && (
          <span className="block text-ink">“{decisionReason}”</span>
        )}
      </p>
    );
  }
  return state === 'in_review' && submittedBy !== null && submittedAt !== null ? (
    <p className="text-small text-soft">
      submitted by {submittedBy.name} <RelativeTime at={submittedAt} />
    </p>
  ) : null;
}

function Energy({ revision }: { revision: RevisionSummary }): JSX.Element {
  const energy = revision.energyEvPerFormulaUnit;
  return energy === null ? (
    <span className="text-small text-soft">no energy</span>
  ) : (
    <span>
      <CertainText
        value={energy.value}
        bound={energy.bound + Math.abs(energy.value) * COULOMB_RELATIVE_UNCERTAINTY}
        unit="eV"
      />{' '}
      <span className="text-small text-soft">eV</span>
    </span>
  );
}

function Entry({
  revision,
  isShown,
  onOpen,
  onStartDraft,
}: Pick<HistorySectionProps, 'onOpen' | 'onStartDraft'> & {
  revision: RevisionSummary;
  isShown: boolean;
}): JSX.Element {
  return (
    <li
      className={classNames(
        'grid gap-1.5 py-4 pl-2.5',
        isShown && 'bg-raised shadow-[inset_3px_0_0_var(--ink)]',
      )}
    >
      <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1 pr-2">
        <h2 className="text-lead">Revision {revision.number}</h2>
        <StateBadge state={revision.state} />
        {revision.formula !== null && <FormulaText formula={revision.formula} />}
        <span className="ml-auto">
          <Energy revision={revision} />
        </span>
      </div>
      {revision.note !== '' && <p className="whitespace-pre-wrap">{revision.note}</p>}
      <p className="flex flex-wrap items-center gap-x-2 text-small text-soft">
        <PersonBadge name={revision.author.name} initials={revision.author.initials} isNamed />
        <RelativeTime at={revision.createdAt} />
      </p>
      <Decision revision={revision} />
      <div className="flex flex-wrap items-center gap-2">
        {isShown ? (
          <span className="text-small text-soft">shown now</span>
        ) : (
          <Button size="small" onClick={() => onOpen(revision.number)}>
            Open
          </Button>
        )}
        {onStartDraft !== null && (
          <Button size="small" variant="quiet" onClick={() => onStartDraft(revision.number)}>
            Start a draft from this revision
          </Button>
        )}
      </div>
    </li>
  );
}

/** Every saved state of the lattice, newest first. */
export function HistorySection(props: HistorySectionProps): JSX.Element {
  const query = useQuery(revisionsQuery(props.latticeRef));
  if (query.isPending) {
    return <SkeletonLines label="Loading revisions" />;
  }
  if (query.isError) {
    return <ErrorState error={query.error} onRetry={() => void query.refetch()} />;
  }
  if (query.data.length === 0) {
    return (
      <EmptyState title="No revision yet">
        The draft saves itself; a revision is a state you name and keep.
      </EmptyState>
    );
  }
  return (
    <ol className="rule-list" aria-label="Revisions">
      {query.data.map((revision) => (
        <Entry
          key={revision.id}
          revision={revision}
          isShown={revision.number === props.shown}
          onOpen={props.onOpen}
          onStartDraft={props.onStartDraft}
        />
      ))}
    </ol>
  );
}
