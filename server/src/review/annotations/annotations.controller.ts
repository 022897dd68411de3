import { Body, Controller, Param, Post } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { z } from 'zod';

import { annotation, replyRequest, type Annotation } from '#common/schemas/review';
import { Allow, Context } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import type { RequestContext } from '#server/http/request-context';

import { presentAnnotation } from './annotation.presenter.js';
import { AnnotationsService } from './annotations.service.js';

@ApiTags('review')
@Controller('workspaces/:workspace/lattices/:lattice/annotations/:annotation')
export class AnnotationsController {
  constructor(private readonly service: AnnotationsService) {}

  @Post('replies')
  @Allow('annotation.reply')
  @Answers(annotation, 201)
  async reply(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Param('annotation') id: string,
    @Body({ schema: replyRequest }) body: z.infer<typeof replyRequest>,
  ): Promise<Annotation> {
    return presentAnnotation(await this.service.reply(context, lattice, id, body.text));
  }

  @Post('resolve')
  @Allow('annotation.resolve')
  @Answers(annotation)
  async resolve(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Param('annotation') id: string,
  ): Promise<Annotation> {
    return presentAnnotation(await this.service.settle(context, lattice, id, 'resolve'));
  }

  @Post('reopen')
  @Allow('annotation.resolve')
  @Answers(annotation)
  async reopen(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Param('annotation') id: string,
  ): Promise<Annotation> {
    return presentAnnotation(await this.service.settle(context, lattice, id, 'reopen'));
  }
}
