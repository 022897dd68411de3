/** Token of the {@link WorkerPoolStatus}; the module that owns the threads provides it. */
export const WORKER_POOL_STATUS = Symbol('WORKER_POOL_STATUS');

export interface WorkerPoolStatus {
  /** How the worker threads are doing now. */
  status(): { ok: boolean; threads: number; queued: number };
}
