import { Module } from '@nestjs/common';

import { LatticesModule } from '#server/lattices/lattices.module';

import { AnnotationsController } from './annotations/annotations.controller.js';
import { AnnotationsRepository } from './annotations/annotations.repository.js';
import { AnnotationsService } from './annotations/annotations.service.js';
import { RevisionAnnotationsController } from './annotations/revision-annotations.controller.js';
import { DecisionsController } from './decisions/decisions.controller.js';
import { DecisionsService } from './decisions/decisions.service.js';

@Module({
  imports: [LatticesModule],
  controllers: [DecisionsController, RevisionAnnotationsController, AnnotationsController],
  providers: [AnnotationsRepository, AnnotationsService, DecisionsService],
  exports: [AnnotationsService, DecisionsService],
})
export class ReviewModule {}
