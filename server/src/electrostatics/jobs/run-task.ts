import { createHash } from 'node:crypto';
import { performance } from 'node:perf_hooks';

import { Problem, type FieldProblem } from '#common/errors/problem';
import { evaluationHashInput } from '#common/physics/cell-hash-input';
import { composition } from '#common/physics/composition';
import { buildPairLedger, defaultGroupingA } from '#common/physics/pair-ledger';
import { resolveCell, type CellSymmetryData } from '#common/physics/resolve-cell';
import type { ResolvedCell } from '#common/physics/resolved-cell';
import type { CellDefinition, EvaluationMethod } from '#common/schemas/cell';
import { symmetryOf } from '#server/symmetry/space-groups';

import { engineVersion } from '../engine/index.js';
import { evaluateCell } from '../evaluate-cell.js';
import type { CellIdentity, EvaluationTask, TaskAnswer } from './evaluation-task.js';

const fieldsReported = 50;

/** Field paths of the cell become those of the request: `sites.0.x` → `cell.sites.0.x`. */
function refusal(code: string, message: string, fields: readonly FieldProblem[]): TaskAnswer {
  const inRequest = fields
    .slice(0, fieldsReported)
    .map((field) => ({ ...field, field: `cell.${field.field}` }));
  return { kind: 'problem', problem: { code, message, fields: inRequest } };
}

function identify(
  cell: ResolvedCell,
  method: EvaluationMethod,
  { setting }: CellSymmetryData,
): CellIdentity {
  const named = setting && { number: setting.number, symbol: setting.symbol };
  return {
    hash: createHash('sha256')
      .update(evaluationHashInput(cell, method, named, engineVersion))
      .digest('hex'),
    formula: composition(cell).formula,
    spaceGroupNumber: setting?.number ?? null,
    spaceGroupSymbol: setting?.symbol ?? null,
  };
}

/** The operations of a cell; a failure names the field. */
function readSymmetry({ symmetry }: CellDefinition): CellSymmetryData {
  try {
    return symmetryOf(symmetry);
  } catch (error) {
    if (error instanceof Problem && error.details?.fields === undefined) {
      const { code, message } = error;
      throw new Problem(code, message, { fields: [{ code, field: 'symmetry', message }] });
    }
    throw error;
  }
}

/** Pairs counted at most to find one row: as far as a reach can be set on the page, and more. */
const mostPairs = 4e6;

/** Whether the pair ledger has a row of this name when it reaches that far. */
function hasPair(cell: ResolvedCell, pairKey: string): boolean {
  const distanceA = Number(pairKey.split('|').at(-1));
  const pairs = (4 * Math.PI * distanceA ** 3 * cell.sites.length ** 2) / (3 * cell.volumeA3);
  if (!(distanceA > 0 && pairs <= mostPairs)) {
    return false;
  }
  const reachA = distanceA + 2 * defaultGroupingA;
  return buildPairLedger(cell, 0, 1, { reachA }).rows.some(({ key }) => key === pairKey);
}

function perform(task: EvaluationTask): TaskAnswer {
  const started = performance.now();
  const { cell: definition, method } = task;
  const symmetry = readSymmetry(definition);
  const { cell, problems } = resolveCell(definition, symmetry);
  if (cell === null) {
    const [first] = problems;
    return refusal(first!.code, first!.message, problems);
  }
  if (task.kind === 'find_pair') {
    return { kind: 'pair', isThere: hasPair(cell, task.pairKey) };
  }
  const identity = identify(cell, method, symmetry);
  if (task.kind === 'identify') {
    return { kind: 'identity', identity };
  }
  const { hash, spaceGroupNumber, spaceGroupSymbol } = identity;
  const result = evaluateCell(cell, method, { spaceGroupNumber, spaceGroupSymbol });
  return { kind: 'evaluation', hash, result, durationMs: performance.now() - started };
}

/** Does a task from start to end; what is wrong with the cell is an answer, not a failure. */
export function runTask(task: EvaluationTask): TaskAnswer {
  try {
    return perform(task);
  } catch (error) {
    if (error instanceof Problem) {
      return refusal(error.code, error.message, error.details?.fields ?? []);
    }
    throw error;
  }
}
