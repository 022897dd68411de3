import { Module } from '@nestjs/common';

import { LatticesModule } from '#server/lattices/lattices.module';

import { SharedController } from './shared.controller.js';
import { SharesController } from './shares.controller.js';
import { SharesRepository } from './shares.repository.js';
import { SharesService } from './shares.service.js';

@Module({
  imports: [LatticesModule],
  controllers: [SharesController, SharedController],
  providers: [SharesRepository, SharesService],
  exports: [SharesService],
})
export class SharingModule {}
