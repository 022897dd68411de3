import type { PairModelInput, PairModelResult } from './contract.js';
import { polycrystalAverages, type PolycrystalAverages } from './averages.js';
import { elasticOf, type ElasticConstants } from './elastic.js';
import { checkPairModel, pairModel } from './pair-model.js';
import { relaxCell, type RelaxHooks, type RelaxInput, type RelaxResult } from './relax.js';
import { bornStability, type CrystalSystem, type Stability } from './stability.js';
import { vibrationsOf, type GammaVibrations, type VibrationsInput } from './vibrations.js';

export type { PairModelInput, PairModelResult, PairTerm } from './contract.js';
export type { RelaxHooks, RelaxResult } from './relax.js';
export type { GammaMode } from './vibrations.js';

/** Named in every result: a change of digits needs a new one. */
export const dynamicsEngineVersion = 'pair-dynamics-1';

/** What to work out besides energy, forces and stress. */
interface PairModelOptions {
  /** Work out force constants, internal strain and the clamped strain matrix as well. */
  readonly withSecondDerivatives?: boolean;
}

/**
 * Energy, forces, stress and, where asked for, second derivatives of a neutral cell of point
 * charges with pair potentials:
 * E = k_e ½ Σ_ij Σ'_n q_i q_j/r (Ewald's sums, conducting surroundings) + ½ Σ_ij Σ'_n φ_ij(r),
 * φ = A exp(−r/ρ) − C r⁻⁶, tapered to zero over the last tenth before the cut-off; what that leaves
 * out is estimated in `neglectedEv`. Conventions of strain and stress: `contract.ts`.
 * Time grows as N² with second derivatives.
 *
 * @throws RangeError if arrays disagree, a number is not finite, the cell has no volume or is
 *   charged, a pair of species has two terms, or two ions coincide
 */
export function evaluatePairModel(
  input: PairModelInput,
  options: PairModelOptions = {},
): PairModelResult {
  checkPairModel(input);
  return pairModel(input, options.withSecondDerivatives === true);
}

/**
 * Minimises the energy (with a pressure: the enthalpy) over cell and coordinates, keeping the given
 * operations, by Newton steps from analytic second derivatives with a guarded line search. Ends
 * where the largest force and stress components and the change of energy in the last step are all
 * below `criteria`, or says why not.
 *
 * @throws RangeError as {@link evaluatePairModel}, or if an operation doesn't fit the sites
 */
export function relax(input: RelaxInput, hooks: RelaxHooks = {}): RelaxResult {
  checkPairModel(input);
  return relaxCell(input, hooks);
}

/** Elastic constants with what follows from them. */
interface ElasticResult extends ElasticConstants {
  readonly stability: Stability;
  /** Null where C is not positive definite. */
  readonly averages: PolycrystalAverages | null;
}

/**
 * Elastic constants C = (∂²E/∂ε∂ε − Λᵀ K⁺ Λ)/V, K⁺ the inverse of the force constants without the
 * translations, in GPa (M. Born, K. Huang, Dynamical Theory of Crystal Lattices (1954), § 27).
 * In a cell under stress they are the coefficients of stress against strain.
 *
 * @param input a cell at rest; `isAtRest` tells whether it is
 * @param system whose stability criteria are listed
 * @throws RangeError as {@link evaluatePairModel}
 */
export function elasticConstants(input: PairModelInput, system: CrystalSystem): ElasticResult {
  checkPairModel(input);
  const constants = elasticOf(input);
  const { stiffnessGpa, compliancePerGpa, eigenvaluesGpa } = constants;
  const isDefinite = eigenvaluesGpa.every((value) => value > 0);
  return {
    ...constants,
    stability: bornStability(stiffnessGpa, system),
    averages:
      isDefinite && compliancePerGpa !== null
        ? polycrystalAverages(stiffnessGpa, compliancePerGpa)
        : null,
  };
}

/**
 * Vibrations of infinite wavelength from D = K_ij/√(m_i m_j): transverse (no macroscopic field),
 * and with the field of waves along q̂, D + (4πk_e/V)(Z_i q̂)(Z_j q̂)/√(m_i m_j), Z the full charges
 * of rigid ions (M. Born, K. Huang, Dynamical Theory of Crystal Lattices (1954), §§ 7 and 31).
 *
 * @throws RangeError as {@link evaluatePairModel}, or if a mass is not positive
 */
export function vibrationsAtGamma(input: VibrationsInput): GammaVibrations {
  checkPairModel(input);
  for (let i = 0; i < input.chargesE.length; i += 1) {
    if (!(input.massesU[i]! > 0 && input.massesU[i]! < Infinity)) {
      throw new RangeError('massesU must give every site a positive mass');
    }
  }
  return vibrationsOf(input);
}
