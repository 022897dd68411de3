import { Body, Controller, Get, Param, Post, Req } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { Request } from 'express';

import {
  evaluateRequest,
  storedEvaluation,
  type EvaluateRequest,
  type StoredEvaluation,
} from '#common/schemas/evaluation';
import { Allow, Context } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import type { RequestContext } from '#server/http/request-context';

import { presentEvaluation } from './evaluation.presenter.js';
import { EvaluationsService } from './evaluations.service.js';

/** Raised when the caller leaves before the answer: someone who types on asks anew. */
function whenGone(request: Request): AbortSignal {
  const gone = new AbortController();
  request.res?.on('close', () => gone.abort());
  return gone.signal;
}

@ApiTags('evaluations')
@Controller('workspaces/:workspace/evaluations')
export class EvaluationsController {
  constructor(private readonly service: EvaluationsService) {}

  @Post()
  @Allow('evaluation.run')
  @Answers(storedEvaluation)
  async evaluate(
    @Context() context: RequestContext,
    @Body({ schema: evaluateRequest }) body: EvaluateRequest,
    @Req() request: Request,
  ): Promise<StoredEvaluation> {
    return presentEvaluation(
      await this.service.evaluate(context, body.cell, body.method, whenGone(request)),
    );
  }

  @Get(':hash')
  @Allow('lattice.read')
  @Answers(storedEvaluation)
  async read(
    @Context() context: RequestContext,
    @Param('hash') hash: string,
  ): Promise<StoredEvaluation> {
    return presentEvaluation(await this.service.read(context, hash));
  }
}
