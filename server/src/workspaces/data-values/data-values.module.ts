import { Module } from '@nestjs/common';

import { DataValuesController } from './data-values.controller.js';
import { DataValuesRepository } from './data-values.repository.js';
import { DataValuesService } from './data-values.service.js';

@Module({
  controllers: [DataValuesController],
  providers: [DataValuesRepository, DataValuesService],
  exports: [DataValuesService],
})
export class DataValuesModule {}
