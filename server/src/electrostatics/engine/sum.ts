import { Accumulator } from './accumulator.js';
import type { PreparedCell, RawSums, SplittingPlan } from './contract.js';
import { sumRealSpace, type RealSpaceSums } from './real-space.js';
import { sumReciprocalSpace, type ReciprocalSums } from './reciprocal-space.js';

const sqrtPi = Math.sqrt(Math.PI);

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
  const matrix = classes.map(() => classes.map(() => 0));
  const energy = new Accumulator();
  let magnitude = 0;
  for (let s = 0; s < classes.length; s += 1) {
    for (let t = s; t < classes.length; t += 1) {
      const parts = [real.bySpecies[s]![t]!.value, reciprocal.bySpecies[s]![t]!.value];
      parts.push(s === t ? (-eta / sqrtPi) * classes[s]!.squareSum : real.bySpecies[t]![s]!.value);
      const background =
        (-Math.PI / (2 * cell.volumeA3 * eta * eta)) *
        classes[s]!.sum *
        classes[t]!.sum *
        (s === t ? 1 : 2);
      const entry = new Accumulator();
      [...parts, background].forEach((part) => entry.add(part));
      matrix[s]![t] = entry.value;
      matrix[t]![s] = entry.value;
      // Backgrounds of a neutral cell cancel exactly on paper: only the net one enters the energy.
      parts.forEach((part) => energy.add(part));
      magnitude += parts.reduce((sum, part) => sum + Math.abs(part), 0);
    }
  }
  energy.add((-Math.PI / (2 * cell.volumeA3 * eta * eta)) * cell.chargeSum ** 2);
  return { matrix, energy: energy.value, magnitude };
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
    const potential = new Accumulator();
    potential.add(real.potentials.value(i));
    potential.add(reciprocal.potentials.value(i));
    potential.add((-2 * eta * cell.charges[i]!) / sqrtPi);
    potential.add(background);
    potentials[original] = potential.value;
    for (let axis = 0; axis < 3; axis += 1) {
      fields[3 * original + axis] =
        real.fields.value(3 * i + axis) + reciprocal.fields.value(3 * i + axis);
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
  const strainDerivative = real.strainDerivative.map(
    (part, k) => part.value + reciprocal.strainDerivative[k]!.value + (k < 3 ? background : 0),
  );
  return {
    energy,
    ...siteSums(cell, eta, real, reciprocal),
    strainDerivative,
    speciesMatrix: matrix,
    magnitude,
    realTerms: real.terms,
    reciprocalTerms: reciprocal.terms,
  };
}
