import { fractionalToCartesian } from '#common/physics/cell-metric';
import { faceDistancesA } from '#common/physics/neighbours';

import type { PreparedCell } from './contract.js';

/** Sites of the cell in bins, and which bins lie within the cut-off of a bin. */
export interface Bins {
  readonly perAxis: readonly [number, number, number];
  /** Sites of bin b are `order[start[b]] … order[start[b + 1] − 1]`. */
  readonly start: Int32Array;
  readonly order: Int32Array;
  /** Half of the offsets in reach, three numbers each: of o and −o one; (0, 0, 0) comes first. */
  readonly offsets: Int32Array;
  /** Half of the longest diagonal of a bin, Å. */
  readonly halfDiagonalA: number;
}

const mostBinsPerAxis = 64;

/** The longest diagonal of a parallelepiped, Å. */
function longestDiagonalA(vectorsA: readonly number[]): number {
  const signs = [
    [1, 1, 1],
    [1, 1, -1],
    [1, -1, 1],
    [1, -1, -1],
  ];
  return Math.max(...signs.map((sign) => Math.hypot(...fractionalToCartesian(vectorsA, sign))));
}

/** True for one of o and −o. */
function isFirstOfTwo(x: number, y: number, z: number): boolean {
  return x > 0 || (x === 0 && (y > 0 || (y === 0 && z > 0)));
}

/** Offsets of bins that can hold a site within the cut-off of a site of the home bin. */
function offsetsInReach(
  binVectorsA: readonly number[],
  span: readonly number[],
  reachA: number,
): Int32Array {
  const offsets = [0, 0, 0];
  const [sx, sy, sz] = span as [number, number, number];
  for (let x = 0; x <= sx; x += 1) {
    for (let y = -sy; y <= sy; y += 1) {
      for (let z = -sz; z <= sz; z += 1) {
        const [dx, dy, dz] = fractionalToCartesian(binVectorsA, [x, y, z]);
        if (isFirstOfTwo(x, y, z) && dx * dx + dy * dy + dz * dz <= reachA * reachA) {
          offsets.push(x, y, z);
        }
      }
    }
  }
  return Int32Array.from(offsets);
}

/** Sorts site indices by bin, keeping their order within one. */
function sortIntoBins(
  fractional: Float64Array,
  perAxis: readonly [number, number, number],
): { start: Int32Array; order: Int32Array } {
  const count = fractional.length / 3;
  const [nx, ny, nz] = perAxis;
  const start = new Int32Array(nx * ny * nz + 1);
  const binOf = new Int32Array(count);
  for (let i = 0; i < count; i += 1) {
    const x = Math.min(nx - 1, Math.floor(fractional[3 * i]! * nx));
    const y = Math.min(ny - 1, Math.floor(fractional[3 * i + 1]! * ny));
    const z = Math.min(nz - 1, Math.floor(fractional[3 * i + 2]! * nz));
    binOf[i] = (x * ny + y) * nz + z;
    start[binOf[i]! + 1]! += 1;
  }
  for (let b = 0; b < start.length - 1; b += 1) {
    start[b + 1]! += start[b]!;
  }
  const next = start.slice();
  const order = new Int32Array(count);
  for (let i = 0; i < count; i += 1) {
    order[next[binOf[i]!]!++] = i;
  }
  return { start, order };
}

/**
 * Bins about half a cut-off wide. Exact in cells of any shape: bins are bounded by planes, so how
 * many to look through along an axis follows from the distance between faces; bins whose every
 * pair of points is farther apart than the cut-off are then left out.
 */
export function buildBins(cell: PreparedCell, cutoffA: number): Bins {
  const heights = faceDistancesA(cell.vectorsA);
  const room = Math.cbrt(cell.volumeA3 / cell.count);
  const perAxis = heights.map((height) =>
    Math.max(1, Math.min(mostBinsPerAxis, Math.round(height / Math.max(cutoffA / 2, room)))),
  ) as [number, number, number];
  const binVectorsA = cell.vectorsA.map((value, k) => value / perAxis[Math.floor(k / 3)]!);
  const span = heights.map((height, axis) => Math.ceil((cutoffA * perAxis[axis]!) / height));
  const diagonalA = longestDiagonalA(binVectorsA);
  return {
    perAxis,
    ...sortIntoBins(cell.fractional, perAxis),
    offsets: offsetsInReach(binVectorsA, span, cutoffA + diagonalA),
    halfDiagonalA: diagonalA / 2,
  };
}
