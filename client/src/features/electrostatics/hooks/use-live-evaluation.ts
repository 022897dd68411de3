import { useQuery } from '@tanstack/react-query';

import type { EvaluateRequest, StoredEvaluation } from '#common/schemas/evaluation';
import { evaluationQuery } from '#client/features/electrostatics/api/evaluation.ts';
import { usePatience } from '#client/features/electrostatics/hooks/use-patience.ts';
import { useSettled } from '#client/features/electrostatics/hooks/use-settled.ts';
import { ApiError, messageOf } from '#client/lib/api-error.ts';
import type { FieldProblem } from '#common/errors/problem';

/** The numbers of a cell, and how current they are. */
export interface LiveEvaluation {
  readonly evaluation: StoredEvaluation | null;
  /** The numbers shown belong to an older state of the cell; true only when it takes a while. */
  readonly isPending: boolean;
  /** An answer is on its way, however short the wait was so far. */
  readonly isBehind: boolean;
  /** Why there are no numbers. */
  readonly problem: { code: string; message: string; fields: readonly FieldProblem[] } | null;
  /** A failure that asking again may mend. */
  readonly retry: (() => void) | null;
}

const typingPauseMs = 350;

/**
 * Evaluates a cell as it is typed: waits for a pause, drops answers nobody waits for any more,
 * keeps the last numbers on the screen meanwhile.
 *
 * @param body null when there is nothing that could be evaluated
 */
export function useLiveEvaluation(workspace: string, body: EvaluateRequest | null): LiveEvaluation {
  const settled = useSettled(body, typingPauseMs);
  const query = useQuery({
    ...evaluationQuery(workspace, settled ?? { cell: emptyCell }),
    enabled: settled !== null,
    retry: (count, error) => error instanceof ApiError && error.isTransient && count < 3,
  });
  const isBehind = body !== settled || query.isPlaceholderData || query.isFetching;
  const isPending = usePatience(isBehind && body !== null);
  if (body === null) {
    return nothing;
  }
  const { error } = query;
  if (error !== null && !query.isFetching) {
    const fields = error instanceof ApiError ? error.fields : [];
    const code = error instanceof ApiError ? error.code : 'page.failed';
    return {
      evaluation: null,
      isPending,
      isBehind,
      problem: { code, message: messageOf(error), fields },
      retry: error instanceof ApiError && error.isTransient ? () => void query.refetch() : null,
    };
  }
  return { ...nothing, evaluation: query.data ?? null, isPending, isBehind };
}

const nothing: LiveEvaluation = {
  evaluation: null,
  isPending: false,
  isBehind: false,
  problem: null,
  retry: null,
};

/** Never sent: only gives the switched-off query a key. */
const emptyCell: EvaluateRequest['cell'] = {
  lattice: { a: '', b: '', c: '', alpha: '', beta: '', gamma: '' },
  symmetry: { kind: 'operations', operations: ['x,y,z'] },
  parameters: [],
  sites: [],
};
