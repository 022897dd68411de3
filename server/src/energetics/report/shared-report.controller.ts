import { Controller, Get, Header, Param, StreamableFile } from '@nestjs/common';
import { ApiProduces, ApiTags } from '@nestjs/swagger';

import { Public } from '#server/http/access.decorators';

import { pdfFile } from './pdf-file.js';
import { reportPdf } from './pdf/report-pdf.js';
import { ReportService } from './report.service.js';

@ApiTags('sharing')
@Controller('shares')
export class SharedReportController {
  constructor(private readonly service: ReportService) {}

  /** The address is the key: it must reach neither a store nor another site. */
  @Get(':token/report.pdf')
  @Public()
  @Header('cache-control', 'no-store')
  @Header('referrer-policy', 'no-referrer')
  @ApiProduces('application/pdf')
  async pdf(@Param('token') token: string): Promise<StreamableFile> {
    const report = await this.service.readShared(token);
    return pdfFile(await reportPdf(report), report);
  }
}
