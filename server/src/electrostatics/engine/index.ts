import { COULOMB_EV_ANGSTROM } from '#common/units/constants';

import type {
  EngineCertificate,
  EngineInput,
  EngineResult,
  PreparedCell,
  RawSums,
  SplittingPlan,
} from './contract.js';
import { energyTruncation, planSplitting } from './plan.js';
import { prepareCell } from './prepare.js';
import { sumOnce } from './sum.js';

/** Named in every result, and part of its content hash: a change of digits needs a new one. */
export const engineVersion = 'ewald-gaussian-1';

/** The second splitting parameter of the certificate, relative to the first. */
const secondSplitting = 1.2;

/** Rounding of compensated sums of parts much like the whole, in units of 2⁻⁵². */
const roundingUnits = 8;

/** The two evaluations and what follows from them. */
interface Pair {
  readonly cell: PreparedCell;
  readonly plans: readonly [SplittingPlan, SplittingPlan];
  readonly first: RawSums;
  readonly second: RawSums;
  /** Truncation and rounding of the energy, e²/Å, before the comparison. */
  readonly allowance: number;
}

function largestDifference(a: ArrayLike<number>, b: ArrayLike<number>): number {
  let largest = 0;
  for (let i = 0; i < a.length; i += 1) {
    largest = Math.max(largest, Math.abs(a[i]! - b[i]!));
  }
  return largest;
}

function certify(pair: Pair, input: EngineInput): EngineCertificate {
  const { cell, first, second, plans, allowance } = pair;
  const k = COULOMB_EV_ANGSTROM;
  const trace =
    first.strainDerivative[0]! + first.strainDerivative[1]! + first.strainDerivative[2]!;
  const halfSum = 0.5 * first.potentials.reduce((sum, phi, i) => sum + phi * input.chargesE[i]!, 0);
  const force = [0, 1, 2].map((axis) =>
    input.chargesE.reduce((sum, q, i) => sum + q * first.fields[3 * i + axis]!, 0),
  );
  const energyDifference = Math.abs(first.energy - second.energy);
  const virialResidual = Math.abs(trace + first.energy);
  const potentialResidual = Math.abs(halfSum - first.energy);
  const forceSum = Math.hypot(...force);
  const scale = (input.toleranceRelative * cell.chargeSquareSum) / cell.shortestDistanceA;
  const allowed = scale + allowance;
  // Derivatives feel the cut-off one to two orders more than the energy.
  const agrees =
    energyDifference <= allowed &&
    potentialResidual <= allowed &&
    virialResidual <= 30 * allowed &&
    forceSum <= (30 * allowed) / cell.shortestDistanceA;
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

function scaled(values: Float64Array, factor: number): Float64Array {
  return values.map((value) => value * factor);
}

function present(pair: Pair, input: EngineInput): EngineResult {
  const { cell, first, second, allowance } = pair;
  const k = COULOMB_EV_ANGSTROM;
  const energyBound = allowance + Math.abs(first.energy - second.energy);
  // A potential's share of the truncation: per unit charge, of one site among Σ|q|.
  const potentialAllowance = (2 * allowance) / cell.absoluteChargeSum;
  const potentialBound =
    potentialAllowance + largestDifference(first.potentials, second.potentials);
  const strainBound =
    30 * allowance + largestDifference(first.strainDerivative, second.strainDerivative);
  const matrixBound =
    allowance + largestDifference(first.speciesMatrix.flat(), second.speciesMatrix.flat());
  const forces = first.fields.map((field, i) => field * input.chargesE[Math.floor(i / 3)]!);
  return {
    energyEv: k * first.energy,
    energyBoundEv: k * energyBound,
    potentialsV: scaled(first.potentials, k),
    potentialBoundV: k * potentialBound,
    fieldsVPerA: scaled(first.fields, k),
    forcesEvPerA: scaled(forces, k),
    stressEvPerA3: first.strainDerivative.map((value) => (k * value) / cell.volumeA3),
    stressBoundEvPerA3: (k * strainBound) / cell.volumeA3,
    speciesMatrixEv: first.speciesMatrix.map((row) => row.map((value) => k * value)),
    speciesMatrixBoundEv: k * matrixBound,
    shortestDistanceA: cell.shortestDistanceA,
    certificate: certify(pair, input),
  };
}

/**
 * Electrostatic energy, potentials, fields, forces, stress and species matrix of a periodic cell of
 * point charges by Ewald summation with a Gaussian split, in conducting surroundings (no
 * surface-dipole term):
 * E = ½k Σ_ij Σ'_n q_i q_j erfc(ηr)/r + (2πk/V) Σ_{G≠0} exp(−G²/4η²)/G² |S(G)|²
 *     − k(η/√π) Σq² − (πk/2Vη²) Q².
 * Computed twice, with two splitting parameters; the difference enters the bound and the
 * certificate.
 *
 * @throws RangeError if arrays disagree, two sites coincide, or the cell is charged and
 *   `uniformBackground` is not set: callers check these first and say so to the person
 */
export function evaluateElectrostatics(input: EngineInput): EngineResult {
  const cell = prepareCell(input);
  const isNeutral = Math.abs(cell.chargeSum) <= 1e-10 * cell.absoluteChargeSum;
  if (!isNeutral && input.uniformBackground !== true) {
    throw new RangeError('the cell is charged and no uniform background was asked for');
  }
  const neutral = isNeutral ? { ...cell, chargeSum: 0 } : cell;
  const factor = input.splittingFactor ?? 1;
  const plans = [factor, factor * secondSplitting].map((f) =>
    planSplitting(neutral, input.toleranceRelative, f),
  ) as [SplittingPlan, SplittingPlan];
  const [first, second] = plans.map((plan) => sumOnce(neutral, plan)) as [RawSums, RawSums];
  const rounding = roundingUnits * Number.EPSILON * first.magnitude;
  const allowance = energyTruncation(neutral, plans[0]) + rounding;
  return present({ cell: neutral, plans, first, second, allowance }, input);
}
