import type { RevisionDetail } from '#common/schemas/lattice';
import type { ResolvedState } from '#client/features/cell-editor/hooks/use-resolved-cell.ts';
import type { LiveEvaluation } from '#client/features/electrostatics/hooks/use-live-evaluation.ts';
import type { LatticeMeta } from '#client/routes/lattice-page/lattice-header.tsx';

type Frozen = Pick<
  RevisionDetail,
  'number' | 'state' | 'formula' | 'prototype' | 'evaluation' | 'evaluationProblem'
>;

/** The numbers that a revision was saved with. */
export function frozenEvaluation({ evaluation, evaluationProblem }: Frozen): LiveEvaluation {
  return {
    evaluation,
    problem: evaluation === null ? evaluationProblem : null,
    isPending: false,
    isBehind: false,
    retry: null,
  };
}

/** Space group of a cell, from its setting or from what was computed. */
export function spaceGroupOf(
  resolved: ResolvedState,
  evaluation: LiveEvaluation['evaluation'],
): LatticeMeta['spaceGroup'] {
  if (resolved.setting !== null) {
    return { symbol: resolved.setting.symbol, number: resolved.setting.number };
  }
  const symbol = evaluation?.result.spaceGroupSymbol ?? null;
  const number = evaluation?.result.spaceGroupNumber ?? null;
  return symbol === null || number === null ? null : { symbol, number };
}

export function metaOfRevision(revision: Frozen, resolved: ResolvedState): LatticeMeta {
  return {
    formula: revision.formula,
    prototype: revision.prototype,
    spaceGroup: spaceGroupOf(resolved, revision.evaluation),
    revision: revision.number,
    state: revision.state,
    isEdited: false,
  };
}
