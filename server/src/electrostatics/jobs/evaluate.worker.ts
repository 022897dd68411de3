import type { QueuedTask, TaskAnswer } from './evaluation-task.js';
import { runTask } from './run-task.js';

/** Entry of a worker thread: the pool calls it once per task. */
export function evaluate({ begun, ...task }: QueuedTask): TaskAnswer {
  Atomics.store(begun, 0, 1);
  return runTask(task);
}
