import { Module } from '@nestjs/common';

import { APP_CONFIG } from '#server/config/environment';
import { SESSION_MIDDLEWARE } from '#server/http/session-middleware';
import { UsersModule } from '#server/users/users.module';

import { AccountService } from './account.service.js';
import { ForgetAttemptsTask } from './forget-attempts.task.js';
import { MeController } from './me.controller.js';
import { SessionController } from './session.controller.js';
import { createSessionMiddleware } from './session.middleware.js';
import { SessionRepository } from './session.repository.js';
import { SessionStateService } from './session-state.service.js';
import { HashedSessionStore } from './session-store.js';
import { SessionsService } from './sessions.service.js';
import { SignInAttemptRepository } from './sign-in-attempt.repository.js';
import { SignInService } from './sign-in.service.js';

@Module({
  imports: [UsersModule],
  controllers: [SessionController, MeController],
  providers: [
    AccountService,
    ForgetAttemptsTask,
    HashedSessionStore,
    SessionRepository,
    SessionsService,
    SessionStateService,
    SignInAttemptRepository,
    SignInService,
    {
      provide: SESSION_MIDDLEWARE,
      inject: [APP_CONFIG, HashedSessionStore],
      useFactory: createSessionMiddleware,
    },
  ],
  exports: [SignInService, SessionStateService],
})
export class AuthModule {}
