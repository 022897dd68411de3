import { z } from 'zod';

import { role } from '#common/schemas/auth';
import { id, pageOf, slug, timestamp } from '#common/schemas/shared';

export const workspaceDetail = z.object({
  id,
  slug,
  name: z.string(),
  role,
  readersMayComment: z.boolean(),
  requiresSecondPerson: z.boolean(),
  createdAt: timestamp,
});
export type WorkspaceDetail = z.infer<typeof workspaceDetail>;
export const workspaceList = z.object({ items: z.array(workspaceDetail) });

export const updateWorkspaceRequest = z.object({
  name: z.string().trim().min(1).max(80).optional(),
  readersMayComment: z.boolean().optional(),
  requiresSecondPerson: z.boolean().optional(),
});

export const member = z.object({
  userId: id,
  name: z.string(),
  initials: z.string(),
  email: z.string(),
  role,
  joinedAt: timestamp,
});
export type Member = z.infer<typeof member>;
export const memberList = z.object({ items: z.array(member) });
export const changeRoleRequest = z.object({ role });

export const auditEvent = z.object({
  id,
  at: timestamp,
  actorName: z.string().nullable(),
  /** `lattice.create`, `revision.accept`, `auth.sign_in` … */
  action: z.string(),
  subject: z.string().nullable(),
  detail: z.string().nullable(),
});
export type AuditEvent = z.infer<typeof auditEvent>;
export const auditPage = pageOf(auditEvent);
