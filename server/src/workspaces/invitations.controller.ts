import { Body, Controller, Get, Param, Post, Req, Res } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { Throttle } from '@nestjs/throttler';
import type { Request, Response } from 'express';
import type { z } from 'zod';

import {
  acceptInvitationRequest,
  invitationPreview,
  sessionState,
  type InvitationPreview,
  type SessionState,
} from '#common/schemas/auth';
import { SessionStateService } from '#server/auth/session-state.service';
import { SignInService } from '#server/auth/sign-in.service';
import { Context, Public } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import { passwordThrottle } from '#server/http/rate-limits';
import type { VisitorContext } from '#server/http/request-context';

import { AcceptInvitationService } from './accept-invitation.service.js';
import { presentInvitationPreview } from './invitation.presenter.js';
import { InvitationsService } from './invitations.service.js';

@ApiTags('invitations')
@Controller('invitations')
export class InvitationsController {
  constructor(
    private readonly invitations: InvitationsService,
    private readonly acceptance: AcceptInvitationService,
    private readonly signIn: SignInService,
    private readonly state: SessionStateService,
  ) {}

  @Get(':token')
  @Public()
  @Answers(invitationPreview)
  async preview(@Param('token') token: string): Promise<InvitationPreview> {
    const { invitation, hasAccount } = await this.invitations.preview(token);
    return presentInvitationPreview(invitation, hasAccount);
  }

  @Post(':token/accept')
  @Public()
  @Throttle(passwordThrottle)
  @Answers(sessionState)
  async accept(
    @Context() context: VisitorContext,
    @Param('token') token: string,
    @Body({ schema: acceptInvitationRequest }) body: z.infer<typeof acceptInvitationRequest>,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<SessionState> {
    const { user, isNew } = await this.acceptance.accept(context, token, body);
    if (isNew) {
      await this.signIn.open(request, response, user);
    }
    return this.state.stateFor(user.id);
  }
}
