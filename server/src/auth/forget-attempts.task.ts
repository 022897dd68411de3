import { Injectable } from '@nestjs/common';
import { Cron, CronExpression } from '@nestjs/schedule';

import { SignInAttemptRepository } from './sign-in-attempt.repository.js';

/** Keeps the table of failed sign-ins small; sessions are cleared by their store. */
@Injectable()
export class ForgetAttemptsTask {
  constructor(private readonly attempts: SignInAttemptRepository) {}

  @Cron(CronExpression.EVERY_HOUR)
  async run(): Promise<void> {
    await this.attempts.forgetOld();
  }
}
