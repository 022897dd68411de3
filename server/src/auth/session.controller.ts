import { Body, Controller, Delete, Get, Post, Req, Res } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { Throttle } from '@nestjs/throttler';
import type { Request, Response } from 'express';
import type { z } from 'zod';

import {
  sessionState,
  signInRequest,
  type SessionState,
  type SignInRequest,
} from '#common/schemas/auth';
import { done } from '#common/schemas/shared';
import { Context, Public, SignedIn } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import { passwordThrottle } from '#server/http/rate-limits';
import type { UserContext, VisitorContext } from '#server/http/request-context';

import { SessionStateService } from './session-state.service.js';
import { SignInService } from './sign-in.service.js';

@ApiTags('session')
@Controller('session')
export class SessionController {
  constructor(
    private readonly signIn: SignInService,
    private readonly state: SessionStateService,
  ) {}

  @Get()
  @Public()
  @Answers(sessionState)
  async read(@Context() context: VisitorContext): Promise<SessionState> {
    return this.state.stateFor(context.user?.id ?? null);
  }

  @Post()
  @Public()
  @Throttle(passwordThrottle)
  @Answers(sessionState)
  async create(
    @Body({ schema: signInRequest }) body: SignInRequest,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<SessionState> {
    return this.state.stateFor(await this.signIn.signIn(request, response, body));
  }

  @Delete()
  @SignedIn()
  @Answers(done)
  async remove(
    @Context() context: UserContext,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<z.infer<typeof done>> {
    await this.signIn.signOut(request, response, context);
    return { ok: true };
  }
}
