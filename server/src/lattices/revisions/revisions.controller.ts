import { Body, Controller, Get, Headers, Param, Post, Res } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { Response } from 'express';
import type { z } from 'zod';

import {
  revisionDetail,
  revisionList,
  saveRevisionRequest,
  type RevisionDetail,
} from '#common/schemas/lattice';
import { Allow, Context } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import type { RequestContext } from '#server/http/request-context';

import { draftEtag } from '../drafts/draft-etag.js';
import { NeedsIfMatch } from '../drafts/needs-if-match.decorator.js';
import { presentRevision, presentRevisionDetail } from './revision.presenter.js';
import { RevisionsService } from './revisions.service.js';
import { SaveRevisionService } from './save-revision.service.js';

@ApiTags('revisions')
@Controller('workspaces/:workspace/lattices/:lattice/revisions')
export class RevisionsController {
  constructor(
    private readonly service: RevisionsService,
    private readonly saving: SaveRevisionService,
  ) {}

  @Get()
  @Allow('lattice.read')
  @Answers(revisionList)
  async list(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
  ): Promise<z.infer<typeof revisionList>> {
    return { items: (await this.service.list(context, lattice)).map(presentRevision) };
  }

  /** Makes the draft a revision; the ETag of the answer is that of the draft from now on. */
  @Post()
  @Allow('revision.save')
  @NeedsIfMatch()
  @Answers(revisionDetail, 201)
  async save(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Headers('if-match') ifMatch: string | undefined,
    @Body({ schema: saveRevisionRequest }) body: z.infer<typeof saveRevisionRequest>,
    @Res({ passthrough: true }) response: Response,
  ): Promise<RevisionDetail> {
    const saved = await this.saving.save(context, lattice, ifMatch, body.note);
    response.setHeader('etag', draftEtag(saved.revision.number, 0));
    return presentRevisionDetail(saved);
  }

  @Get(':number')
  @Allow('lattice.read')
  @Answers(revisionDetail)
  async read(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Param('number') number: string,
  ): Promise<RevisionDetail> {
    return presentRevisionDetail(await this.service.read(context, lattice, number));
  }
}
