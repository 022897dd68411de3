import { useQuery } from '@tanstack/react-query';
import { useEffect, useState, type JSX } from 'react';

import type { Annotation, AnnotationAnchor } from '#common/schemas/review';
import { EmptyState } from '#client/components/empty-state.tsx';
import { ErrorState } from '#client/components/error-state.tsx';
import { Segmented } from '#client/components/segmented.tsx';
import { SkeletonLines } from '#client/components/skeleton.tsx';
import { annotationsQuery, useCreateAnnotation } from '#client/features/review/api/annotations.ts';
import { RemarkCard } from '#client/features/review/components/remark-card.tsx';
import { RemarkForm } from '#client/features/review/components/remark-form.tsx';
import { anchorWords } from '#client/features/review/model/anchors.ts';
import type { LatticeRef } from '#client/lib/lattice-keys.ts';
import { useCan } from '#client/lib/session.ts';

interface RemarksSectionProps {
  latticeRef: LatticeRef;
  /** Revision the remarks belong to; 0 when none is saved yet. */
  revision: number;
  /** What is picked right now: a new remark can be pinned to it. */
  anchors: readonly AnnotationAnchor[];
  /** Number of the remark whose pin was clicked. */
  current: number | null;
  onShow: (annotation: Annotation) => void;
}

const anchorKey = (anchor: AnnotationAnchor): string => JSON.stringify(anchor);

function NewRemark({
  latticeRef,
  revision,
  anchors,
}: Omit<RemarksSectionProps, 'current' | 'onShow'>): JSX.Element {
  const create = useCreateAnnotation(latticeRef, revision);
  const [chosen, setChosen] = useState<string | null>(null);
  const anchor =
    anchors.find((one) => anchorKey(one) === chosen) ??
    anchors[0] ??
    ({ kind: 'revision' } as const);
  return (
    <div className="grid gap-3 border-b border-line pb-5">
      {anchors.length > 1 ? (
        <Segmented
          label="Pin the remark to"
          className="flex-wrap justify-self-start"
          value={anchorKey(anchor)}
          options={anchors.map((one) => ({ value: anchorKey(one), label: anchorWords(one) }))}
          onChange={setChosen}
        />
      ) : (
        <p className="text-small text-soft">
          Pick an ion in the stage or a row of the pair ledger to pin the remark to it.
        </p>
      )}
      <RemarkForm
        label={`New remark on ${anchorWords(anchor)}`}
        submitLabel="Pin remark"
        error={create.error}
        onSubmit={(text) => create.mutateAsync({ anchor, text })}
      />
    </div>
  );
}

function List(props: RemarksSectionProps): JSX.Element {
  const { latticeRef, revision, current } = props;
  const query = useQuery(annotationsQuery(latticeRef, revision));
  useEffect(() => {
    if (current !== null && query.isSuccess) {
      document.getElementById(`remark-${current}`)?.scrollIntoView({ block: 'nearest' });
    }
  }, [current, query.isSuccess]);
  if (query.isPending) {
    return <SkeletonLines label="Loading remarks" />;
  }
  if (query.isError) {
    return <ErrorState error={query.error} onRetry={() => void query.refetch()} />;
  }
  if (query.data.length === 0) {
    return (
      <EmptyState title={`No remark on revision ${revision}`}>
        Remarks are pinned to an ion, a pair or the whole revision, and stay with it.
      </EmptyState>
    );
  }
  return (
    <ul className="rule-list">
      {query.data.map((annotation) => (
        <RemarkCard
          key={annotation.id}
          latticeRef={latticeRef}
          annotation={annotation}
          isCurrent={annotation.number === current}
          onShow={props.onShow}
        />
      ))}
    </ul>
  );
}

/** The conversation about one revision. */
export function RemarksSection(props: RemarksSectionProps): JSX.Element {
  const can = useCan();
  if (props.revision === 0) {
    return (
      <EmptyState title="No revision to remark on yet">
        Save a revision first: remarks belong to a state that no longer changes.
      </EmptyState>
    );
  }
  return (
    <section aria-label={`Remarks on revision ${props.revision}`}>
      {can('annotation.create') && <NewRemark {...props} />}
      <List {...props} />
    </section>
  );
}
