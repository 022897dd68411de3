import { Body, Controller, Get, HttpCode, Param, Post } from '@nestjs/common';
import { ApiOperation, ApiResponse, ApiTags } from '@nestjs/swagger';

import {
  appliedPrototype,
  applyPrototypeRequest,
  prototypeList,
  type AppliedPrototype,
  type ApplyPrototypeRequest,
  type PrototypeSummary,
} from '#common/schemas/prototype';
import { SignedIn } from '#server/http/access.decorators';

import { PrototypesService } from './prototypes.service.js';

@ApiTags('Prototypes')
@Controller('prototypes')
export class PrototypesController {
  constructor(private readonly prototypes: PrototypesService) {}

  @Get()
  @SignedIn()
  @ApiOperation({ summary: 'Structure types a cell can start from' })
  @ApiResponse({ status: 200, standardSchema: prototypeList })
  list(): { items: PrototypeSummary[] } {
    return { items: this.prototypes.list() };
  }

  @Post(':id/apply')
  @HttpCode(200)
  @SignedIn()
  @ApiOperation({ summary: 'A cell of a structure type with ions of your own; nothing is stored' })
  @ApiResponse({ status: 200, standardSchema: appliedPrototype })
  apply(
    @Param('id') id: string,
    @Body({ schema: applyPrototypeRequest }) body: ApplyPrototypeRequest,
  ): AppliedPrototype {
    return this.prototypes.apply(id, body);
  }
}
