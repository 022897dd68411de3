import { Module } from '@nestjs/common';

import { DraftHeadlineService } from './draft-headline.service.js';
import { DraftsController } from './drafts/drafts.controller.js';
import { DraftsRepository } from './drafts/drafts.repository.js';
import { DraftsService } from './drafts/drafts.service.js';
import { LatticesController } from './lattices.controller.js';
import { LatticesRepository } from './lattices.repository.js';
import { LatticesService } from './lattices.service.js';
import { RetentionTask } from './retention.task.js';
import { RevisionsController } from './revisions/revisions.controller.js';
import { RevisionsRepository } from './revisions/revisions.repository.js';
import { RevisionsService } from './revisions/revisions.service.js';
import { SaveRevisionService } from './revisions/save-revision.service.js';
import { ShelfRepository } from './shelf.repository.js';

@Module({
  controllers: [LatticesController, DraftsController, RevisionsController],
  providers: [
    DraftHeadlineService,
    DraftsRepository,
    DraftsService,
    LatticesRepository,
    LatticesService,
    RetentionTask,
    RevisionsRepository,
    RevisionsService,
    SaveRevisionService,
    ShelfRepository,
  ],
  exports: [LatticesService, DraftsService, RevisionsService, SaveRevisionService],
})
export class LatticesModule {}
