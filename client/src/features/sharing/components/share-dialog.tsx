import { useQuery } from '@tanstack/react-query';
import { useState, type JSX } from 'react';

import type { CreatedShare, ShareSummary } from '#common/schemas/sharing';
import { Button } from '#client/components/button.tsx';
import { CopyButton } from '#client/components/copy-button.tsx';
import { Dialog } from '#client/components/dialog.tsx';
import { ErrorState, InlineError } from '#client/components/error-state.tsx';
import { SelectField } from '#client/components/select-field.tsx';
import { SkeletonLines } from '#client/components/skeleton.tsx';
import { TextField } from '#client/components/text-field.tsx';
import { useToast } from '#client/components/toast.tsx';
import {
  sharesQuery,
  useCreateShare,
  useWithdrawShare,
} from '#client/features/sharing/api/shares.ts';
import { messageOf } from '#client/lib/api-error.ts';
import type { LatticeRef } from '#client/lib/lattice-keys.ts';
import { formatDay } from '#client/lib/relative-age.ts';
import { useCan } from '#client/lib/session.ts';

const expiries = [
  { value: '7', label: 'in 7 days' },
  { value: '30', label: 'in 30 days' },
  { value: '90', label: 'in 90 days' },
  { value: 'never', label: 'when it is withdrawn' },
] as const;
type Expiry = (typeof expiries)[number]['value'];

function NewLink({ created }: { created: CreatedShare }): JSX.Element {
  const address = `${window.location.origin}/s/${created.token}`;
  return (
    <div className="grid gap-2 border-l-3 border-holds bg-wash px-4 py-3">
      <p>
        The link to revision {created.revisionNumber}. It is shown <strong>this once</strong>: copy
        it now.
      </p>
      <div className="flex items-end gap-2">
        <TextField
          label="Link"
          isLabelHidden
          readOnly
          value={address}
          onFocus={(event) => event.target.select()}
          className="grow"
        />
        <CopyButton text={address} label="Copy the link" isNamed />
      </div>
    </div>
  );
}

function CreateLink({
  latticeRef,
  revision,
}: {
  latticeRef: LatticeRef;
  revision: number;
}): JSX.Element {
  const [expiry, setExpiry] = useState<Expiry>('30');
  const create = useCreateShare(latticeRef, revision);
  return (
    <div className="grid gap-3">
      <div className="flex flex-wrap items-end gap-3">
        <SelectField
          label="Link ends"
          options={expiries}
          value={expiry}
          onChange={setExpiry}
          className="min-w-52 grow"
        />
        <Button
          variant="primary"
          isBusy={create.isPending}
          onClick={() => create.mutate(expiry === 'never' ? null : Number(expiry))}
        >
          Create a link
        </Button>
      </div>
      <InlineError error={create.error} />
      {create.data !== undefined && <NewLink created={create.data} />}
    </div>
  );
}

/** Whether and until when a link works, in words. */
function standing(share: ShareSummary, nowMs: number): string {
  if (share.revokedAt !== null) {
    return `withdrawn ${formatDay(share.revokedAt)}`;
  }
  if (share.expiresAt === null) {
    return 'no end';
  }
  const word = Date.parse(share.expiresAt) < nowMs ? 'ended' : 'until';
  return `${word} ${formatDay(share.expiresAt)}`;
}

function Link({ latticeRef, share }: { latticeRef: LatticeRef; share: ShareSummary }): JSX.Element {
  const can = useCan();
  const show = useToast();
  const withdraw = useWithdrawShare(latticeRef);
  const [nowMs] = useState(() => Date.now());
  const isLive =
    share.revokedAt === null && (share.expiresAt === null || Date.parse(share.expiresAt) > nowMs);
  return (
    <li className="flex flex-wrap items-center gap-x-4 gap-y-1 py-2.5">
      <span className={isLive ? 'font-medium' : 'text-soft'}>revision {share.revisionNumber}</span>
      <span className="text-small text-soft">
        by {share.createdBy.name}, {formatDay(share.createdAt)} · {standing(share, nowMs)} · opened{' '}
        {share.openedCount === 1 ? 'once' : `${share.openedCount} times`}
      </span>
      {isLive && can('share.revoke', { authorId: share.createdBy.id }) && (
        <Button
          size="small"
          className="ml-auto"
          isBusy={withdraw.isPending}
          aria-label={`Withdraw the link to revision ${share.revisionNumber}`}
          onClick={() =>
            withdraw.mutate(share.id, {
              onSuccess: () => show({ message: 'The link is withdrawn.' }),
              onError: (error) => show({ message: messageOf(error), tone: 'failure' }),
            })
          }
        >
          Withdraw
        </Button>
      )}
    </li>
  );
}

function Links({ latticeRef }: { latticeRef: LatticeRef }): JSX.Element {
  const query = useQuery(sharesQuery(latticeRef));
  if (query.isPending) {
    return <SkeletonLines lines={2} label="Loading links" />;
  }
  if (query.isError) {
    return <ErrorState error={query.error} onRetry={() => void query.refetch()} />;
  }
  return query.data.length === 0 ? (
    <p className="text-soft">No link yet.</p>
  ) : (
    <ul className="rule-list max-h-60 overflow-y-auto">
      {query.data.map((share) => (
        <Link key={share.id} latticeRef={latticeRef} share={share} />
      ))}
    </ul>
  );
}

interface ShareDialogProps {
  latticeRef: LatticeRef;
  /** Revision a new link would show; 0 when none is saved. */
  revision: number;
  open: boolean;
  onClose: () => void;
}

/** Links to a frozen revision for people without an account. */
export function ShareDialog({
  latticeRef,
  revision,
  open,
  onClose,
}: ShareDialogProps): JSX.Element {
  const can = useCan();
  return (
    <Dialog open={open} onClose={onClose} title="Share" width="wide">
      <div className="grid gap-5">
        <p className="text-soft">
          Whoever has the link reads {revision === 0 ? 'a revision' : `revision ${revision}`}{' '}
          exactly as it is now, without an account, and nothing else.
        </p>
        {revision === 0 && <p>Save a revision first: a draft can’t be shared.</p>}
        {revision > 0 && can('share.create') && (
          <CreateLink latticeRef={latticeRef} revision={revision} />
        )}
        <section aria-label="Links">
          <h3 className="mb-1 font-bold">Links</h3>
          <Links latticeRef={latticeRef} />
        </section>
      </div>
    </Dialog>
  );
}
