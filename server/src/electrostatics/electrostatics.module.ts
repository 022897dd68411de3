import { Global, Module } from '@nestjs/common';

import { WORKER_POOL_STATUS } from '#server/health/worker-pool-status';

import { EvaluationsController } from './evaluations.controller.js';
import { EvaluationsRepository } from './evaluations.repository.js';
import { EvaluationsService } from './evaluations.service.js';
import { EvaluationPool } from './jobs/evaluation-pool.js';

/** Global because the health report asks how its threads are doing. */
@Global()
@Module({
  controllers: [EvaluationsController],
  providers: [
    EvaluationsRepository,
    EvaluationsService,
    EvaluationPool,
    { provide: WORKER_POOL_STATUS, useExisting: EvaluationPool },
  ],
  exports: [EvaluationsService, WORKER_POOL_STATUS],
})
export class ElectrostaticsModule {}
