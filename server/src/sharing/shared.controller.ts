import { Controller, Get, Header, Param } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';

import { sharedRevision, type SharedRevision } from '#common/schemas/sharing';
import { Public } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';

import { presentSharedRevision } from './share.presenter.js';
import { SharesService } from './shares.service.js';

@ApiTags('sharing')
@Controller('shares')
export class SharedController {
  constructor(private readonly service: SharesService) {}

  /** The address is the key: it must reach neither a store nor another site. */
  @Get(':token')
  @Public()
  @Header('cache-control', 'no-store')
  @Header('referrer-policy', 'no-referrer')
  @Answers(sharedRevision)
  async open(@Param('token') token: string): Promise<SharedRevision> {
    return presentSharedRevision(await this.service.open(token));
  }
}
