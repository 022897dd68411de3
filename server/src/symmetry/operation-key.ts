import type { SymmetryOperation } from '#common/schemas/symmetry';

/** Translations further than this from a multiple of 1/24 are no tabulated ones. */
const snapLimit = 0.002;

/**
 * A translation component as a count of 24ths in 0…23 (0.3333 counts as 1/3), or null where it is
 * none: every translation of the tabulated settings is a multiple of 1/24.
 */
export function twentyFourths(value: number): number | null {
  const count = Math.round(value * 24);
  if (!Number.isFinite(value) || Math.abs(value - count / 24) > snapLimit) {
    return null;
  }
  return ((count % 24) + 24) % 24;
}

/** A name that two equal operations share, or null when it can't be a tabulated operation. */
export function operationKey(operation: SymmetryOperation): string | null {
  const shifts = operation.translation.map(twentyFourths);
  return shifts.includes(null) ? null : `${operation.rotation.join(',')}|${shifts.join(',')}`;
}

/** A name that two equal sets of operations share, whatever their order; null as above. */
export function operationSetKey(operations: readonly SymmetryOperation[]): string | null {
  const keys = new Set(operations.map(operationKey));
  return keys.has(null) ? null : [...keys].sort().join(';');
}

/** The operation that applies `second` after `first`, translation taken into [0, 1). */
export function composed(second: SymmetryOperation, first: SymmetryOperation): SymmetryOperation {
  const rotation: number[] = [];
  const translation: number[] = [];
  for (let row = 0; row < 3; row += 1) {
    let shift = second.translation[row]!;
    for (let column = 0; column < 3; column += 1) {
      let sum = 0;
      for (let k = 0; k < 3; k += 1) {
        sum += second.rotation[3 * row + k]! * first.rotation[3 * k + column]!;
      }
      rotation.push(sum);
      shift += second.rotation[3 * row + column]! * first.translation[column]!;
    }
    translation.push(shift - Math.floor(shift));
  }
  return { rotation, translation };
}
