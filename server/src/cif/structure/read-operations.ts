import { Problem } from '#common/errors/problem';
import { formatOperation, parseOperation } from '#common/physics/symmetry-operation';
import { cellLimits } from '#common/schemas/cell';
import type { SymmetryOperation } from '#common/schemas/symmetry';
import { composed, operationKey, twentyFourths } from '#server/symmetry/operation-key';

import { columnReader, findLoop, findValue } from '../format/block-values.js';
import type { CifBlock, CifValue } from '../format/cif-document.js';

const tags = [
  '_space_group_symop_operation_xyz',
  '_space_group_symop.operation_xyz',
  '_symmetry_equiv_pos_as_xyz',
  '_symmetry_equiv.pos_as_xyz',
] as const;

/**
 * The symmetry operations listed in a block, or null when none are.
 * @throws Problem `cif.symmetry` for an unreadable operation or a list that is no group
 */
export function readOperations(block: CifBlock): SymmetryOperation[] | null {
  const listed = listedValues(block);
  if (listed.length === 0) {
    return null;
  }
  if (listed.length > cellLimits.operations) {
    throw new Problem(
      'cif.symmetry',
      `${listed.length} operations are listed; no space group has more than ${cellLimits.operations} in a conventional cell.`,
      { line: listed[0]!.line },
    );
  }
  const operations = listed.map(readOperation);
  requireGroup(operations, listed[0]!.line);
  return operations;
}

function listedValues(block: CifBlock): CifValue[] {
  const loop = findLoop(block, ...tags);
  if (!loop) {
    const single = findValue(block, ...tags);
    return single ? [single] : [];
  }
  const read = columnReader(loop);
  return loop.rows.flatMap((row) => read(row, ...tags) ?? []);
}

function readOperation(value: CifValue): SymmetryOperation {
  try {
    const { rotation, translation } = parseOperation(value.text);
    return { rotation, translation: translation.map(exactShift) };
  } catch (error) {
    if (error instanceof Problem) {
      throw new Problem('cif.symmetry', `Line ${value.line}: ${error.message}`, {
        line: value.line,
      });
    }
    throw error;
  }
}

/** `0.3333` in an operation means 1/3. */
function exactShift(value: number): number {
  const count = twentyFourths(value);
  return count === null ? value : count / 24;
}

function requireGroup(operations: readonly SymmetryOperation[], line: number): void {
  const keys = new Set(operations.map(operationKey));
  if (keys.has(null)) {
    return;
  }
  for (const first of operations) {
    for (const second of operations) {
      const product = composed(second, first);
      if (!keys.has(operationKey(product))) {
        throw new Problem(
          'cif.symmetry',
          `Line ${line}: the listed operations are no complete group: “${formatOperation(first)}” ` +
            `followed by “${formatOperation(second)}” gives “${formatOperation(product)}”, which is missing.`,
          { line },
        );
      }
    }
  }
}
