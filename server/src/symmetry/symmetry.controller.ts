import { Controller, Get, Header, Param } from '@nestjs/common';
import { ApiOperation, ApiResponse, ApiTags } from '@nestjs/swagger';
import { z } from 'zod';

import { Problem } from '#common/errors/problem';
import {
  spaceGroupDetail,
  spaceGroupList,
  type SpaceGroupDetail,
  type SpaceGroupSetting,
} from '#common/schemas/symmetry';
import { Public } from '#server/http/access.decorators';

import { findSetting, listSettings, operationsOf } from './space-groups.js';

/** The tables never change under one address. */
const forever = 'public, max-age=31536000, immutable';

@ApiTags('Symmetry')
@Controller('space-groups')
export class SymmetryController {
  @Get()
  @Public()
  @Header('cache-control', forever)
  @ApiOperation({ summary: 'All 530 tabulated settings of the 230 space groups' })
  @ApiResponse({ status: 200, standardSchema: spaceGroupList })
  list(): { items: readonly SpaceGroupSetting[] } {
    return { items: listSettings() };
  }

  @Get(':hallNumber')
  @Public()
  @Header('cache-control', forever)
  @ApiOperation({ summary: 'One setting with its symmetry operations' })
  @ApiResponse({ status: 200, standardSchema: spaceGroupDetail })
  get(
    @Param('hallNumber', {
      schema: z.string().regex(/^\d{1,3}$/, 'A Hall number is a whole number, 1 to 530.'),
    })
    hallNumber: string,
  ): SpaceGroupDetail {
    const setting = findSetting(Number(hallNumber));
    if (!setting) {
      throw new Problem('space_group.not_found');
    }
    return { ...setting, operations: [...operationsOf(setting.hallNumber)] };
  }
}
