import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState, type JSX } from 'react';

import type { LatticeSummary, RevisionDetail } from '#common/schemas/lattice';
import { Button, ButtonLink } from '#client/components/button.tsx';
import { ConfirmDialog } from '#client/components/confirm-dialog.tsx';
import { ErrorState } from '#client/components/error-state.tsx';
import { useToast } from '#client/components/toast.tsx';
import { draftQuery, putDraft, readDraft } from '#client/features/cell-editor/api/draft.ts';
import { CellForm } from '#client/features/cell-editor/components/cell-form.tsx';
import { EnergyLine } from '#client/features/electrostatics/components/energy-line.tsx';
import { useResolvedCell } from '#client/features/cell-editor/hooks/use-resolved-cell.ts';
import { contentOf } from '#client/features/cell-editor/model/editor-history.ts';
import { rememberUnsaved } from '#client/features/cell-editor/model/unsaved-copy.ts';
import { pickedIons } from '#client/features/electrostatics/model/picked-ions.ts';
import { revisionQuery } from '#client/features/lattices/api/revisions.ts';
import { HistorySection } from '#client/features/lattices/components/history-section.tsx';
import { LatticeName } from '#client/features/lattices/components/lattice-name.tsx';
import {
  computedSections,
  type LatticeAddress,
} from '#client/features/lattices/hooks/use-lattice-address.ts';
import { annotationsQuery } from '#client/features/review/api/annotations.ts';
import { messageOf } from '#client/lib/api-error.ts';
import type { LatticeRef } from '#client/lib/lattice-keys.ts';
import { useCan } from '#client/lib/session.ts';
import { frozenEvaluation, metaOfRevision } from '#client/routes/lattice-page/frozen-revision.ts';
import { LatticeHeader } from '#client/routes/lattice-page/lattice-header.tsx';
import { LatticeScreen } from '#client/routes/lattice-page/lattice-screen.tsx';
import { PageSkeleton } from '#client/routes/lattice-page/page-skeleton.tsx';
import { RemarksPanel } from '#client/routes/lattice-page/remarks-panel.tsx';
import { ReturnReason } from '#client/routes/lattice-page/return-reason.tsx';
import { ReviewActions, ShareAction } from '#client/routes/lattice-page/review-actions.tsx';

interface RevisionViewProps {
  latticeRef: LatticeRef;
  lattice: LatticeSummary;
  number: number;
  address: LatticeAddress;
  update: (change: Partial<LatticeAddress>) => void;
}

/** Makes the draft what a revision is, and goes there. */
function useStartDraft({ latticeRef, update }: RevisionViewProps) {
  const client = useQueryClient();
  const show = useToast();
  return useMutation({
    mutationFn: async (number: number) => {
      const [revision, current] = await Promise.all([
        client.fetchQuery(revisionQuery(latticeRef, number)),
        readDraft(latticeRef),
      ]);
      return putDraft(latticeRef, contentOf(revision), current.etag);
    },
    onSuccess: (draft, number) => {
      rememberUnsaved(latticeRef.latticeId, null);
      client.setQueryData(draftQuery(latticeRef).queryKey, draft);
      update({ revision: null, section: 'cell' });
      show({ message: `The draft is now as revision ${number} was.` });
    },
    onError: (error) => show({ message: messageOf(error), tone: 'failure' }),
  });
}

function OlderBanner({
  number,
  head,
  onStart,
  isBusy,
  update,
}: {
  number: number;
  head: number;
  /** Null where the person may not edit. */
  onStart: (() => void) | null;
  isBusy: boolean;
  update: RevisionViewProps['update'];
}): JSX.Element {
  return (
    <div className="mt-3 flex flex-wrap items-center gap-x-4 gap-y-2 border-l-3 border-ink bg-wash px-4 py-2.5">
      <p>
        Revision {number}
        {number < head ? ` of ${head}` : ', the newest'}. It can be read, not changed.
      </p>
      <div className="flex gap-2 md:ml-auto">
        {onStart !== null && (
          <Button size="small" isBusy={isBusy} onClick={onStart}>
            Start a draft from this revision
          </Button>
        )}
        <Button size="small" variant="quiet" onClick={() => update({ revision: null })}>
          {onStart === null ? 'To the newest' : 'To the draft'}
        </Button>
      </div>
    </div>
  );
}

function Loaded(props: RevisionViewProps & { revision: RevisionDetail }): JSX.Element {
  const { latticeRef, lattice, revision, address, update } = props;
  const can = useCan();
  const resolved = useResolvedCell(revision.cell);
  const annotations = useQuery(annotationsQuery(latticeRef, revision.number)).data ?? [];
  const startDraft = useStartDraft(props);
  const [asked, setAsked] = useState<number | null>(null);
  const mayEdit = can('draft.edit');
  const start = (number: number): void =>
    lattice.hasDraft ? setAsked(number) : startDraft.mutate(number);
  const live = frozenEvaluation(revision);
  const openRemarks = annotations.filter((one) => one.resolvedAt === null).length;
  const isAddressed = address.revision !== null;
  return (
    <>
      <LatticeScreen
        header={
          <LatticeHeader
            name={
              <LatticeName
                latticeRef={latticeRef}
                name={lattice.name}
                mayRename={can('lattice.update')}
              />
            }
            meta={metaOfRevision(revision, resolved)}
            actions={
              <>
                <ButtonLink
                  to={`/w/${latticeRef.workspace}/lattices/${latticeRef.latticeId}/report?rev=${revision.number}`}
                >
                  Report
                </ButtonLink>
                <ShareAction latticeRef={latticeRef} revision={revision.number} />
                {revision.number === lattice.headRevision && (
                  <ReviewActions
                    latticeRef={latticeRef}
                    revision={revision}
                    openRemarks={openRemarks}
                  />
                )}
              </>
            }
          />
        }
        banner={
          <>
            {isAddressed && (
              <OlderBanner
                number={revision.number}
                head={lattice.headRevision}
                onStart={mayEdit ? () => start(revision.number) : null}
                isBusy={startDraft.isPending}
                update={update}
              />
            )}
            <ReturnReason revision={revision} />
          </>
        }
        resolved={resolved}
        live={live}
        address={address}
        update={update}
        annotations={annotations}
        energetics={{
          workspace: latticeRef.workspace,
          content: revision,
          onModel: null,
        }}
        sections={['cell', ...computedSections, 'sites', 'remarks', 'history']}
        mayRemark={can('annotation.create')}
        panels={{
          cell: (
            <CellForm
              content={revision}
              resolved={resolved}
              energy={<EnergyLine live={live} />}
              serverProblems={revision.evaluationProblem?.fields ?? []}
              pickedLabels={
                new Set(
                  resolved.shown === null
                    ? []
                    : pickedIons(resolved.shown, address.picked).map((ion) => ion.site.label),
                )
              }
              edit={null}
            />
          ),
          remarks: (
            <RemarksPanel
              latticeRef={latticeRef}
              revision={revision.number}
              cell={resolved.shown}
              address={address}
              update={update}
            />
          ),
          history: (
            <HistorySection
              latticeRef={latticeRef}
              shown={revision.number}
              onOpen={(number) => update({ revision: number, section: 'energy', remark: null })}
              onStartDraft={mayEdit ? start : null}
            />
          ),
        }}
      />
      <ConfirmDialog
        open={asked !== null}
        onClose={() => setAsked(null)}
        title="Replace the draft?"
        confirmLabel="Replace"
        isBusy={startDraft.isPending}
        onConfirm={() =>
          asked !== null && startDraft.mutate(asked, { onSettled: () => setAsked(null) })
        }
      >
        There is a draft with edits that are not in any revision. It becomes a copy of revision{' '}
        {asked}.
      </ConfirmDialog>
    </>
  );
}

/** One saved revision: to be read, remarked on and decided about, never changed. */
export function RevisionView(props: RevisionViewProps): JSX.Element {
  const query = useQuery(revisionQuery(props.latticeRef, props.number));
  if (query.isPending) {
    return <PageSkeleton />;
  }
  if (query.isError) {
    return (
      <ErrorState
        error={query.error}
        onRetry={() => void query.refetch()}
        action={
          props.address.revision === null ? undefined : (
            <Button onClick={() => props.update({ revision: null })}>To the newest</Button>
          )
        }
      />
    );
  }
  return <Loaded key={props.number} {...props} revision={query.data} />;
}
