import { Body, Controller, Delete, Get, Headers, Param, Put, Res } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { Response } from 'express';

import { draft, putDraftRequest, type Draft, type PutDraftRequest } from '#common/schemas/lattice';
import { Allow, Context } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import type { RequestContext } from '#server/http/request-context';

import { presentDraft } from './draft.presenter.js';
import { DraftsService } from './drafts.service.js';
import { NeedsIfMatch } from './needs-if-match.decorator.js';

@ApiTags('drafts')
@Controller('workspaces/:workspace/lattices/:lattice/draft')
export class DraftsController {
  constructor(private readonly service: DraftsService) {}

  @Get()
  @Allow('lattice.read')
  @Answers(draft)
  async read(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Res({ passthrough: true }) response: Response,
  ): Promise<Draft> {
    return answer(response, await this.service.read(context, lattice));
  }

  @Put()
  @Allow('draft.edit')
  @NeedsIfMatch()
  @Answers(draft)
  async put(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Headers('if-match') ifMatch: string | undefined,
    @Body({ schema: putDraftRequest }) body: PutDraftRequest,
    @Res({ passthrough: true }) response: Response,
  ): Promise<Draft> {
    return answer(response, await this.service.put(context, lattice, ifMatch, body));
  }

  /** Throws the edit away and answers what is left. */
  @Delete()
  @Allow('draft.edit')
  @NeedsIfMatch()
  @Answers(draft)
  async discard(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Headers('if-match') ifMatch: string | undefined,
    @Res({ passthrough: true }) response: Response,
  ): Promise<Draft> {
    return answer(response, await this.service.discard(context, lattice, ifMatch));
  }
}

function answer(response: Response, state: Parameters<typeof presentDraft>[0]): Draft {
  const body = presentDraft(state);
  response.setHeader('etag', body.etag);
  return body;
}
