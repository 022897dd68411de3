import { Body, Controller, Delete, Get, Param, Patch, Post, Req } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { Throttle } from '@nestjs/throttler';
import type { Request } from 'express';
import type { z } from 'zod';

import {
  changePasswordRequest,
  currentUser,
  sessionList,
  updateProfileRequest,
  type ChangePasswordRequest,
  type CurrentUser,
} from '#common/schemas/auth';
import { done } from '#common/schemas/shared';
import { Context, SignedIn } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import { passwordThrottle } from '#server/http/rate-limits';
import type { UserContext } from '#server/http/request-context';

import { AccountService } from './account.service.js';
import { SessionsService } from './sessions.service.js';

@ApiTags('me')
@Controller('me')
@SignedIn()
export class MeController {
  constructor(
    private readonly account: AccountService,
    private readonly sessions: SessionsService,
  ) {}

  @Patch()
  @Answers(currentUser)
  async update(
    @Context() context: UserContext,
    @Body({ schema: updateProfileRequest }) body: z.infer<typeof updateProfileRequest>,
  ): Promise<CurrentUser> {
    return this.account.rename(context, body.name);
  }

  @Post('password')
  @Throttle(passwordThrottle)
  @Answers(done)
  async changePassword(
    @Context() context: UserContext,
    @Req() request: Request,
    @Body({ schema: changePasswordRequest }) body: ChangePasswordRequest,
  ): Promise<z.infer<typeof done>> {
    await this.account.changePassword(context, request, body);
    return { ok: true };
  }

  @Get('sessions')
  @Answers(sessionList)
  async listSessions(
    @Context() context: UserContext,
    @Req() request: Request,
  ): Promise<z.infer<typeof sessionList>> {
    return { items: await this.sessions.list(request, context.user.id) };
  }

  @Delete('sessions/:session')
  @Answers(done)
  async revokeSession(
    @Context() context: UserContext,
    @Param('session') session: string,
  ): Promise<z.infer<typeof done>> {
    await this.sessions.revoke(context.user.id, session);
    return { ok: true };
  }
}
