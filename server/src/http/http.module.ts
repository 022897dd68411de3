import { Module } from '@nestjs/common';
import { APP_FILTER, APP_GUARD, APP_PIPE } from '@nestjs/core';
import { ThrottlerGuard, ThrottlerModule } from '@nestjs/throttler';

import { AccessGuard } from './access.guard.js';
import { ProblemFilter } from './problem.filter.js';
import { generalThrottle } from './rate-limits.js';
import { createValidationPipe } from './validation.js';

@Module({
  imports: [ThrottlerModule.forRoot(generalThrottle)],
  providers: [
    { provide: APP_FILTER, useClass: ProblemFilter },
    { provide: APP_PIPE, useFactory: createValidationPipe },
    { provide: APP_GUARD, useClass: ThrottlerGuard },
    { provide: APP_GUARD, useClass: AccessGuard },
  ],
})
export class HttpModule {}
