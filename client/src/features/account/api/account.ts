import {
  queryOptions,
  useMutation,
  useQueryClient,
  type UseMutationResult,
} from '@tanstack/react-query';
import type { z } from 'zod';

import {
  currentUser,
  sessionList,
  type ChangePasswordRequest,
  type CurrentUser,
  type updateProfileRequest,
} from '#common/schemas/auth';
import { done } from '#common/schemas/shared';
import { api } from '#client/lib/api-client.ts';
import { sessionQuery } from '#client/lib/session.ts';

export type ProfileChange = z.infer<typeof updateProfileRequest>;

/** Where the person is signed in. */
export const sessionsQuery = queryOptions({
  queryKey: ['me', 'sessions'],
  queryFn: ({ signal }) => api.get('/me/sessions', { schema: sessionList, signal }),
});

/** Changes the person's name. */
export function useUpdateProfile(): UseMutationResult<CurrentUser, unknown, ProfileChange> {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: ProfileChange) => api.patch('/me', { schema: currentUser, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: sessionQuery.queryKey }),
  });
}

/** Changes the password; sessions elsewhere may end with it, so the list is fetched again. */
export function useChangePassword(): UseMutationResult<
  { ok: true },
  unknown,
  ChangePasswordRequest
> {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: ChangePasswordRequest) => api.post('/me/password', { schema: done, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: sessionsQuery.queryKey }),
  });
}

/** Ends one of the person's sessions. */
export function useRevokeSession(): UseMutationResult<{ ok: true }, unknown, { id: string }> {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id }: { id: string }) =>
      api.delete(`/me/sessions/${encodeURIComponent(id)}`, { schema: done }),
    onSuccess: () => client.invalidateQueries({ queryKey: sessionsQuery.queryKey }),
  });
}
