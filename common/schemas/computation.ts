import { z } from 'zod';

import { id, personSummary, timestamp } from '#common/schemas/shared';

/** Work that may take longer than half a second and therefore runs on its own. */
export const computationKind = z.enum(['relaxation', 'elastic', 'vibrations', 'rivals']);
export type ComputationKind = z.infer<typeof computationKind>;

export const computationState = z.enum(['waiting', 'running', 'done', 'failed', 'cancelled']);
export type ComputationState = z.infer<typeof computationState>;

/** Where a computation stands; its result has an address of its own. */
export const computationSummary = z.object({
  id,
  kind: computationKind,
  state: computationState,
  /** What it is doing now, in words. */
  stage: z.string(),
  /** Part that is done, 0 … 1. */
  progress: z.number(),
  secondsLeft: z.number().nullable(),
  problemCode: z.string().nullable(),
  problemMessage: z.string().nullable(),
  askedBy: personSummary,
  createdAt: timestamp,
  startedAt: timestamp.nullable(),
  endedAt: timestamp.nullable(),
});
export type ComputationSummary = z.infer<typeof computationSummary>;
