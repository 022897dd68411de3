import { useQuery } from '@tanstack/react-query';
import type { JSX } from 'react';

import type { SessionSummary } from '#common/schemas/auth';
import { Button } from '#client/components/button.tsx';
import { ErrorState } from '#client/components/error-state.tsx';
import { RelativeTime } from '#client/components/relative-time.tsx';
import { SkeletonLines } from '#client/components/skeleton.tsx';
import { useToast } from '#client/components/toast.tsx';
import { sessionsQuery, useRevokeSession } from '#client/features/account/api/account.ts';
import { describeDevice } from '#client/features/account/describe-device.ts';
import { messageOf } from '#client/lib/api-error.ts';

function Session({ session }: { session: SessionSummary }): JSX.Element {
  const revoke = useRevokeSession();
  const show = useToast();
  const device = describeDevice(session.userAgent);
  const end = (): void =>
    revoke.mutate(
      { id: session.id },
      {
        onSuccess: () => show({ message: 'That session has ended' }),
        onError: (error) => show({ message: messageOf(error), tone: 'failure' }),
      },
    );
  return (
    <li className="flex items-center gap-5 py-3">
      <span className="min-w-0 grow">
        <span className="block font-medium">{device}</span>
        <span className="block text-small text-soft">
          {session.address !== null && `${session.address}, `}
          last seen <RelativeTime at={session.lastSeenAt} />, signed in{' '}
          <RelativeTime at={session.createdAt} />
        </span>
      </span>
      {session.isCurrent ? (
        <span className="text-small whitespace-nowrap text-soft">this one</span>
      ) : (
        <Button
          size="small"
          aria-label={`End the session on ${device}`}
          isBusy={revoke.isPending}
          onClick={end}
        >
          End
        </Button>
      )}
    </li>
  );
}

/** Everywhere the person is signed in; any but this one can be ended here. */
export function Sessions(): JSX.Element {
  const { data, error, isPending, refetch } = useQuery(sessionsQuery);
  if (isPending) {
    return <SkeletonLines lines={3} label="Loading the sessions" />;
  }
  if (data === undefined) {
    return <ErrorState error={error} onRetry={() => void refetch()} />;
  }
  return (
    <ul className="rule-list mt-3 border-y border-line">
      {data.items.map((session) => (
        <Session key={session.id} session={session} />
      ))}
    </ul>
  );
}
