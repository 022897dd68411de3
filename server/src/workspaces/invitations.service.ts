import { Inject, Injectable } from '@nestjs/common';

import { Problem } from '#common/errors/problem';
import type { Role } from '#common/schemas/auth';
import { secretToken } from '#common/schemas/shared';
import { AuditService } from '#server/audit/audit.service';
import { Clock } from '#server/config/clock';
import { DATABASE, withTransaction, type Database } from '#server/database/database';
import { isUniqueViolation } from '#server/database/database-errors';
import { isId } from '#server/http/is-id';
import { assertCan, type RequestContext } from '#server/http/request-context';
import { newSecretToken, secretTokenHash } from '#server/http/secret-token';
import { UsersService } from '#server/users/users.service';

import type { InvitationRow } from './invitation.table.js';
import { InvitationsRepository, type PendingInvitation } from './invitations.repository.js';
import { MembersRepository } from './members.repository.js';

/** How long an invitation can be accepted, in milliseconds. */
const invitationMs = 7 * 24 * 3_600_000;

@Injectable()
export class InvitationsService {
  constructor(
    private readonly invitations: InvitationsRepository,
    private readonly members: MembersRepository,
    private readonly users: UsersService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
    @Inject(DATABASE) private readonly db: Database,
  ) {}

  /**
   * Invites an address; an open invitation for it is replaced.
   * @returns the invitation and the token of its link, which is kept nowhere
   * @throws {Problem} `member.already`
   */
  async create(
    context: RequestContext,
    email: string,
    role: Role,
  ): Promise<{ invitation: InvitationRow; token: string }> {
    assertCan(context, 'invitation.create');
    if (await this.members.hasAddress(context.workspace.id, email)) {
      throw new Problem('member.already');
    }
    try {
      return await this.replace(context, email, role);
    } catch (error) {
      // Someone invited the same address at the same moment; theirs is open now, so replace it.
      if (isUniqueViolation(error, 'invitations_open')) {
        return this.replace(context, email, role);
      }
      throw error;
    }
  }

  async list(context: RequestContext): Promise<PendingInvitation[]> {
    assertCan(context, 'invitation.list');
    return this.invitations.listOpen(context.workspace.id, this.clock.now());
  }

  /** @throws {Problem} `invitation.not_found` */
  async withdraw(context: RequestContext, id: string): Promise<void> {
    assertCan(context, 'invitation.withdraw');
    const now = this.clock.now();
    await withTransaction(this.db, async (tx) => {
      const row = isId(id)
        ? await this.invitations.withdraw(context.workspace.id, id, now, tx)
        : null;
      if (row === null) {
        throw new Problem('invitation.not_found');
      }
      await this.audit.record(context, 'invitation.withdraw', row.email, undefined, tx);
    });
  }

  /**
   * What a link offers.
   * @throws {Problem} `invitation.not_found` when it was used, withdrawn, is out of date or was
   *   never made
   */
  async preview(token: string): Promise<{ invitation: PendingInvitation; hasAccount: boolean }> {
    const invitation = secretToken.safeParse(token).success
      ? await this.invitations.findOpen(secretTokenHash(token), this.clock.now())
      : null;
    if (invitation === null) {
      throw new Problem('invitation.not_found');
    }
    const account = await this.users.findByEmail(invitation.email);
    return { invitation, hasAccount: account !== null };
  }

  private async replace(
    context: RequestContext,
    email: string,
    role: Role,
  ): Promise<{ invitation: InvitationRow; token: string }> {
    const token = newSecretToken();
    const now = this.clock.now();
    const invitation = await withTransaction(this.db, async (tx) => {
      await this.invitations.withdrawAddress(context.workspace.id, email, now, tx);
      const row = await this.invitations.insert(
        {
          workspaceId: context.workspace.id,
          email,
          role,
          tokenHash: secretTokenHash(token),
          invitedById: context.user.id,
          createdAt: now,
          expiresAt: new Date(now.getTime() + invitationMs),
        },
        tx,
      );
      await this.audit.record(context, 'invitation.create', email, role, tx);
      return row;
    });
    return { invitation, token };
  }
}
