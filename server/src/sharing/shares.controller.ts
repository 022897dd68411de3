import { Body, Controller, Delete, Get, Param, Post } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { z } from 'zod';

import { done } from '#common/schemas/shared';
import {
  createdShare,
  createShareRequest,
  shareList,
  type CreatedShare,
} from '#common/schemas/sharing';
import { Allow, Context } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import type { RequestContext } from '#server/http/request-context';

import { presentCreatedShare, presentShare } from './share.presenter.js';
import { SharesService } from './shares.service.js';

@ApiTags('sharing')
@Controller('workspaces/:workspace/lattices/:lattice')
export class SharesController {
  constructor(private readonly service: SharesService) {}

  @Get('shares')
  @Allow('share.list')
  @Answers(shareList)
  async list(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
  ): Promise<z.infer<typeof shareList>> {
    return { items: (await this.service.list(context, lattice)).map(presentShare) };
  }

  @Post('revisions/:number/shares')
  @Allow('share.create')
  @Answers(createdShare, 201)
  async create(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Param('number') number: string,
    @Body({ schema: createShareRequest }) body: z.infer<typeof createShareRequest>,
  ): Promise<CreatedShare> {
    const { expiresInDays } = body;
    const { share, token } = await this.service.create(context, lattice, number, expiresInDays);
    return presentCreatedShare(share, token);
  }

  @Delete('shares/:share')
  @Allow('share.revoke')
  @Answers(done)
  async revoke(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Param('share') share: string,
  ): Promise<z.infer<typeof done>> {
    await this.service.revoke(context, lattice, share);
    return { ok: true };
  }
}
