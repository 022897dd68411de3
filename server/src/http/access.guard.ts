import { Injectable, type CanActivate, type ExecutionContext } from '@nestjs/common';
import { Reflector } from '@nestjs/core';
import type { Request } from 'express';

import { Problem } from '#common/errors/problem';
import { can, type WorkspaceAction } from '#common/policies/workspace-policy';
import { slug as slugSchema } from '#common/schemas/shared';

import { AccessDirectory } from './access-directory.js';
import { ROUTE_ACCESS, type RouteAccess } from './access.decorators.js';
import type { RequestContext, UserContext, VisitorContext } from './request-context.js';
import { requestIdOf, setContext } from './request-state.js';

/** Lets a request through to its handler if the route's declared access allows it. */
@Injectable()
export class AccessGuard implements CanActivate {
  constructor(
    private readonly reflector: Reflector,
    private readonly directory: AccessDirectory,
  ) {}

  async canActivate(host: ExecutionContext): Promise<boolean> {
    const access = this.reflector.getAllAndOverride<RouteAccess | undefined>(ROUTE_ACCESS, [
      host.getHandler(),
      host.getClass(),
    ]);
    if (access === undefined) {
      throw new Error(`${host.getClass().name}.${host.getHandler().name} declares no access.`);
    }
    const request = host.switchToHttp().getRequest<Request>();
    const visitor = await this.visitor(request);
    setContext(request, await this.admit(access, visitor, request));
    return true;
  }

  private async visitor(request: Request): Promise<VisitorContext> {
    const userId = request.session?.userId;
    return {
      requestId: requestIdOf(request),
      address: request.ip ?? null,
      user: userId === undefined ? null : await this.directory.findUser(userId),
    };
  }

  private async admit(
    access: RouteAccess,
    visitor: VisitorContext,
    request: Request,
  ): Promise<VisitorContext> {
    if (access.kind === 'public') {
      return visitor;
    }
    const { user } = visitor;
    if (user === null) {
      throw new Problem('auth.required');
    }
    const context: UserContext = { ...visitor, user };
    return access.kind === 'signed-in'
      ? context
      : this.member(access.action, context, String(request.params['workspace'] ?? ''));
  }

  private async member(
    action: WorkspaceAction,
    context: UserContext,
    slug: string,
  ): Promise<RequestContext> {
    const isSlug = slugSchema.safeParse(slug).success;
    const membership = isSlug ? await this.directory.findMembership(context.user.id, slug) : null;
    if (membership === null) {
      throw new Problem('workspace.not_found');
    }
    const { workspace, role } = membership;
    const actor = {
      userId: context.user.id,
      role,
      readersMayComment: workspace.readersMayComment,
      requiresSecondPerson: workspace.requiresSecondPerson,
    };
    if (!can(actor, action)) {
      throw new Problem('auth.forbidden');
    }
    return { ...context, workspace, actor };
  }
}
