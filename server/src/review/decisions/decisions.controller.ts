import { Body, Controller, Param, Post } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { z } from 'zod';

import { revisionSummary, type RevisionSummary } from '#common/schemas/lattice';
import { acceptRevisionRequest, returnRevisionRequest } from '#common/schemas/review';
import { Allow, Context } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import type { RequestContext } from '#server/http/request-context';
import { presentRevision } from '#server/lattices/revisions/revision.presenter';

import { DecisionsService } from './decisions.service.js';

@ApiTags('review')
@Controller('workspaces/:workspace/lattices/:lattice/revisions/:number')
export class DecisionsController {
  constructor(private readonly service: DecisionsService) {}

  @Post('submit')
  @Allow('revision.submit')
  @Answers(revisionSummary)
  async submit(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Param('number') number: string,
  ): Promise<RevisionSummary> {
    return presentRevision(await this.service.submit(context, lattice, number));
  }

  @Post('withdraw')
  @Allow('revision.withdraw')
  @Answers(revisionSummary)
  async withdraw(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Param('number') number: string,
  ): Promise<RevisionSummary> {
    return presentRevision(await this.service.withdraw(context, lattice, number));
  }

  @Post('accept')
  @Allow('revision.accept')
  @Answers(revisionSummary)
  async accept(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Param('number') number: string,
    @Body({ schema: acceptRevisionRequest }) body: z.infer<typeof acceptRevisionRequest>,
  ): Promise<RevisionSummary> {
    return presentRevision(await this.service.accept(context, lattice, number, body.reason));
  }

  @Post('return')
  @Allow('revision.return')
  @Answers(revisionSummary)
  async return(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Param('number') number: string,
    @Body({ schema: returnRevisionRequest }) body: z.infer<typeof returnRevisionRequest>,
  ): Promise<RevisionSummary> {
    return presentRevision(await this.service.return(context, lattice, number, body.reason));
  }
}
