import { Body, Controller, Get, Param, Post } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { z } from 'zod';

import {
  annotation,
  annotationList,
  createAnnotationRequest,
  type Annotation,
  type CreateAnnotationRequest,
} from '#common/schemas/review';
import { Allow, Context } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import type { RequestContext } from '#server/http/request-context';

import { presentAnnotation } from './annotation.presenter.js';
import { AnnotationsService } from './annotations.service.js';

@ApiTags('review')
@Controller('workspaces/:workspace/lattices/:lattice/revisions/:number/annotations')
export class RevisionAnnotationsController {
  constructor(private readonly service: AnnotationsService) {}

  @Get()
  @Allow('lattice.read')
  @Answers(annotationList)
  async list(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Param('number') number: string,
  ): Promise<z.infer<typeof annotationList>> {
    return { items: (await this.service.list(context, lattice, number)).map(presentAnnotation) };
  }

  @Post()
  @Allow('annotation.create')
  @Answers(annotation, 201)
  async create(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Param('number') number: string,
    @Body({ schema: createAnnotationRequest }) body: CreateAnnotationRequest,
  ): Promise<Annotation> {
    return presentAnnotation(await this.service.create(context, lattice, number, body));
  }
}
