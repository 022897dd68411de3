import { Module } from '@nestjs/common';
import { APP_FILTER, APP_GUARD, APP_PIPE } from '@nestjs/core';
import { ThrottlerGuard, ThrottlerModule } from '@nestjs/throttler';

import { AccessGuard } from './access.guard.js';
import { ProblemFilter } from './problem.filter.js';
import { createValidationPipe } from './validation.js';

/** Requests a minute from one address; a person who types fast makes about a hundred. */
const requestsPerMinute = 1200;

@Module({
  imports: [ThrottlerModule.forRoot([{ ttl: 60_000, limit: requestsPerMinute }])],
  providers: [
    { provide: APP_FILTER, useClass: ProblemFilter },
    { provide: APP_PIPE, useFactory: createValidationPipe },
    { provide: APP_GUARD, useClass: ThrottlerGuard },
    { provide: APP_GUARD, useClass: AccessGuard },
  ],
})
export class HttpModule {}
