import { formatOperation } from '#common/physics/symmetry-operation';
import type { SymmetryOperation } from '#common/schemas/symmetry';

/** Translations closer than this are one; allows for a third typed as 0.333. */
const translationTolerance = 2e-3;

/** How far |WᵀGW − G| may stray, relative to the edges: cells are measured to about 10⁻⁴. */
const metricTolerance = 1e-3;

const identityKey = '1,0,0,0,1,0,0,0,1';

/** The operation “first `b`, then `a`”. */
function product(a: SymmetryOperation, b: SymmetryOperation): SymmetryOperation {
  const [v, w] = [a.rotation, b.rotation];
  const rotation = new Array<number>(9);
  const translation = new Array<number>(3);
  for (let i = 0; i < 3; i += 1) {
    let shift = a.translation[i]!;
    for (let j = 0; j < 3; j += 1) {
      rotation[3 * i + j] =
        v[3 * i]! * w[j]! + v[3 * i + 1]! * w[3 + j]! + v[3 * i + 2]! * w[6 + j]!;
      shift += v[3 * i + j]! * b.translation[j]!;
    }
    translation[i] = shift - Math.floor(shift);
  }
  return { rotation, translation };
}

function isSameShift(a: readonly number[], b: readonly number[]): boolean {
  return a.every((value, k) => {
    const difference = value - b[k]!;
    return Math.abs(difference - Math.round(difference)) < translationTolerance;
  });
}

function findGroupFault(operations: readonly SymmetryOperation[]): string | null {
  const shiftsOf = new Map<string, (readonly number[])[]>();
  for (const operation of operations) {
    const key = operation.rotation.join(',');
    shiftsOf.set(key, [...(shiftsOf.get(key) ?? []), operation.translation]);
  }
  if (!shiftsOf.get(identityKey)?.some((shift) => isSameShift(shift, [0, 0, 0]))) {
    return 'The identity x,y,z is missing among the operations: add it.';
  }
  for (const a of operations) {
    for (const b of operations) {
      const both = product(a, b);
      const shifts = shiftsOf.get(both.rotation.join(','));
      if (!shifts?.some((shift) => isSameShift(shift, both.translation))) {
        return (
          `These operations are not complete: ${formatOperation(b)} followed by ` +
          `${formatOperation(a)} gives ${formatOperation(both)}, which is missing. ` +
          'Add it, or correct one of the two.'
        );
      }
    }
  }
  return null;
}

const knownFaults = new WeakMap<readonly SymmetryOperation[], { readonly fault: string | null }>();

/**
 * Why a list of operations is not a group modulo lattice translations, or null if it is one:
 * every product of two must be in the list, and the identity. Repeats do no harm.
 * The answer is kept for the same array.
 */
export function groupFault(operations: readonly SymmetryOperation[]): string | null {
  const known = knownFaults.get(operations) ?? { fault: findGroupFault(operations) };
  knownFaults.set(operations, known);
  return known.fault;
}

/** G = A·Aᵀ, row-major: dot products of the cell edges in Å². */
function metricOf(vectors: readonly number[]): number[] {
  const metric = new Array<number>(9);
  for (let i = 0; i < 3; i += 1) {
    for (let j = 0; j < 3; j += 1) {
      metric[3 * i + j] =
        vectors[3 * i]! * vectors[3 * j]! +
        vectors[3 * i + 1]! * vectors[3 * j + 1]! +
        vectors[3 * i + 2]! * vectors[3 * j + 2]!;
    }
  }
  return metric;
}

/**
 * Names the first operation that does not keep lengths and angles in this cell, or gives null.
 * An isometry has WᵀGW = G (International Tables for Crystallography Vol. A, 1.3.2).
 *
 * @param vectors rows a, b, c in Å
 */
export function findMetricFault(
  operations: readonly SymmetryOperation[],
  vectors: readonly number[],
): string | null {
  const metric = metricOf(vectors);
  const edge = [0, 1, 2].map((k) => Math.sqrt(metric[4 * k]!));
  for (const operation of operations) {
    const w = operation.rotation;
    for (let i = 0; i < 3; i += 1) {
      for (let j = 0; j < 3; j += 1) {
        let image = 0;
        for (let k = 0; k < 3; k += 1) {
          for (let l = 0; l < 3; l += 1) {
            image += w[3 * k + i]! * metric[3 * k + l]! * w[3 * l + j]!;
          }
        }
        if (Math.abs(image - metric[3 * i + j]!) > metricTolerance * edge[i]! * edge[j]!) {
          return (
            `${formatOperation(operation)} does not map this cell onto itself: make the edges and ` +
            'angles fit the symmetry, or remove the operation.'
          );
        }
      }
    }
  }
  return null;
}
