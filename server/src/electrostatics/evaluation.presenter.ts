import type { StoredEvaluation } from '#common/schemas/evaluation';

import type { EvaluationRow } from './evaluation.table.js';

export const presentEvaluation = (row: EvaluationRow): StoredEvaluation => ({
  hash: row.hash,
  computedAt: row.computedAt.toISOString(),
  durationMs: row.durationMs,
  result: row.result,
});
