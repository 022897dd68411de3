import { useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';

import { Problem, type FieldProblem } from '#common/errors/problem';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import { resolveCell } from '#common/physics/resolve-cell';
import { parseOperation } from '#common/physics/symmetry-operation';
import type { CellDefinition } from '#common/schemas/cell';
import type { SpaceGroupSetting, SymmetryOperation } from '#common/schemas/symmetry';
import { spaceGroupQuery } from '#client/features/cell-editor/api/space-groups.ts';

/** A cell in numbers, as far as it can be read. */
export interface ResolvedState {
  /** Null while something is wrong or on its way. */
  readonly cell: ResolvedCell | null;
  /** The last cell that could be read: keeps the stage from going blank while one types. */
  readonly shown: ResolvedCell | null;
  readonly problems: readonly FieldProblem[];
  readonly setting: SpaceGroupSetting | null;
  readonly isLoading: boolean;
  readonly error: unknown;
  readonly retry: () => void;
}

interface Symmetry {
  operations: readonly SymmetryOperation[];
  setting: SpaceGroupSetting | null;
}

function readOperations(texts: readonly string[]): Symmetry | FieldProblem[] {
  const problems: FieldProblem[] = [];
  const operations = texts.flatMap((text, index) => {
    try {
      return [parseOperation(text)];
    } catch (error) {
      if (!(error instanceof Problem)) {
        throw error;
      }
      problems.push({
        code: error.code,
        field: 'symmetry',
        message: `Operation ${index + 1} (${text}): ${error.message}`,
      });
      return [];
    }
  });
  return problems.length > 0 ? problems : { operations, setting: null };
}

const noProblems: readonly FieldProblem[] = [];

/** Evaluates expressions and applies symmetry as the server does, on every keystroke. */
export function useResolvedCell(definition: CellDefinition): ResolvedState {
  const { symmetry } = definition;
  const hallNumber = symmetry.kind === 'setting' ? symmetry.hallNumber : null;
  const group = useQuery({ ...spaceGroupQuery(hallNumber ?? 1), enabled: hallNumber !== null });
  const applied = useMemo<Symmetry | FieldProblem[] | null>(() => {
    if (symmetry.kind === 'operations') {
      return readOperations(symmetry.operations);
    }
    return group.data === undefined
      ? null
      : { operations: group.data.operations, setting: group.data };
  }, [symmetry, group.data]);
  const outcome = useMemo(() => {
    if (applied === null) {
      return { cell: null, problems: noProblems };
    }
    return Array.isArray(applied)
      ? { cell: null, problems: applied }
      : resolveCell(definition, applied);
  }, [definition, applied]);
  const [shown, setShown] = useState<ResolvedCell | null>(outcome.cell);
  if (outcome.cell !== null && outcome.cell !== shown) {
    setShown(outcome.cell);
  }
  return {
    cell: outcome.cell,
    shown: outcome.cell ?? shown,
    problems: outcome.problems,
    setting: hallNumber === null ? null : (group.data ?? null),
    isLoading: hallNumber !== null && group.isPending,
    error: hallNumber === null ? null : group.error,
    retry: () => void group.refetch(),
  };
}
