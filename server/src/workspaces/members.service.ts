import { Inject, Injectable } from '@nestjs/common';

import { Problem } from '#common/errors/problem';
import type { Role } from '#common/schemas/auth';
import { AuditService } from '#server/audit/audit.service';
import {
  DATABASE,
  withTransaction,
  type Database,
  type Transaction,
} from '#server/database/database';
import { isCheckViolation } from '#server/database/database-errors';
import { isId } from '#server/http/is-id';
import { assertCan, type RequestContext } from '#server/http/request-context';

import { MembersRepository, type MemberRow } from './members.repository.js';

@Injectable()
export class MembersService {
  constructor(
    private readonly members: MembersRepository,
    private readonly audit: AuditService,
    @Inject(DATABASE) private readonly db: Database,
  ) {}

  async list(context: RequestContext): Promise<MemberRow[]> {
    assertCan(context, 'member.list');
    return this.members.list(context.workspace.id);
  }

  /** @throws {Problem} `member.not_found`, `member.last_owner` */
  async changeRole(context: RequestContext, userId: string, role: Role): Promise<MemberRow> {
    assertCan(context, 'member.change_role');
    return this.keepingAnOwner(async (tx) => {
      const member = await this.find(context, userId, tx);
      if (member.role !== role) {
        await this.members.setRole(context.workspace.id, userId, role, tx);
        const detail = `${member.role} → ${role}`;
        await this.audit.record(context, 'member.change_role', member.name, detail, tx);
      }
      return { ...member, role };
    });
  }

  /**
   * Takes a member out; also how one leaves.
   * @throws {Problem} `auth.forbidden`, `member.not_found`, `member.last_owner`
   */
  async remove(context: RequestContext, userId: string): Promise<void> {
    const isLeaving = userId === context.user.id;
    assertCan(context, isLeaving ? 'workspace.leave' : 'member.remove');
    await this.keepingAnOwner(async (tx) => {
      const member = await this.find(context, userId, tx);
      await this.members.remove(context.workspace.id, userId, tx);
      if (isLeaving) {
        await this.audit.record(context, 'member.leave', undefined, undefined, tx);
      } else {
        await this.audit.record(context, 'member.remove', member.name, member.role, tx);
      }
    });
  }

  private async find(context: RequestContext, userId: string, tx: Transaction): Promise<MemberRow> {
    const member = isId(userId) ? await this.members.find(context.workspace.id, userId, tx) : null;
    if (member === null) {
      throw new Problem('member.not_found');
    }
    return member;
  }

  /** The database refuses, when the transaction ends, to leave a workspace without an owner. */
  private async keepingAnOwner<T>(work: (tx: Transaction) => Promise<T>): Promise<T> {
    try {
      return await withTransaction(this.db, work);
    } catch (error) {
      if (isCheckViolation(error, 'memberships_keep_owner')) {
        throw new Problem('member.last_owner');
      }
      throw error;
    }
  }
}
