import { Inject, Injectable } from '@nestjs/common';

import { Problem } from '#common/errors/problem';
import type { Role } from '#common/schemas/auth';
import { AuditService } from '#server/audit/audit.service';
import { DATABASE, withTransaction, type Database, type Executor } from '#server/database/database';
import { assertCan, type RequestContext, type UserContext } from '#server/http/request-context';

import { MembersRepository } from './members.repository.js';
import { slugFrom } from './slug.js';
import {
  WorkspacesRepository,
  type WorkspaceChange,
  type WorkspaceOfMember,
} from './workspaces.repository.js';
import type { WorkspaceRow } from './workspace.table.js';

const maxSlugTries = 1000;

@Injectable()
export class WorkspacesService {
  constructor(
    private readonly repository: WorkspacesRepository,
    private readonly members: MembersRepository,
    private readonly audit: AuditService,
    @Inject(DATABASE) private readonly db: Database,
  ) {}

  /** Makes a workspace with a free slug near its name. It needs an owner next. */
  async createWorkspace(name: string, executor: Executor = this.db): Promise<WorkspaceRow> {
    const wanted = slugFrom(name);
    for (let attempt = 1; attempt <= maxSlugTries; attempt += 1) {
      const slug = attempt === 1 ? wanted : `${wanted}-${attempt}`;
      const row = await this.repository.insert({ name, slug }, executor);
      if (row !== null) {
        return row;
      }
    }
    throw new Error(`No free address name near ${wanted}.`);
  }

  /**
   * Gives a person a place in a workspace.
   * @throws {Problem} `member.already`
   */
  async addMember(
    workspaceId: string,
    userId: string,
    role: Role,
    executor: Executor = this.db,
  ): Promise<void> {
    if (!(await this.members.insert({ workspaceId, userId, role }, executor))) {
      throw new Problem('member.already');
    }
  }

  listOwn(context: UserContext): Promise<WorkspaceOfMember[]> {
    return this.repository.listOf(context.user.id);
  }

  async read(context: RequestContext): Promise<WorkspaceRow> {
    assertCan(context, 'workspace.read');
    return this.found(await this.repository.findById(context.workspace.id));
  }

  async update(context: RequestContext, change: WorkspaceChange): Promise<WorkspaceRow> {
    assertCan(context, 'workspace.update');
    const fields = Object.keys(change) as (keyof WorkspaceChange)[];
    if (fields.length === 0) {
      return this.read(context);
    }
    return withTransaction(this.db, async (tx) => {
      const row = await this.repository.update(context.workspace.id, change, tx);
      const detail = fields.map((field) => `${field}: ${String(change[field])}`).join(', ');
      await this.audit.record(context, 'workspace.update', undefined, detail, tx);
      return this.found(row);
    });
  }

  private found(row: WorkspaceRow | null): WorkspaceRow {
    if (row === null) {
      throw new Problem('workspace.not_found');
    }
    return row;
  }
}
