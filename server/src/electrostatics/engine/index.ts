import { COULOMB_EV_ANGSTROM } from '#common/units/constants';

import type {
  EngineCertificate,
  EngineInput,
  EngineResult,
  PreparedCell,
  RawSums,
  SplittingPlan,
} from './contract.js';
import { truncation, planSplitting, type Allowances } from './plan.js';
import { prepareCell } from './prepare.js';
import { sumOnce } from './sum.js';

export { erfc } from './erfc.js';

/** Named in every result, and part of its content hash: a change of digits needs a new one. */
export const engineVersion = 'ewald-gaussian-2';

/** The second splitting parameter of the certificate, relative to the first. */
const secondSplitting = 1.2;

/** Rounding of compensated sums of parts, in units of 2⁻⁵² of their sizes; see the tests. */
const roundingUnits = 8;

/** A net charge below this part of Σ|q| is the rounding of thirds and the like. */
const neutralWithin = 1e-10;

/** The two evaluations and what follows from them, in e²/Å and e/Å. */
interface Pair {
  readonly input: EngineInput;
  readonly plans: readonly [SplittingPlan, SplittingPlan];
  readonly first: RawSums;
  readonly second: RawSums;
  /** Truncation and rounding of the first evaluation. */
  readonly allowances: Allowances;
  /** What the requested tolerance allows, e²/Å: ε Σq²/d₀. */
  readonly tolerance: number;
}

function largestDifference(a: ArrayLike<number>, b: ArrayLike<number>): number {
  let largest = 0;
  for (let i = 0; i < a.length; i += 1) {
    largest = Math.max(largest, Math.abs(a[i]! - b[i]!));
  }
  return largest;
}

function allowancesFor(cell: PreparedCell, plan: SplittingPlan, sums: RawSums): Allowances {
  const cut = truncation(cell, plan);
  const unit = roundingUnits * Number.EPSILON;
  return {
    energy: cut.energy + unit * sums.magnitude,
    potential: cut.potential + unit * sums.potentialMagnitude,
    // A strain derivative is made of parts about twice as large, one of them negative.
    strainDerivative: cut.strainDerivative + 4 * unit * sums.magnitude,
  };
}

/**
 * What must hold whatever the cell: E independent of η; tr(∂E/∂ε) = −E, for E is homogeneous of
 * degree −1 in lengths; ΣF = 0, by translation; ½Σqφ = E, for E is quadratic in the charges.
 */
function certify({ input, plans, first, second, allowances, tolerance }: Pair): EngineCertificate {
  const k = COULOMB_EV_ANGSTROM;
  const { chargesE } = input;
  const [xx, yy, zz] = first.strainDerivative as [number, number, number];
  let halfSum = 0;
  const force = [0, 0, 0];
  for (let i = 0; i < chargesE.length; i += 1) {
    halfSum += 0.5 * chargesE[i]! * first.potentials[i]!;
    for (let axis = 0; axis < 3; axis += 1) {
      force[axis]! += chargesE[i]! * first.fields[3 * i + axis]!;
    }
  }
  const energyDifference = Math.abs(first.energy - second.energy);
  const virialResidual = Math.abs(xx + yy + zz + first.energy);
  const potentialResidual = Math.abs(halfSum - first.energy);
  const forceSum = Math.hypot(...force);
  const strainAllowed = tolerance + 3 * allowances.strainDerivative;
  const agrees =
    energyDifference <= tolerance + allowances.energy &&
    potentialResidual <= tolerance + allowances.energy &&
    virialResidual <= strainAllowed &&
    forceSum <= strainAllowed / first.shortestDistanceA;
  return {
    splittingPerA: [plans[0].splittingPerA, plans[1].splittingPerA],
    realCutoffA: plans[0].realCutoffA,
    reciprocalCutoffPerA: plans[0].reciprocalCutoffPerA,
    realTerms: first.realTerms,
    reciprocalTerms: first.reciprocalTerms,
    energyDifferenceEv: k * energyDifference,
    virialResidualEv: k * virialResidual,
    forceSumEvPerA: k * forceSum,
    potentialSumResidualEv: k * potentialResidual,
    agrees,
  };
}

function present(pair: Pair, volumeA3: number): EngineResult {
  const { input, first, second, allowances } = pair;
  const k = COULOMB_EV_ANGSTROM;
  const differences = {
    energy: Math.abs(first.energy - second.energy),
    potential: largestDifference(first.potentials, second.potentials),
    strain: largestDifference(first.strainDerivative, second.strainDerivative),
    matrix: largestDifference(first.speciesMatrix.flat(), second.speciesMatrix.flat()),
  };
  return {
    energyEv: k * first.energy,
    energyBoundEv: k * (allowances.energy + differences.energy),
    potentialsV: first.potentials.map((phi) => k * phi),
    potentialBoundV: k * (allowances.potential + differences.potential),
    fieldsVPerA: first.fields.map((field) => k * field),
    forcesEvPerA: first.fields.map((field, i) => k * input.chargesE[Math.floor(i / 3)]! * field),
    stressEvPerA3: first.strainDerivative.map((value) => (k * value) / volumeA3),
    stressBoundEvPerA3: (k * (allowances.strainDerivative + differences.strain)) / volumeA3,
    speciesMatrixEv: first.speciesMatrix.map((row) => row.map((value) => k * value)),
    speciesMatrixBoundEv: k * (allowances.energy + differences.matrix),
    shortestDistanceA: first.shortestDistanceA,
    certificate: certify(pair),
  };
}

/**
 * Electrostatic energy, potentials, fields, forces, stress and species matrix of a periodic cell of
 * point charges by Ewald summation with a Gaussian split, in conducting surroundings (no
 * surface-dipole term):
 * E = ½k Σ_ij Σ'_n q_i q_j erfc(ηr)/r + (2πk/V) Σ_{G≠0} exp(−G²/4η²)/G² |S(G)|²
 *     − k(η/√π) Σq² − (πk/2Vη²) Q².
 * Computed twice, with two splitting parameters; the difference enters the bounds and the
 * certificate. Time grows as N^{3/2}, memory as N.
 *
 * @throws RangeError if arrays disagree, a number is not finite, two sites coincide, or the cell is
 *   charged and `uniformBackground` is not set: callers check these first and say so to the person
 */
export function evaluateElectrostatics(input: EngineInput): EngineResult {
  const prepared = prepareCell(input);
  const isNeutral = Math.abs(prepared.chargeSum) <= neutralWithin * prepared.absoluteChargeSum;
  if (!isNeutral && input.uniformBackground !== true) {
    throw new RangeError('the cell is charged and no uniform background was asked for');
  }
  const cell = isNeutral ? { ...prepared, chargeSum: 0 } : prepared;
  const factor = input.splittingFactor ?? 1;
  const plan = (f: number) => planSplitting(cell, input.toleranceRelative, f);
  const plans: [SplittingPlan, SplittingPlan] = [plan(factor), plan(factor * secondSplitting)];
  const first = sumOnce(cell, plans[0]);
  if (!(first.shortestDistanceA > 0)) {
    throw new RangeError('two sites coincide');
  }
  const second = sumOnce(cell, plans[1]);
  const allowances = allowancesFor(cell, plans[0], first);
  const tolerance = (input.toleranceRelative * cell.chargeSquareSum) / first.shortestDistanceA;
  return present({ input, plans, first, second, allowances, tolerance }, cell.volumeA3);
}
