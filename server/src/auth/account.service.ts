import { Injectable } from '@nestjs/common';
import type { Request } from 'express';

import type { ChangePasswordRequest, CurrentUser } from '#common/schemas/auth';
import { AuditService } from '#server/audit/audit.service';
import { Clock } from '#server/config/clock';
import type { UserContext } from '#server/http/request-context';
import { UsersService } from '#server/users/users.service';

import { assertStrongPassword } from './password-rules.js';
import { SessionsService } from './sessions.service.js';
import { SignInService } from './sign-in.service.js';

/** What people do with their own account. */
@Injectable()
export class AccountService {
  constructor(
    private readonly users: UsersService,
    private readonly sessions: SessionsService,
    private readonly signIn: SignInService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  async rename(context: UserContext, name: string): Promise<CurrentUser> {
    await this.users.rename(context.user.id, name);
    const user = await this.users.currentUser(context.user.id);
    return user!;
  }

  /**
   * Changes the password, ends the person's sessions elsewhere and gives this one a new id.
   * @throws {Problem} `auth.bad_credentials`, `auth.slowed`, `auth.weak_password`
   */
  async changePassword(
    context: UserContext,
    request: Request,
    asked: ChangePasswordRequest,
  ): Promise<void> {
    const { user } = context;
    assertStrongPassword(asked.newPassword, user, 'newPassword');
    await this.signIn.confirmPassword(user.id, asked.currentPassword);
    await this.users.setPassword(user.id, asked.newPassword, this.clock.now());
    await this.sessions.start(request, user.id);
    await this.sessions.revokeOthers(request, user.id);
    await this.audit.record(context, 'auth.change_password');
  }
}
