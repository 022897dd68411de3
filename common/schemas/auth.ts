import { z } from 'zod';

import { id, secretToken, slug, timestamp } from '#common/schemas/shared';

export const passwordLimits = { minLength: 12, maxLength: 128 } as const;

const email = z
  .string()
  .trim()
  .toLowerCase()
  .max(254)
  .pipe(z.email('Write an e-mail address like name@example.org.'));
const password = z
  .string()
  .min(passwordLimits.minLength, `Use at least ${passwordLimits.minLength} characters.`)
  .max(passwordLimits.maxLength, `Use at most ${passwordLimits.maxLength} characters.`);
const personName = z.string().trim().min(1, 'Write a name.').max(80);

export const role = z.enum(['owner', 'crystallographer', 'reviewer', 'reader']);
export type Role = z.infer<typeof role>;

export const signInRequest = z.object({
  email,
  password: z.string().min(1, 'Write your password.').max(passwordLimits.maxLength),
});
export type SignInRequest = z.infer<typeof signInRequest>;

export const changePasswordRequest = z.object({
  currentPassword: z.string().min(1).max(128),
  newPassword: password,
});
export type ChangePasswordRequest = z.infer<typeof changePasswordRequest>;

export const updateProfileRequest = z.object({ name: personName });

/** One-time set-up of a server that starts empty. */
export const setupRequest = z.object({
  name: personName,
  email,
  password,
  workspaceName: z.string().trim().min(1).max(80),
});
export type SetupRequest = z.infer<typeof setupRequest>;

export const membershipSummary = z.object({
  workspaceId: id,
  workspaceSlug: slug,
  workspaceName: z.string(),
  role,
  readersMayComment: z.boolean(),
  requiresSecondPerson: z.boolean(),
});
export type MembershipSummary = z.infer<typeof membershipSummary>;

export const currentUser = z.object({
  id,
  name: z.string(),
  initials: z.string(),
  email: z.string(),
  memberships: z.array(membershipSummary),
});
export type CurrentUser = z.infer<typeof currentUser>;

/** What a visitor may know: who they are, whether the server needs its owner, the demo people. */
export const sessionState = z.object({
  user: currentUser.nullable(),
  needsSetup: z.boolean(),
  demo: z
    .object({
      workspaceName: z.string(),
      password: z.string(),
      people: z.array(z.object({ name: z.string(), email: z.string(), role })),
    })
    .nullable(),
});
export type SessionState = z.infer<typeof sessionState>;

export const sessionSummary = z.object({
  id: z.string(),
  isCurrent: z.boolean(),
  createdAt: timestamp,
  lastSeenAt: timestamp,
  expiresAt: timestamp,
  address: z.string().nullable(),
  userAgent: z.string().nullable(),
});
export type SessionSummary = z.infer<typeof sessionSummary>;
export const sessionList = z.object({ items: z.array(sessionSummary) });

/** Accepting an invitation: with a new account (name and password), or as the person signed in (neither). */
export const acceptInvitationRequest = z.object({
  name: personName.optional(),
  password: password.optional(),
});
export const invitationPreview = z.object({
  workspaceName: z.string(),
  workspaceSlug: slug,
  email: z.string(),
  role,
  invitedBy: z.string(),
  /** Whether an account with this address exists: then sign in first. */
  hasAccount: z.boolean(),
  expiresAt: timestamp,
});
export type InvitationPreview = z.infer<typeof invitationPreview>;
export const createInvitationRequest = z.object({ email, role });
export const createdInvitation = z.object({
  id,
  token: secretToken,
  email: z.string(),
  role,
  expiresAt: timestamp,
});
export const invitationSummary = z.object({
  id,
  email: z.string(),
  role,
  invitedBy: z.string(),
  createdAt: timestamp,
  expiresAt: timestamp,
});
export type InvitationSummary = z.infer<typeof invitationSummary>;
export const invitationList = z.object({ items: z.array(invitationSummary) });
