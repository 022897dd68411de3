import { Check, MessageSquareReply, RotateCcw } from 'lucide-react';
import { useState, type JSX } from 'react';

import type { Annotation, AnnotationAnchor } from '#common/schemas/review';
import { Button } from '#client/components/button.tsx';
import { InlineError } from '#client/components/error-state.tsx';
import { PersonBadge } from '#client/components/person-badge.tsx';
import { RelativeTime } from '#client/components/relative-time.tsx';
import { useReply, useSettle } from '#client/features/review/api/annotations.ts';
import { RemarkForm } from '#client/features/review/components/remark-form.tsx';
import { anchorWords } from '#client/features/review/model/anchors.ts';
import { classNames } from '#client/lib/class-names.ts';
import type { LatticeRef } from '#client/lib/lattice-keys.ts';
import { useCan } from '#client/lib/session.ts';

interface RemarkCardProps {
  latticeRef: LatticeRef;
  annotation: Annotation;
  isCurrent: boolean;
  /** Shows in the stage and the ledger what the remark is pinned to. */
  onShow: (annotation: Annotation) => void;
}

function AnchorButton({
  anchor,
  onShow,
}: {
  anchor: AnnotationAnchor;
  onShow: () => void;
}): JSX.Element {
  const words = `on ${anchorWords(anchor)}`;
  return anchor.kind === 'revision' ? (
    <span className="text-small text-soft">{words}</span>
  ) : (
    <button
      type="button"
      onClick={onShow}
      title="Show it in the stage"
      className="rounded-control text-left text-small text-soft underline decoration-line underline-offset-4 hover:text-ink"
    >
      {words}
    </button>
  );
}

function Said({
  by,
  at,
  text,
}: {
  by: Annotation['author'];
  at: string;
  text: string;
}): JSX.Element {
  return (
    <div>
      <p className="flex flex-wrap items-center gap-x-2 text-small text-soft">
        <PersonBadge name={by.name} initials={by.initials} isNamed />
        <RelativeTime at={at} />
      </p>
      <p className="mt-1 whitespace-pre-wrap">{text}</p>
    </div>
  );
}

function Actions({
  latticeRef,
  annotation,
  onReply,
}: {
  latticeRef: LatticeRef;
  annotation: Annotation;
  onReply: () => void;
}): JSX.Element {
  const can = useCan();
  const settle = useSettle(latticeRef, annotation.id);
  const isResolved = annotation.resolvedAt !== null;
  const maySettle = can('annotation.resolve', { authorId: annotation.author.id });
  return (
    <>
      <div className="flex flex-wrap gap-1 empty:hidden">
        {can('annotation.reply') && (
          <Button size="small" variant="quiet" onClick={onReply}>
            <MessageSquareReply aria-hidden className="size-4" /> Reply
          </Button>
        )}
        {maySettle && (
          <Button
            size="small"
            variant="quiet"
            isBusy={settle.isPending}
            onClick={() => settle.mutate(isResolved ? 'reopen' : 'resolve')}
          >
            {isResolved ? (
              <RotateCcw aria-hidden className="size-4" />
            ) : (
              <Check aria-hidden className="size-4" />
            )}
            {isResolved ? 'Reopen' : 'Resolve'}
          </Button>
        )}
      </div>
      <InlineError error={settle.error} />
    </>
  );
}

/** One remark with its thread. */
export function RemarkCard({
  latticeRef,
  annotation,
  isCurrent,
  onShow,
}: RemarkCardProps): JSX.Element {
  const [isReplying, setReplying] = useState(false);
  const reply = useReply(latticeRef, annotation.id);
  const isResolved = annotation.resolvedAt !== null;
  return (
    <li
      id={`remark-${annotation.number}`}
      aria-current={isCurrent || undefined}
      className={classNames(
        'grid grid-cols-[auto_1fr] gap-x-3 py-4 pl-2.5',
        isCurrent && 'bg-raised shadow-[inset_3px_0_0_var(--ink)]',
      )}
    >
      <span
        className={classNames(
          'grid size-5.5 place-items-center rounded-full rounded-bl-[3px] text-[12px] font-bold',
          isResolved ? 'border border-line text-soft' : 'bg-ink text-paper',
        )}
      >
        <span className="sr-only">Remark </span>
        {annotation.number}
      </span>
      <div className="grid min-w-0 gap-2">
        <div className="flex flex-wrap items-baseline justify-between gap-x-3">
          <AnchorButton anchor={annotation.anchor} onShow={() => onShow(annotation)} />
          {annotation.resolvedBy !== null && annotation.resolvedAt !== null && (
            <span className="flex items-center gap-1 text-small text-holds">
              <Check aria-hidden className="size-3.5" /> resolved by {annotation.resolvedBy.name}
            </span>
          )}
        </div>
        <Said by={annotation.author} at={annotation.createdAt} text={annotation.text} />
        {annotation.replies.length > 0 && (
          <ul className="grid gap-3 border-l border-line pl-4">
            {annotation.replies.map((one) => (
              <li key={one.id}>
                <Said by={one.author} at={one.createdAt} text={one.text} />
              </li>
            ))}
          </ul>
        )}
        {isReplying ? (
          <RemarkForm
            label="Reply"
            submitLabel="Reply"
            error={reply.error}
            onCancel={() => setReplying(false)}
            onSubmit={async (text) => {
              await reply.mutateAsync(text);
              setReplying(false);
            }}
          />
        ) : (
          <Actions
            latticeRef={latticeRef}
            annotation={annotation}
            onReply={() => setReplying(true)}
          />
        )}
      </div>
    </li>
  );
}
