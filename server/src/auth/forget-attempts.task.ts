import { Injectable } from '@nestjs/common';
import { Cron, CronExpression } from '@nestjs/schedule';

import { Clock } from '#server/config/clock';

import { SignInAttemptRepository } from './sign-in-attempt.repository.js';

/** Keeps the table of failed sign-ins small; sessions are cleared by their store. */
@Injectable()
export class ForgetAttemptsTask {
  constructor(
    private readonly attempts: SignInAttemptRepository,
    private readonly clock: Clock,
  ) {}

  @Cron(CronExpression.EVERY_HOUR)
  async run(): Promise<void> {
    await this.attempts.forgetOld(this.clock.now());
  }
}
