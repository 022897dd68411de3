import { Injectable, Logger } from '@nestjs/common';
import { Cron } from '@nestjs/schedule';

import { Clock } from '#server/config/clock';
import { EvaluationsService } from '#server/electrostatics/evaluations.service';

import { LatticesRepository } from './lattices.repository.js';
import { wayBackMs } from './lattices.service.js';

/** Removes for good what nobody can take back any more, and results that no revision names. */
@Injectable()
export class RetentionTask {
  private readonly logger = new Logger('Retention');

  constructor(
    private readonly lattices: LatticesRepository,
    private readonly evaluations: EvaluationsService,
    private readonly clock: Clock,
  ) {}

  @Cron('0 17 3 * * *')
  async run(): Promise<void> {
    const before = new Date(this.clock.now().getTime() - wayBackMs);
    const lattices = await this.lattices.purge(before);
    const evaluations = await this.evaluations.forgetUnnamed(before);
    if (lattices + evaluations > 0) {
      this.logger.log({ purged: { lattices, evaluations } });
    }
  }
}
