import { Module } from '@nestjs/common';

import { LatticesModule } from '#server/lattices/lattices.module';
import { ReviewModule } from '#server/review/review.module';
import { SharingModule } from '#server/sharing/sharing.module';
import { DataValuesModule } from '#server/workspaces/data-values/data-values.module';

import { ReportController } from './report.controller.js';
import { ReportService } from './report.service.js';
import { SharedReportController } from './shared-report.controller.js';

@Module({
  imports: [LatticesModule, ReviewModule, SharingModule, DataValuesModule],
  controllers: [ReportController, SharedReportController],
  providers: [ReportService],
})
export class ReportModule {}
