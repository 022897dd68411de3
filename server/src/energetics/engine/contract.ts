/**
 * Conventions of the whole engine. Lengths in Å, energies in eV per cell, charges in e, masses in u.
 * Sites in the order given. Components of strain and stress: xx, yy, zz, yz, xz, xy, shear strains
 * as γ = 2ε. A symmetric strain ε and displacements u move an ion from r to (1 + ε) r + u, so that
 * pair vectors become d → (1 + ε) d + u_j − u_i, which is linear in both; all derivatives are taken
 * there. Stress is (1/V) ∂E/∂ε, positive where the cell would shrink if let go.
 */

/** Short-range energy of one pair of species: A exp(−r/ρ) − C r⁻⁶. */
export interface PairTerm {
  readonly speciesA: number;
  readonly speciesB: number;
  /** A in eV. */
  readonly prefactorEv: number;
  /** ρ in Å. */
  readonly hardnessA: number;
  /** C in eV Å⁶. */
  readonly dispersionEvA6: number;
}

/** A neutral cell of point charges with pair potentials. */
export interface PairModelInput {
  /** Rows a, b, c in Cartesian Å, row-major, nine numbers. */
  readonly vectorsA: ArrayLike<number>;
  /** Fractional coordinates, three numbers a site. */
  readonly fractional: ArrayLike<number>;
  readonly chargesE: ArrayLike<number>;
  /** Species of each site, 0, 1, 2 … as the pair terms number them. */
  readonly speciesIndex: ArrayLike<number>;
  /** At most one term per pair of species; pairs without one only feel their charges. */
  readonly pairs: readonly PairTerm[];
  /**
   * Short-range terms end here: untouched up to nine tenths of it, then multiplied by a polynomial
   * that falls from 1 to 0 with three continuous derivatives.
   */
  readonly cutoffA: number;
  /** Factor on the splitting parameter of the Coulomb sums, for invariance tests; 1 if left out. */
  readonly splittingFactor?: number;
}

/** ∂²E by displacements and strain. */
export interface SecondDerivatives {
  /** K = ∂²E/∂u∂u, 3N × 3N, row-major, symmetric, eV Å⁻². */
  readonly forceConstantsEvPerA2: Float64Array;
  /** Λ = ∂²E/∂u∂ε, 3N rows of six, eV Å⁻¹. */
  readonly internalStrainEvPerA: Float64Array;
  /** ∂²E/∂ε∂ε, 6 × 6, ions held at their fractional coordinates, eV (divide by V). */
  readonly strainStrainEv: Float64Array;
}

export interface PairModelResult {
  readonly energyEv: number;
  readonly coulombEv: number;
  readonly shortRangeEv: number;
  /** Short-range energy beyond the cut-off, pairs at their mean density: an estimate. */
  readonly neglectedEv: number;
  /** −∂E/∂u, three components a site, eV Å⁻¹. */
  readonly forcesEvPerA: Float64Array;
  /** (1/V) ∂E/∂ε, eV Å⁻³. */
  readonly stressEvPerA3: Float64Array;
  readonly volumeA3: number;
  readonly shortestDistanceA: number;
  /** Present where asked for. */
  readonly second: SecondDerivatives | null;
}

/** A space-group operation on fractional coordinates: x′ = W x + w. */
export interface CellOperation {
  /** W, row-major. */
  readonly rotation: readonly number[];
  readonly translation: readonly number[];
}

/** Components of a symmetric tensor as the engine orders them. */
export const tensorPairs = [
  [0, 0],
  [1, 1],
  [2, 2],
  [1, 2],
  [0, 2],
  [0, 1],
] as const;
