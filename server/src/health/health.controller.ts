import { Controller, Get, HttpStatus, Res } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { Response } from 'express';

import { health, type Health } from '#common/schemas/health';
import { Public } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';

import { HealthService } from './health.service.js';

@ApiTags('server')
@Controller('health')
export class HealthController {
  constructor(private readonly service: HealthService) {}

  /** 503 when the database does not answer, so that a load balancer looks elsewhere. */
  @Get()
  @Public()
  @Answers(health)
  async check(@Res({ passthrough: true }) response: Response): Promise<Health> {
    const answer = await this.service.check();
    if (!answer.database.ok) {
      response.status(HttpStatus.SERVICE_UNAVAILABLE);
    }
    return answer;
  }
}
