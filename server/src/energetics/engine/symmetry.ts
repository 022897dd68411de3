import { reciprocalVectors } from '#common/physics/cell-metric';

import { tensorPairs, type CellOperation, type PairModelInput } from './contract.js';

/** An ion and its image may differ by this much before the operation is said not to fit, in Å. */
const fitWithinA = 0.1;

/** A direction among 3N displacements and six strains, most of whose entries are zero. */
export interface SparseDirection {
  readonly at: Int32Array;
  readonly value: Float64Array;
}

/** An operation in Cartesian axes, and the site each site is brought to. */
export interface PlacedOperation extends CellOperation {
  readonly cartesian: Float64Array;
  readonly image: Int32Array;
}

/** R of r′ = R r from W of x′ = W x: with rows a, b, c in h, R = hᵀ W h⁻ᵀ. */
function cartesianRotation(vectorsA: readonly number[], w: readonly number[]): Float64Array {
  const b = reciprocalVectors(vectorsA);
  const rotation = new Float64Array(9);
  for (let i = 0; i < 3; i += 1) {
    for (let j = 0; j < 3; j += 1) {
      for (let k = 0; k < 3; k += 1) {
        for (let l = 0; l < 3; l += 1) {
          rotation[3 * i + j]! +=
            (vectorsA[3 * k + i]! * w[3 * k + l]! * b[3 * l + j]!) / (2 * Math.PI);
        }
      }
    }
  }
  return rotation;
}

/** x − y less the whole numbers, in Å. */
function apartA(vectorsA: readonly number[], x: ArrayLike<number>, y: ArrayLike<number>): number {
  const d = [0, 1, 2].map((k) => x[k]! - y[k]! - Math.round(x[k]! - y[k]!));
  const along = (axis: number) =>
    d[0]! * vectorsA[axis]! + d[1]! * vectorsA[3 + axis]! + d[2]! * vectorsA[6 + axis]!;
  return Math.hypot(along(0), along(1), along(2));
}

function imageOf({ rotation: w, translation: t }: CellOperation, x: ArrayLike<number>): number[] {
  return [0, 1, 2].map(
    (k) => w[3 * k]! * x[0]! + w[3 * k + 1]! * x[1]! + w[3 * k + 2]! * x[2]! + t[k]!,
  );
}

function siteAt(fractional: ArrayLike<number>, i: number): [number, number, number] {
  return [fractional[3 * i]!, fractional[3 * i + 1]!, fractional[3 * i + 2]!];
}

/**
 * Finds the site each operation brings each site to.
 * @throws RangeError if an operation doesn't map the cell onto itself
 */
export function placeOperations(
  input: PairModelInput,
  operations: readonly CellOperation[],
): PlacedOperation[] {
  const vectorsA = Array.from(input.vectorsA);
  const count = input.chargesE.length;
  return operations.map((operation) => {
    const image = new Int32Array(count);
    for (let i = 0; i < count; i += 1) {
      const x = imageOf(operation, siteAt(input.fractional, i));
      let nearest = Infinity;
      for (let j = 0; j < count; j += 1) {
        const isSame =
          input.speciesIndex[i] === input.speciesIndex[j] &&
          Math.abs(input.chargesE[i]! - input.chargesE[j]!) < 1e-9;
        const distance = isSame ? apartA(vectorsA, x, siteAt(input.fractional, j)) : Infinity;
        if (distance < nearest) {
          nearest = distance;
          image[i] = j;
        }
      }
      if (!(nearest <= fitWithinA)) {
        throw new RangeError('an operation does not map the sites onto themselves');
      }
    }
    return { ...operation, image, cartesian: cartesianRotation(vectorsA, operation.rotation) };
  });
}

/** Coordinates averaged over the operations, so that the cell keeps them to rounding. */
export function symmetrisedSites(
  fractional: ArrayLike<number>,
  operations: readonly PlacedOperation[],
): Float64Array {
  const mean = Float64Array.from(fractional);
  const count = mean.length / 3;
  for (const operation of operations) {
    for (let i = 0; i < count; i += 1) {
      const x = imageOf(operation, siteAt(fractional, i));
      const at = 3 * operation.image[i]!;
      for (let k = 0; k < 3; k += 1) {
        const off = x[k]! - fractional[at + k]!;
        mean[at + k]! += (off - Math.round(off)) / operations.length;
      }
    }
  }
  return mean;
}

/** Largest distance of a site from where an operation puts it, in Å. */
export function symmetryDeviationA(
  vectorsA: ArrayLike<number>,
  fractional: ArrayLike<number>,
  operations: readonly PlacedOperation[],
): number {
  const v = Array.from(vectorsA);
  let largest = 0;
  for (const operation of operations) {
    operation.image.forEach((j, i) => {
      const x = imageOf(operation, siteAt(fractional, i));
      largest = Math.max(largest, apartA(v, x, siteAt(fractional, j)));
    });
  }
  return largest;
}

function dot(a: ArrayLike<number>, b: ArrayLike<number>): number {
  let sum = 0;
  for (let k = 0; k < a.length; k += 1) {
    sum += a[k]! * b[k]!;
  }
  return sum;
}

/** Orthonormal vectors that span those given (modified Gram–Schmidt, done twice). */
function orthonormal(candidates: readonly Float64Array[]): Float64Array[] {
  const basis: Float64Array[] = [];
  for (const candidate of candidates) {
    const v = candidate.slice();
    for (const known of [...basis, ...basis]) {
      const along = dot(v, known);
      v.forEach((_, k) => (v[k]! -= along * known[k]!));
    }
    const length = Math.sqrt(dot(v, v));
    if (length > 1e-6) {
      basis.push(v.map((x) => x / length));
    }
  }
  return basis;
}

/** Mean over the operations of a displacement e_axis of one site: what it leaves is symmetric. */
function projectedDisplacement(
  operations: readonly PlacedOperation[],
  site: number,
  axis: number,
  width: number,
): Float64Array {
  const mean = new Float64Array(width);
  for (const { cartesian, image } of operations) {
    for (let k = 0; k < 3; k += 1) {
      mean[3 * image[site]! + k]! += cartesian[3 * k + axis]! / operations.length;
    }
  }
  return mean;
}

/** Orthonormal displacements that keep the operations, orbit by orbit. */
function siteDirections(operations: readonly PlacedOperation[], count: number): SparseDirection[] {
  const seen = new Uint8Array(count);
  const directions: SparseDirection[] = [];
  for (let site = 0; site < count; site += 1) {
    if (seen[site]! === 1) {
      continue;
    }
    const orbit = [...new Set(operations.map(({ image }) => image[site]!))];
    orbit.forEach((member) => (seen[member] = 1));
    const place = (full: Float64Array) =>
      Float64Array.from(orbit.flatMap((member) => [0, 1, 2].map((k) => full[3 * member + k]!)));
    const at = Int32Array.from(orbit.flatMap((member) => [0, 1, 2].map((k) => 3 * member + k)));
    const candidates = [0, 1, 2].map((axis) =>
      place(projectedDisplacement(operations, site, axis, 3 * count)),
    );
    directions.push(...orthonormal(candidates).map((value) => ({ at, value })));
  }
  return directions;
}

/** Strain E_v averaged over the operations, as six components in which shear counts √2. */
function projectedStrain(operations: readonly PlacedOperation[], v: number): Float64Array {
  const [c, d] = tensorPairs[v]!;
  const mean = new Float64Array(6);
  for (const { cartesian: r } of operations) {
    tensorPairs.forEach(([a, b], w) => {
      const value = 0.5 * (r[3 * a + c]! * r[3 * b + d]! + r[3 * a + d]! * r[3 * b + c]!);
      mean[w]! += ((w < 3 ? 1 : Math.SQRT2) * value) / operations.length;
    });
  }
  return mean;
}

/**
 * Orthonormal directions among displacements (Å) and strain times a length that keep every
 * operation: the space in which a relaxation moves. Entries 3N … 3N + 5 are strains with γ = 2ε.
 *
 * @param lengthA weighs strain against displacements; null leaves the cell as it is
 */
export function symmetricDirections(
  operations: readonly PlacedOperation[],
  count: number,
  lengthA: number | null,
): SparseDirection[] {
  const directions = siteDirections(operations, count);
  if (lengthA === null) {
    return directions;
  }
  const candidates = [0, 1, 2, 3, 4, 5].map((v) => projectedStrain(operations, v));
  const at = Int32Array.from({ length: 6 }, (_, v) => 3 * count + v);
  const strains = orthonormal(candidates).map((mandel) => ({
    at,
    value: mandel.map((x, v) => (x * (v < 3 ? 1 : Math.SQRT2)) / lengthA),
  }));
  return [...directions, ...strains];
}
