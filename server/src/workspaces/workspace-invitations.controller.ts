import { Body, Controller, Delete, Get, Param, Post } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { z } from 'zod';

import { createdInvitation, createInvitationRequest, invitationList } from '#common/schemas/auth';
import { done } from '#common/schemas/shared';
import { Allow, Context } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import type { RequestContext } from '#server/http/request-context';

import { presentInvitation } from './invitation.presenter.js';
import { InvitationsService } from './invitations.service.js';

@ApiTags('members')
@Controller('workspaces/:workspace/invitations')
export class WorkspaceInvitationsController {
  constructor(private readonly service: InvitationsService) {}

  @Get()
  @Allow('invitation.list')
  @Answers(invitationList)
  async list(@Context() context: RequestContext): Promise<z.infer<typeof invitationList>> {
    return { items: (await this.service.list(context)).map(presentInvitation) };
  }

  @Post()
  @Allow('invitation.create')
  @Answers(createdInvitation, 201)
  async create(
    @Context() context: RequestContext,
    @Body({ schema: createInvitationRequest }) body: z.infer<typeof createInvitationRequest>,
  ): Promise<z.infer<typeof createdInvitation>> {
    const { invitation, token } = await this.service.create(context, body.email, body.role);
    const { id, email, role, expiresAt } = invitation;
    return { id, token, email, role, expiresAt: expiresAt.toISOString() };
  }

  @Delete(':invitation')
  @Allow('invitation.withdraw')
  @Answers(done)
  async withdraw(
    @Context() context: RequestContext,
    @Param('invitation') invitation: string,
  ): Promise<z.infer<typeof done>> {
    await this.service.withdraw(context, invitation);
    return { ok: true };
  }
}
