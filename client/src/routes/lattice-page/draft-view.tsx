import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect, useMemo, useState, type JSX } from 'react';

import { summariseCell } from '#common/physics/cell-summary';
import type { Draft, LatticeSummary, RevisionDetail } from '#common/schemas/lattice';
import { Button, ButtonLink } from '#client/components/button.tsx';
import { ErrorState } from '#client/components/error-state.tsx';
import { useToast } from '#client/components/toast.tsx';
import { draftQuery } from '#client/features/cell-editor/api/draft.ts';
import { CellSection } from '#client/features/cell-editor/components/cell-section.tsx';
import { ConflictDialog } from '#client/features/cell-editor/components/conflict-dialog.tsx';
import { isUnsaved, statusWords } from '#client/features/cell-editor/components/draft-bar.tsx';
import {
  useEditorHistory,
  useEditorStore,
  useKeeperStatus,
} from '#client/features/cell-editor/hooks/use-editor-store.ts';
import { EnergyLine } from '#client/features/electrostatics/components/energy-line.tsx';
import { useResolvedCell } from '#client/features/cell-editor/hooks/use-resolved-cell.ts';
import { contentOf, isSameContent } from '#client/features/cell-editor/model/editor-history.ts';
import type { EditorStore } from '#client/features/cell-editor/model/editor-store.ts';
import {
  useLiveEvaluation,
  type LiveEvaluation,
} from '#client/features/electrostatics/hooks/use-live-evaluation.ts';
import { pickedIons } from '#client/features/electrostatics/model/picked-ions.ts';
import { revisionQuery } from '#client/features/lattices/api/revisions.ts';
import { HistorySection } from '#client/features/lattices/components/history-section.tsx';
import { LatticeName } from '#client/features/lattices/components/lattice-name.tsx';
import { SaveRevisionDialog } from '#client/features/lattices/components/save-revision-dialog.tsx';
import {
  computedSections,
  type LatticeAddress,
} from '#client/features/lattices/hooks/use-lattice-address.ts';
import { annotationsQuery } from '#client/features/review/api/annotations.ts';
import { ApiError, messageOf } from '#client/lib/api-error.ts';
import type { LatticeRef } from '#client/lib/lattice-keys.ts';
import { useCan } from '#client/lib/session.ts';
import { frozenEvaluation, spaceGroupOf } from '#client/routes/lattice-page/frozen-revision.ts';
import { LatticeHeader } from '#client/routes/lattice-page/lattice-header.tsx';
import { LatticeScreen } from '#client/routes/lattice-page/lattice-screen.tsx';
import { PageSkeleton } from '#client/routes/lattice-page/page-skeleton.tsx';
import { RemarksPanel } from '#client/routes/lattice-page/remarks-panel.tsx';
import { ReturnReason } from '#client/routes/lattice-page/return-reason.tsx';
import { ReviewActions, ShareAction } from '#client/routes/lattice-page/review-actions.tsx';

interface DraftViewProps {
  latticeRef: LatticeRef;
  lattice: LatticeSummary;
  address: LatticeAddress;
  update: (change: Partial<LatticeAddress>) => void;
}

/** The newest revision, where there is one. */
function useHead({ latticeRef, lattice }: DraftViewProps): {
  head: RevisionDetail | null;
  isLoading: boolean;
} {
  const { data, isLoading } = useQuery(revisionQuery(latticeRef, lattice.headRevision));
  return { head: data ?? null, isLoading };
}

/** Before the newest revision is here one can't know whether its numbers are those of the draft. */
const waiting: LiveEvaluation = {
  evaluation: null,
  isPending: false,
  isBehind: true,
  problem: null,
  retry: null,
};

/** Takes in what others saved, where nothing here is unsaved, and says so. */
function useOthersEdits(store: EditorStore, draft: Draft): void {
  const show = useToast();
  useEffect(() => {
    if (store.receive(draft)) {
      show({ message: `${draft.updatedBy?.name ?? 'Someone'} changed this draft: shown now.` });
    }
  }, [store, draft, show]);
}

/** Saves the last edit and names the version that is to become a revision. */
async function settleDraft(store: EditorStore): Promise<string> {
  await store.keeper.flush();
  if (store.keeper.hasUnsaved) {
    throw new ApiError(0, 'draft.unsaved', statusWords(store.keeper.getStatus()));
  }
  return store.keeper.currentEtag;
}

function SaveAction({
  latticeRef,
  store,
  nextNumber,
  live,
  isReadable,
}: {
  latticeRef: LatticeRef;
  store: EditorStore;
  nextNumber: number;
  live: LiveEvaluation;
  isReadable: boolean;
}): JSX.Element {
  const [isOpen, setOpen] = useState(false);
  return (
    <>
      <Button
        variant="primary"
        disabled={!isReadable}
        title={isReadable ? undefined : 'Mend the fields of the cell first.'}
        onClick={() => setOpen(true)}
      >
        Save revision
      </Button>
      <SaveRevisionDialog
        latticeRef={latticeRef}
        open={isOpen}
        onClose={() => setOpen(false)}
        nextNumber={nextNumber}
        settleDraft={() => settleDraft(store)}
        onSaved={() => undefined}
        caution={
          live.problem === null ? null : `The revision will have no energy: ${live.problem.message}`
        }
      />
    </>
  );
}

function UnsavedMark({ store }: { store: EditorStore }): JSX.Element | null {
  const status = useKeeperStatus(store);
  return isUnsaved(status) ? (
    <span role="status" title={statusWords(status)} className="self-center text-small text-fails">
      ● unsaved changes
    </span>
  ) : null;
}

/** Opens another revision's cell in the editor: one step that can be undone. */
function useStartDraft(store: EditorStore, { latticeRef, update }: DraftViewProps) {
  const client = useQueryClient();
  const show = useToast();
  return (number: number): void => {
    client.fetchQuery(revisionQuery(latticeRef, number)).then(
      (revision) => {
        store.edit(contentOf(revision), null);
        update({ section: 'cell' });
        show({
          message: `The draft is now as revision ${number} was.`,
          action: { label: 'Undo', onAction: () => store.undo() },
        });
      },
      (error: unknown) => show({ message: messageOf(error), tone: 'failure' }),
    );
  };
}

function Conflict({ store }: { store: EditorStore }): JSX.Element {
  const status = useKeeperStatus(store);
  const { present } = useEditorHistory(store);
  const theirs = status.kind === 'conflict' ? status.theirs : null;
  return (
    <ConflictDialog
      theirs={theirs}
      mine={present}
      onTakeTheirs={() => theirs !== null && store.takeTheirs(theirs)}
      onKeepMine={() => theirs !== null && void store.keeper.keepMine(theirs)}
    />
  );
}

function Editor(props: DraftViewProps & { draft: Draft }): JSX.Element {
  const { latticeRef, lattice, draft, address, update } = props;
  const can = useCan();
  const store = useEditorStore(latticeRef, draft);
  useOthersEdits(store, draft);
  const { present } = useEditorHistory(store);
  const { head, isLoading } = useHead(props);
  const isEdited = head !== null && !isSameContent(present, head);
  const resolved = useResolvedCell(present.cell);
  const isReadable = resolved.cell !== null;
  const isHead = head !== null && !isEdited;
  const { cell, method } = present;
  const body = useMemo(
    () => (isReadable && !isHead && !isLoading ? { cell, method } : null),
    [isReadable, isHead, isLoading, cell, method],
  );
  const computed = useLiveEvaluation(latticeRef.workspace, body);
  const live = isLoading ? waiting : isHead ? frozenEvaluation(head) : computed;
  const annotations = useQuery(annotationsQuery(latticeRef, lattice.headRevision)).data ?? [];
  const startDraft = useStartDraft(store, props);
  const needsSaving = head === null ? lattice.headRevision === 0 : isEdited;
  const openRemarks = annotations.filter((one) => one.resolvedAt === null).length;
  const formula = useMemo(
    () =>
      resolved.shown === null || resolved.shown.sites.length === 0
        ? lattice.formula
        : summariseCell(resolved.shown).formula,
    [resolved.shown, lattice.formula],
  );
  const pickedLabels = useMemo(
    () =>
      new Set(
        resolved.shown === null
          ? []
          : pickedIons(resolved.shown, address.picked).map((ion) => ion.site.label),
      ),
    [resolved.shown, address.picked],
  );
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
            meta={{
              formula,
              prototype: draft.prototype,
              spaceGroup: spaceGroupOf(resolved, live.evaluation),
              revision: lattice.headRevision,
              state: head?.state ?? lattice.state,
              isEdited,
            }}
            actions={
              <>
                <UnsavedMark store={store} />
                {lattice.headRevision > 0 && (
                  <ButtonLink
                    to={`/w/${latticeRef.workspace}/lattices/${latticeRef.latticeId}/report?rev=${lattice.headRevision}`}
                  >
                    Report
                  </ButtonLink>
                )}
                <ShareAction latticeRef={latticeRef} revision={lattice.headRevision} />
                {head !== null && !(isEdited && head.state !== 'in_review') && (
                  <ReviewActions
                    latticeRef={latticeRef}
                    revision={head}
                    openRemarks={openRemarks}
                    isSecondary={needsSaving}
                  />
                )}
                {needsSaving && can('revision.save') && (
                  <SaveAction
                    latticeRef={latticeRef}
                    store={store}
                    nextNumber={lattice.headRevision + 1}
                    live={live}
                    isReadable={isReadable}
                  />
                )}
              </>
            }
          />
        }
        banner={head !== null && <ReturnReason revision={head} />}
        resolved={resolved}
        live={live}
        address={address}
        update={update}
        annotations={annotations}
        energetics={{
          workspace: latticeRef.workspace,
          content: present,
          onModel: can('draft.edit') ? (model, field) => store.edit({ model }, field) : null,
        }}
        sections={['cell', ...computedSections, 'sites', 'remarks', 'history']}
        mayRemark={can('annotation.create') && lattice.headRevision > 0}
        panels={{
          cell: (
            <CellSection
              latticeRef={latticeRef}
              store={store}
              resolved={resolved}
              energy={<EnergyLine live={live} />}
              serverProblems={live.problem?.fields ?? []}
              pickedLabels={pickedLabels}
              canDiscard={isEdited}
            />
          ),
          remarks: (
            <RemarksPanel
              latticeRef={latticeRef}
              revision={lattice.headRevision}
              cell={resolved.shown}
              address={address}
              update={update}
            />
          ),
          history: (
            <HistorySection
              latticeRef={latticeRef}
              shown={isHead ? lattice.headRevision : null}
              onOpen={(number) => update({ revision: number, section: 'energy', remark: null })}
              onStartDraft={startDraft}
            />
          ),
        }}
      />
      <Conflict store={store} />
    </>
  );
}

/** The lattice for those who may edit it: its draft, live. */
export function DraftView(props: DraftViewProps): JSX.Element {
  const query = useQuery(draftQuery(props.latticeRef));
  if (query.isPending) {
    return <PageSkeleton />;
  }
  if (query.isError) {
    return <ErrorState error={query.error} onRetry={() => void query.refetch()} />;
  }
  return <Editor key={props.latticeRef.latticeId} {...props} draft={query.data} />;
}
