import { cellVolumeA3, reciprocalVectors } from '#common/physics/cell-metric';
import { buildNeighbourGrid, forEachNeighbour } from '#common/physics/neighbours';

import type { EngineInput, PreparedCell } from './contract.js';

/** Shortest distance between sites, images included, Å. */
function shortestDistance(vectorsA: readonly number[], fractional: Float64Array): number {
  const count = fractional.length / 3;
  // The nearest pair is never farther apart than this: one site per room, and its own images.
  const shortestEdge = Math.min(
    ...[0, 1, 2].map((k) => Math.hypot(...vectorsA.slice(3 * k, 3 * k + 3))),
  );
  const radiusA = Math.min(shortestEdge, 1.3 * Math.cbrt(cellVolumeA3(vectorsA) / count) + 1e-9);
  for (const reachA of [radiusA, shortestEdge]) {
    const grid = buildNeighbourGrid(vectorsA, fractional, reachA);
    let shortest = Infinity;
    for (let i = 0; i < count; i += 1) {
      forEachNeighbour(grid, i, reachA * (1 + 1e-12), (_j, distanceA) => {
        shortest = Math.min(shortest, distanceA);
      });
    }
    if (shortest < Infinity) {
      return shortest;
    }
  }
  return shortestEdge;
}

/** Sites sorted by species and everything both sums need; checked once, here at the door. */
export function prepareCell(input: EngineInput): PreparedCell {
  const count = input.chargesE.length;
  if (count === 0 || input.fractional.length !== 3 * count || input.speciesIndex.length !== count) {
    throw new RangeError('fractional, chargesE and speciesIndex must describe the same sites');
  }
  const speciesStart = new Int32Array(input.speciesCount + 1);
  input.speciesIndex.forEach((s) => {
    speciesStart[s + 1]! += 1;
  });
  for (let s = 0; s < input.speciesCount; s += 1) {
    speciesStart[s + 1]! += speciesStart[s]!;
  }
  const originalIndex = Int32Array.from({ length: count }, (_, i) => i).sort(
    (a, b) => input.speciesIndex[a]! - input.speciesIndex[b]! || a - b,
  );
  const fractional = new Float64Array(3 * count);
  originalIndex.forEach((original, i) => {
    for (let axis = 0; axis < 3; axis += 1) {
      const value = input.fractional[3 * original + axis]!;
      fractional[3 * i + axis] = value - Math.floor(value);
    }
  });
  const charges = Float64Array.from(originalIndex, (original) => input.chargesE[original]!);
  const shortestDistanceA = shortestDistance(input.vectorsA, fractional);
  if (!(shortestDistanceA > 0)) {
    throw new RangeError('two sites coincide');
  }
  return {
    vectorsA: input.vectorsA,
    reciprocalPerA: reciprocalVectors(input.vectorsA),
    volumeA3: cellVolumeA3(input.vectorsA),
    count,
    fractional,
    charges,
    species: Int32Array.from(originalIndex, (original) => input.speciesIndex[original]!),
    speciesStart,
    originalIndex,
    chargeSum: charges.reduce((sum, q) => sum + q, 0),
    chargeSquareSum: charges.reduce((sum, q) => sum + q * q, 0),
    absoluteChargeSum: charges.reduce((sum, q) => sum + Math.abs(q), 0),
    shortestDistanceA,
  };
}
