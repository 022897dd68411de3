import { useQuery } from '@tanstack/react-query';
import type { JSX } from 'react';
import { Link } from 'react-router-dom';

import type { MembershipSummary } from '#common/schemas/auth';
import { shelfPage } from '#common/schemas/lattice';
import { api } from '#client/lib/api-client.ts';
import { latticesKey } from '#client/lib/query-keys.ts';
import { useCan } from '#client/lib/session.ts';

/** How many lattices wait for someone of this person's role; the number leads to them. */
export function WaitingPill({ workspace }: { workspace: MembershipSummary }): JSX.Element | null {
  const can = useCan();
  const state = can('revision.return') ? 'in_review' : can('revision.save') ? 'returned' : null;
  const { data: count } = useQuery({
    queryKey: [...latticesKey(workspace.workspaceSlug), 'waiting', state],
    queryFn: ({ signal }) =>
      api.get(`/workspaces/${workspace.workspaceSlug}/lattices`, {
        schema: shelfPage,
        query: { state, pageSize: 1 },
        signal,
      }),
    enabled: state !== null,
    select: (page) => page.total,
    refetchInterval: 60_000,
  });
  if (state === null || count === undefined || count === 0) {
    return null;
  }
  return (
    <Link
      to={`/w/${workspace.workspaceSlug}?state=${state}`}
      className="rounded-full border border-line bg-raised px-3 py-0.5 text-small whitespace-nowrap hover:border-faint max-lg:hidden"
    >
      {state === 'in_review' ? `${count} in review` : `${count} returned`}
    </Link>
  );
}
