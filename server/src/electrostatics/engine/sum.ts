import { sumOf } from './accumulator.js';
import type { PreparedCell, RawSums, SplittingPlan } from './contract.js';
import { sumRealSpace, type RealSpaceSums } from './real-space.js';
import { sumReciprocalSpace, type ReciprocalSums } from './reciprocal-space.js';

const sqrtPi = Math.sqrt(Math.PI);

/** Σq and Σq² of each class. */
function chargeBySpecies(cell: PreparedCell): { sum: number; squareSum: number }[] {
  return Array.from({ length: cell.speciesStart.length - 1 }, (_, s) => {
    const charges = cell.charges.subarray(cell.speciesStart[s], cell.speciesStart[s + 1]);
    return {
      sum: charges.reduce((total, q) => total + q, 0),
      squareSum: charges.reduce((total, q) => total + q * q, 0),
    };
  });
}

/**
 * E_AB of species A and B: real part by pairs, reciprocal part by structure factors, self term in
 * E_AA, and each class's own background −(π/2Vη²) Q_A Q_B (twice for A ≠ B), without which an
 * entry would depend on η.
 */
function speciesMatrix(
  cell: PreparedCell,
  eta: number,
  real: RealSpaceSums,
  reciprocal: ReciprocalSums,
): { matrix: number[][]; energy: number; magnitude: number } {
  const classes = chargeBySpecies(cell);
  const kinds = classes.length;
  const matrix = classes.map(() => new Array<number>(kinds).fill(0));
  const backgroundFactor = -Math.PI / (2 * cell.volumeA3 * eta * eta);
  // Backgrounds of a neutral cell cancel exactly on paper: only the net one enters the energy.
  const energyParts = [backgroundFactor * cell.chargeSum ** 2];
  for (let s = 0; s < kinds; s += 1) {
    for (let t = s; t < kinds; t += 1) {
      const parts = [
        real.bySpecies.value(s * kinds + t),
        reciprocal.bySpecies.value(s * kinds + t),
      ];
      if (s === t) {
        parts.push((-eta / sqrtPi) * classes[s]!.squareSum);
      }
      const background = backgroundFactor * classes[s]!.sum * classes[t]!.sum * (s === t ? 1 : 2);
      matrix[s]![t] = sumOf([...parts, background]);
      matrix[t]![s] = matrix[s]![t]!;
      energyParts.push(...parts);
    }
  }
  const magnitude = energyParts.reduce((sum, part) => sum + Math.abs(part), 0);
  return { matrix, energy: sumOf(energyParts), magnitude };
}

/** Size of the parts that make up the potential of a site, the largest over the sites. */
function potentialMagnitude(
  cell: PreparedCell,
  eta: number,
  real: RealSpaceSums,
  reciprocal: ReciprocalSums,
): number {
  let largest = 0;
  for (let i = 0; i < cell.count; i += 1) {
    const parts = Math.abs(real.potentials.value(i)) + Math.abs(reciprocal.potentials.value(i));
    largest = Math.max(largest, parts + (2 * eta * Math.abs(cell.charges[i]!)) / sqrtPi);
  }
  // Neighbours of either sign at mean density: Σ|q| erfc(ηr)/r → π Σ|q|/(V η²).
  return largest + (Math.PI * cell.absoluteChargeSum) / (cell.volumeA3 * eta * eta);
}

/** Potentials and fields in the order of the input, self and background terms added. */
function siteSums(
  cell: PreparedCell,
  eta: number,
  real: RealSpaceSums,
  reciprocal: ReciprocalSums,
): { potentials: Float64Array; fields: Float64Array } {
  const potentials = new Float64Array(cell.count);
  const fields = new Float64Array(3 * cell.count);
  const background = (-Math.PI / (cell.volumeA3 * eta * eta)) * cell.chargeSum;
  for (let i = 0; i < cell.count; i += 1) {
    const original = cell.originalIndex[i]!;
    const parts = [real.potentials.value(i), reciprocal.potentials.value(i)];
    potentials[original] = sumOf([...parts, (-2 * eta * cell.charges[i]!) / sqrtPi, background]);
    for (let axis = 0; axis < 3; axis += 1) {
      fields[3 * original + axis] = real.fields[3 * i + axis]! + reciprocal.fields[3 * i + axis]!;
    }
  }
  return { potentials, fields };
}

/** One whole Ewald evaluation with one splitting parameter, in e²/Å (no Coulomb constant yet). */
export function sumOnce(cell: PreparedCell, plan: SplittingPlan): RawSums {
  const eta = plan.splittingPerA;
  const real = sumRealSpace(cell, plan);
  const reciprocal = sumReciprocalSpace(cell, plan);
  const { matrix, energy, magnitude } = speciesMatrix(cell, eta, real, reciprocal);
  // The background −πQ²/(2Vη²) shrinks as the cell swells: its derivative is +π Q²/(2Vη²) on the diagonal.
  const background = (Math.PI * cell.chargeSum ** 2) / (2 * cell.volumeA3 * eta * eta);
  const strainDerivative = [0, 1, 2, 3, 4, 5].map(
    (k) =>
      real.strainDerivative.value(k) +
      reciprocal.strainDerivative.value(k) +
      (k < 3 ? background : 0),
  );
  return {
    energy,
    ...siteSums(cell, eta, real, reciprocal),
    strainDerivative,
    speciesMatrix: matrix,
    magnitude,
    potentialMagnitude: potentialMagnitude(cell, eta, real, reciprocal),
    realTerms: real.terms,
    reciprocalTerms: reciprocal.terms,
    shortestDistanceA: real.shortestDistanceA,
  };
}
