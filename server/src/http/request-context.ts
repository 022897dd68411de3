import { Problem } from '#common/errors/problem';
import {
  can,
  type PolicySubject,
  type WorkspaceAction,
  type WorkspaceActor,
} from '#common/policies/workspace-policy';

export interface ContextUser {
  readonly id: string;
  readonly name: string;
  readonly email: string;
}

export interface ContextWorkspace {
  readonly id: string;
  readonly slug: string;
  readonly name: string;
  readonly requiresSecondPerson: boolean;
  readonly readersMayComment: boolean;
}

/** Of a `@Public()` route: anyone, signed in or not. */
export interface VisitorContext {
  readonly requestId: string;
  readonly address: string | null;
  readonly user: ContextUser | null;
}

/** Of a `@SignedIn()` route. */
export interface UserContext extends VisitorContext {
  readonly user: ContextUser;
}

/** Of an `@Allow(action)` route: a member of the workspace in the address. */
export interface RequestContext extends UserContext {
  readonly workspace: ContextWorkspace;
  readonly actor: WorkspaceActor;
}

/**
 * First line of every service method of a workspace.
 * @throws {Problem} `auth.forbidden`
 */
export function assertCan(
  context: Pick<RequestContext, 'actor'>,
  action: WorkspaceAction,
  subject?: PolicySubject,
): void {
  if (!can(context.actor, action, subject)) {
    throw new Problem('auth.forbidden');
  }
}
