/** What the engine takes: a periodic cell of point charges. */
export interface EngineInput {
  /** Rows a, b, c in Cartesian Å, row-major, nine numbers; right- or left-handed. */
  readonly vectorsA: readonly number[];
  /** Fractional coordinates, three numbers a site; wrapped into [0, 1) by the engine. */
  readonly fractional: Float64Array;
  /** Charges in elementary charges, one a site. */
  readonly chargesE: Float64Array;
  /** Class of each site, 0 … speciesCount − 1, for the sublattice matrix. */
  readonly speciesIndex: Int32Array;
  readonly speciesCount: number;
  /** Relative to k_e Σq²/d₀, d₀ the shortest distance between sites. */
  readonly toleranceRelative: number;
  /** Spread the opposite of a net charge evenly; without it a charged cell is refused. */
  readonly uniformBackground?: boolean;
  /** Factor on the splitting parameter the engine would choose; for invariance tests. */
  readonly splittingFactor?: number;
}

/** How the digits were checked; all per cell. */
export interface EngineCertificate {
  readonly splittingPerA: readonly [number, number];
  readonly realCutoffA: number;
  readonly reciprocalCutoffPerA: number;
  readonly realTerms: number;
  readonly reciprocalTerms: number;
  /** |E(η₁) − E(η₂)|. */
  readonly energyDifferenceEv: number;
  /** |tr(σ)V + E|. */
  readonly virialResidualEv: number;
  /** |ΣF|. */
  readonly forceSumEvPerA: number;
  /** |½Σqφ − E|. */
  readonly potentialSumResidualEv: number;
  readonly agrees: boolean;
}

/** What the engine gives, in the order of the sites as given; energies per cell. */
export interface EngineResult {
  readonly energyEv: number;
  /** Absolute bound of the energy: truncation, rounding and disagreement of two splittings. */
  readonly energyBoundEv: number;
  /** φ_i = ∂E/∂q_i in V. */
  readonly potentialsV: Float64Array;
  readonly potentialBoundV: number;
  /** −∇φ, three Cartesian components a site, V Å⁻¹. */
  readonly fieldsVPerA: Float64Array;
  /** q_i times the field, eV Å⁻¹. */
  readonly forcesEvPerA: Float64Array;
  /** (1/V) ∂E/∂ε: xx, yy, zz, yz, xz, xy in eV Å⁻³. */
  readonly stressEvPerA3: readonly number[];
  readonly stressBoundEvPerA3: number;
  /** E_AB, row A and column B, symmetric; the sum over A ≤ B is the energy. */
  readonly speciesMatrixEv: readonly (readonly number[])[];
  readonly speciesMatrixBoundEv: number;
  readonly shortestDistanceA: number;
  readonly certificate: EngineCertificate;
}

/** One evaluation with one splitting parameter, in units of e²/Å without the Coulomb constant. */
export interface RawSums {
  readonly energy: number;
  readonly potentials: Float64Array;
  readonly fields: Float64Array;
  /** ∂E/∂ε: xx, yy, zz, yz, xz, xy. */
  readonly strainDerivative: readonly number[];
  readonly speciesMatrix: readonly (readonly number[])[];
  /** Sum of the sizes of the parts of the energy, for the rounding estimate. */
  readonly magnitude: number;
  /** The same for the potential of any one site. */
  readonly potentialMagnitude: number;
  readonly realTerms: number;
  readonly reciprocalTerms: number;
  /** Zero if two sites coincide; the sums mean nothing then. */
  readonly shortestDistanceA: number;
}

/** The cell as the sums use it: sites sorted by species, positions wrapped. */
export interface PreparedCell {
  readonly vectorsA: readonly number[];
  /** a*, b*, c* with the factor 2π, Å⁻¹. */
  readonly reciprocalPerA: readonly number[];
  readonly volumeA3: number;
  readonly count: number;
  readonly fractional: Float64Array;
  readonly charges: Float64Array;
  /** Species of sorted site i. */
  readonly species: Int32Array;
  /** Sorted sites of species s are speciesStart[s] … speciesStart[s + 1] − 1. */
  readonly speciesStart: Int32Array;
  /** Index in the input of sorted site i. */
  readonly originalIndex: Int32Array;
  readonly chargeSum: number;
  readonly chargeSquareSum: number;
  readonly absoluteChargeSum: number;
}

/** Splitting parameter and cut-offs of one evaluation. */
export interface SplittingPlan {
  /** η, Å⁻¹. */
  readonly splittingPerA: number;
  /** ηR = G_max/2η: how far both sums go, in widths of the Gaussian. */
  readonly reach: number;
  readonly realCutoffA: number;
  readonly reciprocalCutoffPerA: number;
}
