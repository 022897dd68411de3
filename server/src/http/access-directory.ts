import type { Role } from '#common/schemas/auth';

import type { ContextUser, ContextWorkspace } from './request-context.js';

export interface Membership {
  readonly workspace: ContextWorkspace;
  readonly role: Role;
}

/** What the access guard must know; the workspaces module answers. */
export abstract class AccessDirectory {
  /** The person, null when the account is gone. */
  abstract findUser(userId: string): Promise<ContextUser | null>;
  /** The person's place in a workspace, null for strangers and for no such workspace alike. */
  abstract findMembership(userId: string, workspaceSlug: string): Promise<Membership | null>;
}
