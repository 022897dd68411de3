import { Injectable } from '@nestjs/common';

import type { PageQuery } from '#common/schemas/shared';
import type { Executor } from '#server/database/database';
import { assertCan, type RequestContext, type UserContext } from '#server/http/request-context';

import { AuditRepository, type AuditEventRow } from './audit.repository.js';

/** Who did something and where, when there is no request of theirs to tell. */
export interface AuditActor {
  readonly userId: string | null;
  readonly workspaceId?: string | null;
  readonly address?: string | null;
}

const isContext = (who: RequestContext | UserContext | AuditActor): who is UserContext =>
  'user' in who;

@Injectable()
export class AuditService {
  constructor(private readonly repository: AuditRepository) {}

  /**
   * Keeps what happened. Pass the transaction of the change, so that neither is kept without the
   * other.
   * @param action `lattice.create`, `revision.accept` …
   * @param subject what it was done to, in words (a name, an address)
   */
  async record(
    who: RequestContext | UserContext | AuditActor,
    action: string,
    subject?: string,
    detail?: string,
    tx?: Executor,
  ): Promise<void> {
    const actor: AuditActor = isContext(who)
      ? {
          userId: who.user.id,
          workspaceId: 'workspace' in who ? who.workspace.id : null,
          address: who.address,
        }
      : who;
    await this.repository.insert(
      {
        workspaceId: actor.workspaceId ?? null,
        actorId: actor.userId,
        action,
        subject: subject ?? null,
        detail: detail ?? null,
        address: actor.address ?? null,
      },
      tx,
    );
  }

  /** A page of the workspace's log, newest first. */
  async list(
    context: RequestContext,
    { page, pageSize }: PageQuery,
  ): Promise<{ rows: AuditEventRow[]; total: number }> {
    assertCan(context, 'audit.read');
    return this.repository.page(context.workspace.id, (page - 1) * pageSize, pageSize);
  }
}
