import { Injectable, Logger } from '@nestjs/common';
import { ModuleRef } from '@nestjs/core';

import type { Health } from '#common/schemas/health';
import { productVersion } from '#server/config/product-version';

import { HealthRepository } from './health.repository.js';
import { WORKER_POOL_STATUS, type WorkerPoolStatus } from './worker-pool-status.js';

@Injectable()
export class HealthService {
  private readonly logger = new Logger('Health');
  private readonly version = productVersion();

  constructor(
    private readonly repository: HealthRepository,
    private readonly modules: ModuleRef,
  ) {}

  async check(): Promise<Health> {
    const database = await this.checkDatabase();
    // Looked up where it is provided, so that this module stands before all others.
    const workers = this.modules
      .get<WorkerPoolStatus>(WORKER_POOL_STATUS, { strict: false })
      .status();
    return {
      status: database.ok && workers.ok ? 'ok' : 'degraded',
      version: this.version,
      database,
      workers,
    };
  }

  private async checkDatabase(): Promise<Health['database']> {
    const start = performance.now();
    try {
      await this.repository.ping();
      return { ok: true, latencyMs: Math.round((performance.now() - start) * 100) / 100 };
    } catch (error) {
      this.logger.error({ error });
      return { ok: false, latencyMs: null };
    }
  }
}
