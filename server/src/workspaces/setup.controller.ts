import { Body, Controller, Post, Req, Res } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { Throttle } from '@nestjs/throttler';
import type { Request, Response } from 'express';

import {
  sessionState,
  setupRequest,
  type SessionState,
  type SetupRequest,
} from '#common/schemas/auth';
import { SessionStateService } from '#server/auth/session-state.service';
import { SignInService } from '#server/auth/sign-in.service';
import { Public } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import { passwordThrottle } from '#server/http/rate-limits';

import { SetupService } from './setup.service.js';

@ApiTags('session')
@Controller('setup')
export class SetupController {
  constructor(
    private readonly setup: SetupService,
    private readonly signIn: SignInService,
    private readonly state: SessionStateService,
  ) {}

  @Post()
  @Public()
  @Throttle(passwordThrottle)
  @Answers(sessionState)
  async create(
    @Body({ schema: setupRequest }) body: SetupRequest,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<SessionState> {
    const user = await this.setup.setUp(body);
    await this.signIn.open(request, response, user);
    return this.state.stateFor(user.id);
  }
}
