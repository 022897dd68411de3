import { queryOptions, useQuery, useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useCallback } from 'react';
import { useParams } from 'react-router-dom';

import { can, type PolicySubject, type WorkspaceAction } from '#common/policies/workspace-policy';
import {
  sessionState,
  type CurrentUser,
  type MembershipSummary,
  type SessionState,
} from '#common/schemas/auth';
import { api } from '#client/lib/api-client.ts';

/** Who is here, whether the server needs its owner, the demo people. */
export const sessionQuery = queryOptions({
  queryKey: ['session'],
  queryFn: ({ signal }) => api.get('/session', { schema: sessionState, signal }),
  staleTime: 5 * 60_000,
  refetchOnWindowFocus: 'always',
});

/** Forgets the person; what the signed-in layout shows next is the sign-in page. */
export function endSession(client: QueryClient): void {
  client.setQueryData(sessionQuery.queryKey, (state) =>
    state === undefined ? undefined : { ...state, user: null },
  );
}

/** The session; suspends until it is known. */
export function useSession(): SessionState {
  return useSuspenseQuery(sessionQuery).data;
}

/** The person signed in; for pages below the signed-in layout only. */
export function useCurrentUser(): CurrentUser {
  const { user } = useSession();
  if (user === null) {
    throw new Error('This part of the page needs someone signed in.');
  }
  return user;
}

function useMembership(): { user: CurrentUser | null; membership: MembershipSummary | null } {
  const { workspace } = useParams();
  const user = useQuery(sessionQuery).data?.user ?? null;
  const membership = user?.memberships.find((one) => one.workspaceSlug === workspace) ?? null;
  return { user, membership };
}

/** The person's membership in the workspace of the address. */
export function useWorkspace(): MembershipSummary {
  const { membership } = useMembership();
  if (membership === null) {
    throw new Error('This part of the page needs a workspace.');
  }
  return membership;
}

/** Like {@link useWorkspace}, null outside a workspace or for a stranger. */
export function useOptionalWorkspace(): MembershipSummary | null {
  return useMembership().membership;
}

/** Asks the shared policy whether the person may do something here; nobody may do anything. */
export function useCan(): (action: WorkspaceAction, subject?: PolicySubject) => boolean {
  const { user, membership } = useMembership();
  return useCallback(
    (action, subject) =>
      can(
        user === null || membership === null
          ? null
          : {
              userId: user.id,
              role: membership.role,
              readersMayComment: membership.readersMayComment,
              requiresSecondPerson: membership.requiresSecondPerson,
            },
        action,
        subject,
      ),
    [user, membership],
  );
}
