import { Body, Controller, HttpCode, Post } from '@nestjs/common';
import { ApiOperation, ApiResponse, ApiTags } from '@nestjs/swagger';

import { readCifRequest, readCifResponse, type ReadCifResponse } from '#common/schemas/prototype';
import { SignedIn } from '#server/http/access.decorators';

import { CifService } from './cif.service.js';

@ApiTags('CIF')
@Controller('cif')
export class CifController {
  constructor(private readonly cif: CifService) {}

  @Post('read')
  @HttpCode(200)
  @SignedIn()
  @ApiOperation({ summary: 'A cell from the text of a CIF; nothing is stored' })
  @ApiResponse({ status: 200, standardSchema: readCifResponse })
  read(@Body({ schema: readCifRequest }) { text }: { text: string }): ReadCifResponse {
    return this.cif.read(text);
  }
}
