import { fileURLToPath } from 'node:url';

import {
  HttpException,
  Inject,
  Injectable,
  Logger,
  type OnApplicationShutdown,
} from '@nestjs/common';
import { Piscina } from 'piscina';

import { Problem } from '#common/errors/problem';
import { APP_CONFIG, type AppConfig } from '#server/config/environment';
import type { WorkerPoolStatus } from '#server/health/worker-pool-status';

import type { EvaluationTask, QueuedTask, TaskAnswer } from './evaluation-task.js';

const threadMemoryMb = 1_024;

/** Source files need the loader in each thread; built ones need nothing. */
const isSource = import.meta.url.endsWith('.ts');
const workerFile = fileURLToPath(
  new URL(isSource ? './evaluate.worker.ts' : './evaluate.worker.js', import.meta.url),
);
const sourceArguments = ['--import', 'tsx', '--conditions', 'holdfast'];

/** Nobody waits for the answer any more, so nobody sees this either; not worth a line in the log. */
export class Abandoned extends HttpException {
  constructor() {
    super('The caller has left.', 499);
  }
}

/** Threads that resolve and evaluate cells, so that the server's own thread never waits for one. */
@Injectable()
export class EvaluationPool implements OnApplicationShutdown, WorkerPoolStatus {
  private readonly logger = new Logger('Evaluation');
  private readonly pool: Piscina<QueuedTask, TaskAnswer>;

  private isClosing = false;

  readonly limits = {
    /** Longest that a caller waits, in the queue and for the computation together. */
    waitMs: 120_000,
    /**
     * How long a computation that nobody waits for any more may go on: most are done by then, and
     * ending a thread costs more than it saves.
     */
    graceMs: 1_000,
    /** Tasks that may wait for a thread. */
    queued: 64,
  };

  constructor(@Inject(APP_CONFIG) config: Pick<AppConfig, 'workerThreads'>) {
    this.limits.queued *= config.workerThreads;
    this.pool = new Piscina({
      filename: workerFile,
      name: 'evaluate',
      minThreads: 1,
      maxThreads: config.workerThreads,
      idleTimeout: 60_000,
      resourceLimits: { maxOldGenerationSizeMb: threadMemoryMb },
      ...(isSource ? { execArgv: sourceArguments } : {}),
    });
  }

  status(): { ok: boolean; threads: number; queued: number } {
    const threads = this.pool.threads.length;
    return { ok: threads > 0, threads, queued: this.pool.queueSize };
  }

  /**
   * Runs one task in a thread.
   * @param abandoned taken out of the queue at once, or ended after a grace, when this is raised
   * @throws {Problem} `evaluation.timeout`, `evaluation.failed`, `server.busy`
   * @throws {Abandoned}
   */
  async run(task: EvaluationTask, abandoned?: AbortSignal): Promise<TaskAnswer> {
    if (abandoned?.aborted === true) {
      throw new Abandoned();
    }
    if (this.pool.queueSize >= this.limits.queued) {
      throw new Problem('server.busy');
    }
    const begun = new Int32Array(new SharedArrayBuffer(4));
    const limit = AbortSignal.timeout(this.limits.waitMs);
    const end = new AbortController();
    const leave = () => this.leave(begun, end);
    abandoned?.addEventListener('abort', leave, { once: true });
    try {
      return await this.pool.run(
        { ...task, begun },
        { signal: AbortSignal.any([limit, end.signal]), name: 'evaluate' },
      );
    } catch (error) {
      throw this.explain(error, limit.aborted, end.signal.aborted, Atomics.load(begun, 0) === 1);
    } finally {
      abandoned?.removeEventListener('abort', leave);
    }
  }

  async onApplicationShutdown(): Promise<void> {
    this.isClosing = true;
    await this.pool.destroy();
  }

  private leave(begun: Int32Array, end: AbortController): void {
    if (Atomics.load(begun, 0) === 0) {
      end.abort();
    } else {
      setTimeout(() => end.abort(), this.limits.graceMs).unref();
    }
  }

  private explain(error: unknown, isLate: boolean, isLeft: boolean, hasBegun: boolean): Error {
    if (isLate) {
      return new Problem(hasBegun ? 'evaluation.timeout' : 'server.busy');
    }
    if (isLeft || this.isClosing) {
      return new Abandoned();
    }
    this.logger.error({ error });
    return new Problem('evaluation.failed');
  }
}
