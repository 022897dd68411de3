import { useQuery } from '@tanstack/react-query';
import type { JSX } from 'react';
import { useSearchParams } from 'react-router-dom';

import type { AuditEvent } from '#common/schemas/workspace';
import { EmptyState } from '#client/components/empty-state.tsx';
import { ErrorState } from '#client/components/error-state.tsx';
import { Paging } from '#client/components/paging.tsx';
import { SkeletonLines } from '#client/components/skeleton.tsx';
import { auditPageQuery, auditPageSize } from '#client/features/workspaces/api/audit.ts';
import { actionWords } from '#client/features/workspaces/audit-words.ts';
import { classNames } from '#client/lib/class-names.ts';
import { formatExact } from '#client/lib/relative-age.ts';

function Event({ event }: { event: AuditEvent }): JSX.Element {
  return (
    <li className="grid gap-x-5 py-2.5 md:grid-cols-[13rem_minmax(0,1fr)]">
      <time dateTime={event.at} className="text-small text-soft md:pt-0.5">
        {formatExact(event.at)}
      </time>
      <span>
        <span className="font-medium">{event.actorName ?? 'Someone unknown'}</span>{' '}
        {actionWords(event.action)}
        {event.subject !== null && <span className="font-medium"> {event.subject}</span>}
        {event.detail !== null && <span className="block text-soft">{event.detail}</span>}
      </span>
    </li>
  );
}

function readPage(params: URLSearchParams): number {
  const page = Number(params.get('page') ?? '1');
  return Number.isInteger(page) && page >= 1 ? page : 1;
}

/** What happened in the workspace, and who did it. */
export function AuditLog({ workspace }: { workspace: string }): JSX.Element {
  const [params] = useSearchParams();
  const page = readPage(params);
  const { data, error, isPending, isPlaceholderData, refetch } = useQuery(
    auditPageQuery(workspace, page),
  );
  if (isPending) {
    return <SkeletonLines lines={8} label="Loading the audit log" />;
  }
  if (data === undefined) {
    return <ErrorState error={error} onRetry={() => void refetch()} />;
  }
  if (data.items.length === 0) {
    return <EmptyState title="Nothing is recorded here" />;
  }
  return (
    <>
      <ol
        className={classNames(
          'rule-list mt-5 border-y border-line',
          isPlaceholderData && 'opacity-60',
        )}
      >
        {data.items.map((event) => (
          <Event key={event.id} event={event} />
        ))}
      </ol>
      <Paging
        page={page}
        pageSize={auditPageSize}
        total={data.total}
        addressOf={(target) => ({ search: target === 1 ? '' : `page=${target}` })}
      />
    </>
  );
}
