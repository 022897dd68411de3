import { Controller, Get, Param, StreamableFile } from '@nestjs/common';
import { ApiProduces, ApiTags } from '@nestjs/swagger';

import { latticeReport, type LatticeReport } from '#common/schemas/report';
import { Allow, Context } from '#server/http/access.decorators';
import { Answers } from '#server/http/answers.decorator';
import type { RequestContext } from '#server/http/request-context';

import { pdfFile } from './pdf-file.js';
import { reportPdf } from './pdf/report-pdf.js';
import { ReportService } from './report.service.js';

@ApiTags('reports')
@Controller('workspaces/:workspace/lattices/:lattice/revisions/:number')
export class ReportController {
  constructor(private readonly service: ReportService) {}

  @Get('report')
  @Allow('lattice.read')
  @Answers(latticeReport)
  read(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Param('number') number: string,
  ): Promise<LatticeReport> {
    return this.service.read(context, lattice, number);
  }

  @Get('report.pdf')
  @Allow('lattice.read')
  @ApiProduces('application/pdf')
  async pdf(
    @Context() context: RequestContext,
    @Param('lattice') lattice: string,
    @Param('number') number: string,
  ): Promise<StreamableFile> {
    const report = await this.service.read(context, lattice, number);
    return pdfFile(await reportPdf(report), report);
  }
}
