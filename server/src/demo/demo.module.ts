import { Module } from '@nestjs/common';

import { LatticesModule } from '#server/lattices/lattices.module';
import { ReviewModule } from '#server/review/review.module';
import { SharingModule } from '#server/sharing/sharing.module';
import { UsersModule } from '#server/users/users.module';

import { DemoRepository } from './demo.repository.js';
import { DemoService } from './demo.service.js';
import { DemoStoryService } from './demo-story.service.js';

@Module({
  imports: [UsersModule, LatticesModule, ReviewModule, SharingModule],
  providers: [DemoRepository, DemoService, DemoStoryService],
})
export class DemoModule {}
