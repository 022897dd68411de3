import { Inject, Injectable } from '@nestjs/common';
import type { z } from 'zod';

import { Problem, type FieldProblem } from '#common/errors/problem';
import type { acceptInvitationRequest } from '#common/schemas/auth';
import { AuditService } from '#server/audit/audit.service';
import { assertStrongPassword } from '#server/auth/password-rules';
import { Clock } from '#server/config/clock';
import {
  DATABASE,
  withTransaction,
  type Database,
  type Transaction,
} from '#server/database/database';
import type { VisitorContext } from '#server/http/request-context';
import { UsersService } from '#server/users/users.service';

import { InvitationsRepository, type PendingInvitation } from './invitations.repository.js';
import { InvitationsService } from './invitations.service.js';
import { WorkspacesService } from './workspaces.service.js';

type Asked = z.infer<typeof acceptInvitationRequest>;

/** Who has joined, and whether their account is new. */
export interface Accepted {
  readonly user: { id: string; email: string };
  readonly isNew: boolean;
}

@Injectable()
export class AcceptInvitationService {
  constructor(
    private readonly invitations: InvitationsService,
    private readonly repository: InvitationsRepository,
    private readonly workspaces: WorkspacesService,
    private readonly users: UsersService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
    @Inject(DATABASE) private readonly db: Database,
  ) {}

  /**
   * Accepts an invitation, as the person signed in or with a new account.
   * @throws {Problem} `invitation.not_found`; `auth.required` when the address has an account and
   *   nobody is signed in; `auth.forbidden` when someone else is signed in; `request.invalid` and
   *   `auth.weak_password` for a new account
   */
  async accept(context: VisitorContext, token: string, asked: Asked): Promise<Accepted> {
    const { invitation, hasAccount } = await this.invitations.preview(token);
    if (context.user !== null) {
      return this.join(invitation, context, this.sameAddress(invitation, context.user));
    }
    if (hasAccount) {
      throw new Problem('auth.required', `Sign in as ${invitation.email} to accept.`);
    }
    const account = this.newAccount(invitation, asked);
    return this.join(invitation, context, (tx) => this.users.createUser(account, tx));
  }

  private sameAddress(invitation: PendingInvitation, user: { id: string; email: string }) {
    if (user.email.toLowerCase() !== invitation.email.toLowerCase()) {
      throw new Problem(
        'auth.forbidden',
        `This invitation is for ${invitation.email}. Sign out, then open the link again.`,
      );
    }
    return user;
  }

  private newAccount(invitation: PendingInvitation, { name, password }: Asked) {
    const missing = (field: string, message: string): FieldProblem => ({
      code: 'request.invalid',
      field,
      message,
    });
    if (name === undefined || password === undefined) {
      throw new Problem('request.invalid', 'A new account needs a name and a password.', {
        fields: [
          ...(name === undefined ? [missing('name', 'Write your name.')] : []),
          ...(password === undefined ? [missing('password', 'Choose a password.')] : []),
        ],
      });
    }
    const account = { name, password, email: invitation.email };
    assertStrongPassword(password, account, 'password');
    return account;
  }

  private async join(
    invitation: PendingInvitation,
    context: VisitorContext,
    who: { id: string; email: string } | ((tx: Transaction) => Promise<Accepted['user']>),
  ): Promise<Accepted> {
    const isNew = typeof who === 'function';
    const user = await withTransaction(this.db, async (tx) => {
      const person = isNew ? await who(tx) : who;
      if (!(await this.repository.markAccepted(invitation.id, person.id, this.clock.now(), tx))) {
        throw new Problem('invitation.not_found');
      }
      await this.workspaces.addMember(invitation.workspaceId, person.id, invitation.role, tx);
      await this.audit.record(
        { userId: person.id, workspaceId: invitation.workspaceId, address: context.address },
        'invitation.accept',
        undefined,
        invitation.role,
        tx,
      );
      return { id: person.id, email: person.email };
    });
    return { user, isNew };
  }
}
