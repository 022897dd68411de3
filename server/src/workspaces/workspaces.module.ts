import { Global, Module } from '@nestjs/common';

import { AuthModule } from '#server/auth/auth.module';
import { AccessDirectory } from '#server/http/access-directory';
import { UsersModule } from '#server/users/users.module';

import { AcceptInvitationService } from './accept-invitation.service.js';
import { InvitationsController } from './invitations.controller.js';
import { InvitationsRepository } from './invitations.repository.js';
import { InvitationsService } from './invitations.service.js';
import { MembersController } from './members.controller.js';
import { MembersRepository } from './members.repository.js';
import { MembersService } from './members.service.js';
import { SetupController } from './setup.controller.js';
import { SetupService } from './setup.service.js';
import { WorkspaceDirectoryRepository } from './workspace-directory.repository.js';
import { WorkspaceInvitationsController } from './workspace-invitations.controller.js';
import { WorkspacesController } from './workspaces.controller.js';
import { WorkspacesRepository } from './workspaces.repository.js';
import { WorkspacesService } from './workspaces.service.js';

/** Global because the access guard, which is everywhere, asks its directory. */
@Global()
@Module({
  imports: [UsersModule, AuthModule],
  controllers: [
    WorkspacesController,
    MembersController,
    WorkspaceInvitationsController,
    InvitationsController,
    SetupController,
  ],
  providers: [
    AcceptInvitationService,
    InvitationsRepository,
    InvitationsService,
    MembersRepository,
    MembersService,
    SetupService,
    WorkspacesRepository,
    WorkspacesService,
    { provide: AccessDirectory, useClass: WorkspaceDirectoryRepository },
  ],
  exports: [AccessDirectory, WorkspacesService],
})
export class WorkspacesModule {}
