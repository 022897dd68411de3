import { z } from 'zod';

export const health = z.object({
  status: z.enum(['ok', 'degraded']),
  version: z.string(),
  database: z.object({ ok: z.boolean(), latencyMs: z.number().nullable() }),
  workers: z.object({ ok: z.boolean(), threads: z.number().int(), queued: z.number().int() }),
});
export type Health = z.infer<typeof health>;
