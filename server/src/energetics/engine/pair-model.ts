import { cellVolumeA3 } from '#common/physics/cell-metric';
import { COULOMB_EV_ANGSTROM } from '#common/units/constants';

import type { PairModelInput, PairModelResult, SecondDerivatives } from './contract.js';
import { addRealSpace } from './real-space.js';
import { addReciprocalSpace } from './reciprocal-space.js';
import { neglectedEnergyEv } from './short-range.js';
import { chooseSplitting } from './splitting.js';
import { emptySums, type Sums } from './sums.js';

/** A net charge below this part of Σ|q| is the rounding of thirds and the like. */
const neutralWithin = 1e-10;

function sumOver(values: ArrayLike<number>, of: (value: number) => number): number {
  let sum = 0;
  for (let i = 0; i < values.length; i += 1) {
    sum += of(values[i]!);
  }
  return sum;
}

function everyFinite(values: ArrayLike<number>): boolean {
  return Number.isFinite(sumOver(values, Math.abs));
}

/**
 * Checks an input once, at the door.
 * @throws RangeError naming what does not fit
 */
export function checkPairModel(input: PairModelInput): void {
  const count = input.chargesE.length;
  if (count === 0 || input.fractional.length !== 3 * count || input.speciesIndex.length !== count) {
    throw new RangeError('fractional, chargesE and speciesIndex must describe the same sites');
  }
  if (![input.vectorsA, input.fractional, input.chargesE].every(everyFinite)) {
    throw new RangeError('vectors, coordinates and charges must be finite numbers');
  }
  if (input.vectorsA.length !== 9 || !(cellVolumeA3(Array.from(input.vectorsA)) > 0)) {
    throw new RangeError('the cell has no volume');
  }
  if (!(input.cutoffA > 0 && input.cutoffA < Infinity)) {
    throw new RangeError('cutoffA must be a positive number');
  }
  const net = sumOver(input.chargesE, (q) => q);
  if (Math.abs(net) > neutralWithin * sumOver(input.chargesE, Math.abs)) {
    throw new RangeError('the cell is charged');
  }
  const seen = new Set<string>();
  for (const { speciesA, speciesB, prefactorEv, hardnessA, dispersionEvA6 } of input.pairs) {
    const key = [Math.min(speciesA, speciesB), Math.max(speciesA, speciesB)].join();
    if (seen.has(key) || !(hardnessA > 0) || !everyFinite([prefactorEv, dispersionEvA6])) {
      throw new RangeError(
        'each pair of species takes one term of finite numbers and a hardness > 0',
      );
    }
    seen.add(key);
  }
}

/** Fills the lower triangles, and K_ii = −Σ_{j≠i} K_ij: a shift of the whole cell costs nothing. */
function complete(sums: Sums): SecondDerivatives {
  const { count, coupling, strainStrain } = sums;
  const width = 3 * count;
  for (let i = 0; i < count; i += 1) {
    for (let j = i + 1; j < count; j += 1) {
      for (let a = 0; a < 3; a += 1) {
        for (let b = 0; b < 3; b += 1) {
          const value = coupling[(3 * i + a) * width + 3 * j + b]!;
          coupling[(3 * j + b) * width + 3 * i + a] = value;
          coupling[(3 * i + a) * width + 3 * i + b]! -= value;
          coupling[(3 * j + b) * width + 3 * j + a]! -= value;
        }
      }
    }
  }
  for (let v = 0; v < 6; v += 1) {
    for (let w = 0; w < v; w += 1) {
      strainStrain[6 * v + w] = strainStrain[6 * w + v]!;
    }
  }
  return {
    forceConstantsEvPerA2: coupling,
    internalStrainEvPerA: sums.mixed,
    strainStrainEv: strainStrain,
  };
}

/**
 * Energy, forces and stress of a checked input, and second derivatives where asked for.
 * @throws RangeError if two ions coincide
 */
export function pairModel(input: PairModelInput, withSecond: boolean): PairModelResult {
  const volumeA3 = cellVolumeA3(Array.from(input.vectorsA));
  const splitting = chooseSplitting(volumeA3, input.cutoffA, input.splittingFactor ?? 1);
  const sums = emptySums(input.chargesE.length, withSecond);
  addRealSpace(input, splitting, sums, withSecond);
  if (!(sums.shortestSquare > 1e-12)) {
    throw new RangeError('two ions coincide');
  }
  addReciprocalSpace(input, splitting, volumeA3, sums, withSecond);
  const selfEv =
    (-COULOMB_EV_ANGSTROM * splitting.splittingPerA * sumOver(input.chargesE, (q) => q * q)) /
    Math.sqrt(Math.PI);
  const coulombEv = sums.coulomb + selfEv;
  return {
    energyEv: coulombEv + sums.shortRange,
    coulombEv,
    shortRangeEv: sums.shortRange,
    neglectedEv: neglectedEnergyEv(input, volumeA3),
    forcesEvPerA: sums.gradient.map((slope) => -slope),
    stressEvPerA3: sums.strain.map((slope) => slope / volumeA3),
    volumeA3,
    shortestDistanceA: Math.sqrt(sums.shortestSquare),
    second: withSecond ? complete(sums) : null,
  };
}
