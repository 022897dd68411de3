import { Inject, Injectable } from '@nestjs/common';

import { Problem } from '#common/errors/problem';
import type { SetupRequest } from '#common/schemas/auth';
import { AuditService } from '#server/audit/audit.service';
import { assertStrongPassword } from '#server/auth/password-rules';
import { APP_CONFIG, type AppConfig } from '#server/config/environment';
import { DATABASE, withTransaction, type Database } from '#server/database/database';
import { InstallationRepository } from '#server/installation/installation.repository';
import { UsersService } from '#server/users/users.service';

import { WorkspacesService } from './workspaces.service.js';

/** Gives an empty server its first owner, once. */
@Injectable()
export class SetupService {
  constructor(
    private readonly users: UsersService,
    private readonly workspaces: WorkspacesService,
    private readonly installation: InstallationRepository,
    private readonly audit: AuditService,
    @Inject(DATABASE) private readonly db: Database,
    @Inject(APP_CONFIG) private readonly config: AppConfig,
  ) {}

  /**
   * Makes the owner and their workspace.
   * @throws {Problem} `setup.done` when anyone has an account or the server runs the demo,
   *   `auth.weak_password`
   */
  async setUp(asked: SetupRequest): Promise<{ id: string; email: string }> {
    if (this.config.isDemo || (await this.users.hasAny())) {
      throw new Problem('setup.done');
    }
    assertStrongPassword(asked.password, asked, 'password');
    return withTransaction(this.db, async (tx) => {
      await this.installation.lock(tx);
      if (await this.users.hasAny(tx)) {
        throw new Problem('setup.done');
      }
      const user = await this.users.createUser(asked, tx);
      const workspace = await this.workspaces.createWorkspace(asked.workspaceName, tx);
      await this.workspaces.addMember(workspace.id, user.id, 'owner', tx);
      const who = { userId: user.id, workspaceId: workspace.id };
      await this.audit.record(who, 'workspace.create', workspace.name, undefined, tx);
      return { id: user.id, email: user.email };
    });
  }
}
