import { createParamDecorator, SetMetadata, type ExecutionContext } from '@nestjs/common';

import type { WorkspaceAction } from '#common/policies/workspace-policy';

import { contextOf } from './request-state.js';

/** Who may call a route. */
export type RouteAccess =
  | { readonly kind: 'public' }
  | { readonly kind: 'signed-in' }
  | { readonly kind: 'member'; readonly action: WorkspaceAction };

export const ROUTE_ACCESS = 'holdfast:access';

const access = (value: RouteAccess) => SetMetadata(ROUTE_ACCESS, value);

/** Anyone may call it; its `@Context()` is a `VisitorContext`. */
export const Public = () => access({ kind: 'public' });

/** Anyone signed in may call it; its `@Context()` is a `UserContext`. */
export const SignedIn = () => access({ kind: 'signed-in' });

/**
 * A member of the workspace `:workspace` of the address who may do this; its `@Context()` is a
 * `RequestContext`. Strangers get 404 whether the workspace exists or not.
 */
export const Allow = (action: WorkspaceAction) => access({ kind: 'member', action });

/** The request's context, as rich as the route's access says. */
export const Context = createParamDecorator((_data: unknown, host: ExecutionContext) =>
  contextOf(host.switchToHttp().getRequest()),
);
