import { Body, Controller, Delete, Get, Param, Put } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { z } from 'zod';

import {
  ownDataValue,
  ownDataValueList,
  setDataValueRequest,
  type OwnDataValue,
  type SetDataValueRequest,
} from '#common/schemas/data-values';
import { done } from '#common/schemas/shared';
import { Allow, Context } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import type { RequestContext } from '#server/http/request-context';

import { presentOwnValue } from './data-value.presenter.js';
import { DataValuesService } from './data-values.service.js';

@ApiTags('data values')
@Controller('workspaces/:workspace/data-values')
export class DataValuesController {
  constructor(private readonly service: DataValuesService) {}

  @Get()
  @Allow('workspace.read')
  @Answers(ownDataValueList)
  async list(@Context() context: RequestContext): Promise<z.infer<typeof ownDataValueList>> {
    return { items: (await this.service.list(context)).map(presentOwnValue) };
  }

  @Put(':key')
  @Allow('data.override')
  @Answers(ownDataValue)
  async set(
    @Context() context: RequestContext,
    @Param('key') key: string,
    @Body({ schema: setDataValueRequest }) body: SetDataValueRequest,
  ): Promise<OwnDataValue> {
    return presentOwnValue(await this.service.set(context, key, body));
  }

  @Delete(':key')
  @Allow('data.override')
  @Answers(done)
  async restore(
    @Context() context: RequestContext,
    @Param('key') key: string,
  ): Promise<z.infer<typeof done>> {
    await this.service.restore(context, key);
    return { ok: true };
  }
}
