import { cellVolumeA3, reciprocalVectors } from '#common/physics/cell-metric';

import type { EngineInput, PreparedCell } from './contract.js';

/** Into [0, 1); a value just below zero must not round up to 1. */
function wrap(value: number): number {
  const wrapped = value - Math.floor(value);
  return wrapped >= 1 ? 0 : wrapped;
}

/** @throws RangeError naming what does not fit */
function checkShapes({ vectorsA, fractional, chargesE, speciesIndex }: EngineInput): void {
  const count = chargesE.length;
  if (count === 0 || fractional.length !== 3 * count || speciesIndex.length !== count) {
    throw new RangeError('fractional, chargesE and speciesIndex must describe the same sites');
  }
  const volumeA3 = cellVolumeA3(vectorsA);
  if (!(volumeA3 > 0 && volumeA3 < Infinity)) {
    throw new RangeError(`the cell has a volume of ${volumeA3} Å³`);
  }
  if (![...fractional, ...chargesE].every(Number.isFinite)) {
    throw new RangeError('coordinates and charges must be finite numbers');
  }
}

/**
 * Sites sorted by species, positions wrapped, and everything both sums need; checked once, here at
 * the door.
 *
 * @throws RangeError if arrays disagree, a number is not finite or the cell has no volume
 */
export function prepareCell(input: EngineInput): PreparedCell {
  checkShapes(input);
  const count = input.chargesE.length;
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
      fractional[3 * i + axis] = wrap(input.fractional[3 * original + axis]!);
    }
  });
  const charges = Float64Array.from(originalIndex, (original) => input.chargesE[original]!);
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
  };
}
